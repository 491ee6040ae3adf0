import { existsSync, realpathSync, renameSync, rmSync } from 'node:fs';
import { basename, dirname, join } from 'node:path';
import Database from 'better-sqlite3';
import { InputError, ProjectError } from '../errors.ts';
import { applicationId, schemaSql, schemaVersion } from './file-schema.ts';
import { openLocked } from './open-project.ts';
import { type Doing, Project } from './project.ts';
import { asProjectError } from './sqlite-error.ts';
import { acquireWriterLock, type Holder } from './writer-lock.ts';

export interface NewProject extends Doing {
  title: string;
  /** True for projects made of invented data. */
  isInvented: boolean;
  /** Who has it open from now on: what a second writer is told. */
  holder: Holder;
}

/**
 * Creates a project file and opens it for writing. The file appears under its name only when it is complete.
 *
 * @throws InputError exists; ProjectError not-found (the folder), in-use, not-writable
 */
export function createProject(path: string, { holder, ...content }: NewProject): Project {
  const realPath = join(realFolder(path), basename(path));
  const lock = acquireWriterLock(realPath, holder);
  // One name is enough, since the lock is held; and a draft left by a killed process goes away with the next.
  const draftPath = `${realPath}.footing-draft`;
  try {
    if (existsSync(realPath)) throw exists(realPath);
    removeDraft(draftPath);
    writeDraft(draftPath, content);
    renameSync(draftPath, realPath);
  } catch (error) {
    removeDraft(draftPath);
    lock.release();
    throw asProjectError(error, realPath);
  }
  return openLocked(realPath, lock);
}

function writeDraft(path: string, { title, isInvented, ...doing }: Omit<NewProject, 'holder'>): void {
  const db = new Database(path);
  db.pragma('synchronous = FULL');
  db.pragma(`application_id = ${applicationId}`);
  db.pragma(`user_version = ${schemaVersion}`);
  db.exec(`BEGIN; ${schemaSql} COMMIT;`);
  const project = new Project(path, db, { isReadOnly: false, close: () => db.close() });
  try {
    project.command({ ...doing, action: 'create project', subject: title }, (change) =>
      change.add('project', { title, isInvented, createdAt: doing.at }),
    );
  } finally {
    project.close();
  }
}

function removeDraft(path: string): void {
  for (const file of [path, `${path}-journal`]) rmSync(file, { force: true });
}

function realFolder(path: string): string {
  try {
    return realpathSync(dirname(path));
  } catch {
    throw new ProjectError({
      code: 'not-found',
      where: path,
      expected: 'a folder that exists',
      received: `no folder ${dirname(path)}`,
      hint: 'Create the folder first, or choose another.',
    });
  }
}

function exists(path: string): InputError {
  return new InputError({
    code: 'exists',
    where: path,
    expected: 'a name that is free',
    received: 'a file that is there already',
    hint: 'Choose another name; Footing overwrites no project.',
  });
}
