import { randomUUID } from 'node:crypto';
import { unlinkSync } from 'node:fs';
import { hostname } from 'node:os';
import Database from 'better-sqlite3';
import { ProjectError } from '../errors.ts';
import { asProjectError } from './sqlite-error.ts';

/** Who has a project open for writing: told to anyone who tries to after them. */
export interface Holder {
  reviewer: string;
  /** The kind of program they have it open in. */
  host: string;
  engineVersion: string;
}

export interface WriterLock {
  release(): void;
}

interface HolderRow extends Holder {
  since: string;
  computer: string;
  processId: number;
  /** Tells this holding from every other one. */
  token: string;
}

const maxAttempts = 50;

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
  const row: HolderRow = {
    ...holder,
    since: new Date().toISOString(),
    computer: hostname(),
    processId: process.pid,
    token: randomUUID(),
  };
  let lastSeen: HolderRow | null = null;
  for (let attempt = 0; attempt < maxAttempts; attempt++) {
    const db = tryToHold(path, row);
    if (!db) {
      const other = readHolder(path);
      // Seen twice: the first time it may be what a killed process left, read while the next holder was writing.
      if (other && other.token === lastSeen?.token) throw inUse(projectPath, other);
      lastSeen = other;
    } else {
      // The last holder may have removed the file between our opening it and our locking it.
      if (readHolder(path)?.token === row.token) return { release: () => letGo(db, path) };
      db.close();
    }
    pause(2 + Math.random() * 8);
  }
  throw inUse(projectPath, lastSeen);
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
    if (isPassing(error)) return null;
    throw isNoDatabase(error) ? unusable(path) : asProjectError(error, path);
  }
}

/** Busy; or the file went away between opening and using it, because its last holder let go just then. */
function isPassing(error: unknown): boolean {
  return error instanceof Database.SqliteError && /^SQLITE_(BUSY|READONLY_DBMOVED|IOERR_DELETE_NOENT)/.test(error.code);
}

function isNoDatabase(error: unknown): boolean {
  return error instanceof Database.SqliteError && /^SQLITE_(NOTADB|CORRUPT|ERROR)/.test(error.code);
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

function pause(milliseconds: number): void {
  Atomics.wait(new Int32Array(new SharedArrayBuffer(4)), 0, 0, milliseconds);
}

function unusable(path: string): ProjectError {
  return new ProjectError({
    code: 'lock-unusable',
    where: path,
    expected: 'no file here, or the lock file that Footing makes',
    received: 'something else',
    hint: 'Delete this file if nobody has the project open.',
  });
}

function inUse(projectPath: string, other: HolderRow | null): ProjectError {
  return new ProjectError({
    code: 'in-use',
    where: projectPath,
    expected: 'a project that nobody else has open for writing',
    received: other
      ? `one that ${other.reviewer} has open since ${other.since} (${other.host}, computer ${other.computer}, process ${other.processId})`
      : 'one that others are opening at this moment',
    hint: 'Open it read-only, or have it closed there first.',
  });
}
