import { realpathSync } from 'node:fs';
import type { Database } from 'better-sqlite3';
import { ProjectError } from '../errors.ts';
import { checkHeader } from './check-header.ts';
import { checkSchema } from './check-schema.ts';
import { connect, type Connection, connectReadOnly } from './connection.ts';
import { Project } from './project.ts';
import { checkSideFiles } from './side-files.ts';
import { asProjectError } from './sqlite-error.ts';
import { acquireWriterLock, type Holder, type WriterLock } from './writer-lock.ts';

export interface OpenOptions {
  readOnly?: boolean;
  /** Who opens it: what a second writer is told. */
  holder: Holder;
}

/**
 * Opens a project file, which may come from anywhere: nothing in it is used before its header, the files beside it,
 * its schema and its pages have been found to be what Footing writes, in this order.
 *
 * @throws ProjectError not-found, not-a-project, other-application, newer-version, unknown-version, foreign-journal,
 *   in-use, foreign-schema, damaged, not-writable, busy
 */
export function openProject(path: string, { readOnly = false, holder }: OpenOptions): Project {
  checkHeader(path);
  const realPath = realpathSync(path);
  checkSideFiles(realPath);
  return openLocked(realPath, readOnly ? null : acquireWriterLock(realPath, holder));
}

/** Opens a project whose lock is already held (null: to read only); lets go of the lock when it cannot be opened. */
export function openLocked(path: string, lock: WriterLock | null): Project {
  let connection: Connection | undefined;
  const close = () => {
    connection?.close();
    lock?.release();
  };
  try {
    connection = lock ? connect(path) : connectReadOnly(path);
    refuseForeignSchema(connection.db, path);
    refuseDamagedPages(connection.db, path);
    return new Project(path, connection.db, { isReadOnly: lock === null, close });
  } catch (error) {
    close();
    throw asProjectError(error, path);
  }
}

function refuseForeignSchema(db: Database, path: string): void {
  const [first] = checkSchema(db).differences;
  if (first === undefined) return;
  throw new ProjectError({
    code: 'foreign-schema',
    where: path,
    expected: 'exactly the tables and triggers of a Footing project',
    received: `another schema: ${first}`,
    hint: 'The file was changed by another program. `footing verify` lists what differs; continue on an earlier copy.',
  });
}

function refuseDamagedPages(db: Database, path: string): void {
  const [first] = db.prepare<[], string>('PRAGMA quick_check(1)').pluck().all();
  if (first === 'ok') return;
  throw new ProjectError({
    code: 'damaged',
    where: path,
    expected: 'an undamaged project file',
    received: first ?? 'one that cannot be checked',
    hint: 'Nothing was changed. `footing verify` lists what can still be read; continue on an earlier copy.',
  });
}
