import { realpathSync } from 'node:fs';
import type { Database } from 'better-sqlite3';
import { ProjectError } from '../errors.ts';
import { checkHeader } from './check-header.ts';
import { schemaDifferences } from './check-schema.ts';
import { connect } from './connection.ts';
import { Project } from './project.ts';
import { asProjectError } from './sqlite-error.ts';
import { acquireWriterLock, type Holder, type WriterLock } from './writer-lock.ts';

export type OpenOptions = { readOnly: true } | { readOnly?: false; holder: Holder };

/**
 * Opens a project file, which may come from anywhere: nothing in it is used before header, pages and schema have
 * been found to be what Footing writes.
 *
 * @throws ProjectError not-found, not-a-project, newer-version, unknown-version, in-use, damaged, foreign-schema, not-writable
 */
export function openProject(path: string, options: OpenOptions): Project {
  checkHeader(path);
  const realPath = realpathSync(path);
  const lock = options.readOnly ? null : acquireWriterLock(realPath, options.holder);
  return openLocked(realPath, lock);
}

/** Opens a project whose lock is already held, and lets go of the lock when it cannot be opened. */
export function openLocked(path: string, lock: WriterLock | null): Project {
  let db: Database | undefined;
  try {
    db = connect(path, { readonly: lock === null });
    checkPages(db, path);
    checkSchema(db, path);
    return new Project(path, db, lock);
  } catch (error) {
    db?.close();
    lock?.release();
    throw asProjectError(error, path);
  }
}

function checkPages(db: Database, path: string): void {
  const [first] = db.prepare<[], string>('PRAGMA quick_check(1)').pluck().all();
  if (first === 'ok') return;
  throw new ProjectError({
    code: 'damaged',
    where: path,
    expected: 'an undamaged project file',
    received: first ?? 'one that cannot be checked',
    hint: 'Nothing was changed. Continue on an earlier copy of the file; `footing verify` lists what can still be read.',
  });
}

function checkSchema(db: Database, path: string): void {
  const [first] = schemaDifferences(db);
  if (first === undefined) return;
  throw new ProjectError({
    code: 'foreign-schema',
    where: path,
    expected: 'exactly the tables and triggers of a Footing project',
    received: first,
    hint: 'The file was changed by another program. `footing verify` lists what differs; continue on an earlier copy.',
  });
}
