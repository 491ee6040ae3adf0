import { randomUUID } from 'node:crypto';
import { unlinkSync } from 'node:fs';
import { hostname } from 'node:os';
import Database from 'better-sqlite3';
import { ProjectError } from '../errors.ts';
import { asProjectError } from './sqlite-error.ts';

/** Who opens a project for writing, and when: told to anyone who tries to after them. */
export interface Holder {
  reviewer: string;
  /** UTC, to the millisecond. */
  since: string;
}

export interface WriterLock {
  release(): void;
}

interface HolderRow extends Holder {
  host: string;
  processId: number;
  token: string;
}

const maxAttempts = 20;

/**
 * Makes this process the only writer of a project, for as long as it lives.
 *
 * The lock is a write transaction held open on a small SQLite file beside the project, so the operating system lets
 * go of it when the process ends, however it ends; a lock file that is left over holds nobody up. The holder's name
 * is committed before, so that those who are refused can read it. Only SQLite may touch the lock file while it is
 * held: on POSIX systems, a process that opens and closes a file by other means loses its locks on it.
 *
 * @throws ProjectError in-use, not-writable
 */
export function acquireWriterLock(projectPath: string, holder: Holder): WriterLock {
  const path = `${projectPath}.footing-lock`;
  const row: HolderRow = { ...holder, host: hostname(), processId: process.pid, token: randomUUID() };
  for (let attempt = 0; attempt < maxAttempts; attempt++) {
    const db = tryToHold(path, row);
    if (!db) {
      const other = readHolder(path);
      if (other) throw inUse(projectPath, other);
      continue;
    }
    // The file may have been removed by its last holder between our opening and locking it.
    if (readHolder(path)?.token === row.token) return { release: () => letGo(db, path) };
    db.close();
  }
  throw inUse(projectPath, null);
}

function tryToHold(path: string, row: HolderRow): Database.Database | null {
  let db: Database.Database | undefined;
  try {
    db = new Database(path, { timeout: 0 });
    db.exec('BEGIN IMMEDIATE');
    db.exec('CREATE TABLE IF NOT EXISTS holder (id INTEGER PRIMARY KEY CHECK (id = 1), body TEXT NOT NULL) STRICT');
    db.prepare('INSERT OR REPLACE INTO holder (id, body) VALUES (1, ?)').run(JSON.stringify(row));
    db.exec('COMMIT');
    db.exec('BEGIN IMMEDIATE');
    return db;
  } catch (error) {
    db?.close();
    if (error instanceof Database.SqliteError && error.code.startsWith('SQLITE_BUSY')) return null;
    throw asProjectError(error, path);
  }
}

function readHolder(path: string): HolderRow | null {
  let db: Database.Database | undefined;
  try {
    db = new Database(path, { readonly: true, fileMustExist: true, timeout: 1000 });
    const body = db.prepare<[], string>('SELECT body FROM holder').pluck().get();
    return body === undefined ? null : (JSON.parse(body) as HolderRow);
  } catch {
    return null;
  } finally {
    db?.close();
  }
}

function letGo(db: Database.Database, path: string): void {
  if (!db.open) return;
  // Removed while still held: nobody can have locked this file between the two steps.
  const isRemoved = tryToRemove(path);
  db.close();
  // Windows removes no open file, and lets nobody remove one that a next holder has open.
  if (!isRemoved) tryToRemove(path);
}

function tryToRemove(path: string): boolean {
  try {
    unlinkSync(path);
    return true;
  } catch {
    return false;
  }
}

function inUse(projectPath: string, other: HolderRow | null): ProjectError {
  return new ProjectError({
    code: 'in-use',
    where: projectPath,
    expected: 'a project that nobody else has open for writing',
    received: other
      ? `one that ${other.reviewer} has open since ${other.since} (computer ${other.host}, process ${other.processId})`
      : 'one that others are opening at this moment',
    hint: 'Open it read-only, or have it closed there first.',
  });
}
