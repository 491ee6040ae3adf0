import { copyFileSync, existsSync, mkdtempSync, rmSync, statSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import Database from 'better-sqlite3';

export interface Connection {
  db: Database.Database;
  close: () => void;
}

/** Opens SQLite on a project file to read and write it. What a killed process left half done is taken back. */
export function connect(path: string): Connection {
  const connection = start(path, {});
  if (existsSync(`${path}-journal`)) removeSpentJournal(connection.db, path);
  return connection;
}

/** A process killed before its journal counted leaves one that SQLite ignores and does not clear away. */
function removeSpentJournal(db: Database.Database, path: string): void {
  // With the file to ourselves, any journal that counted has been played back, and none is in use.
  db.exec('BEGIN EXCLUSIVE');
  rmSync(`${path}-journal`, { force: true });
  db.exec('ROLLBACK');
}

/**
 * Opens SQLite on a project file to read it, without writing anything beside or into it. Where a killed process has
 * left a change half done, which only a writer could take back, it is taken back in a private copy, and that is read.
 */
export function connectReadOnly(path: string): Connection {
  for (let attempt = 1; ; attempt++) {
    try {
      return start(path, { readonly: true });
    } catch (error) {
      if (!needsRollback(error) || attempt === maxAttempts) throw error;
    }
    const copy = privateCopy(path);
    if (copy) return copy;
  }
}

const maxAttempts = 10;

function start(path: string, options: { readonly?: boolean }): Connection {
  // The driver itself sets SQLite's defensive mode.
  const db = new Database(path, { ...options, fileMustExist: true, timeout: 5000 });
  try {
    db.pragma('trusted_schema = OFF');
    db.pragma('cell_size_check = ON');
    db.pragma('foreign_keys = ON');
    db.pragma('recursive_triggers = ON');
    db.pragma('synchronous = FULL');
    // The first read: takes back what a killed process left half done, or says that it cannot.
    db.prepare('SELECT count(*) FROM sqlite_schema').get();
  } catch (error) {
    db.close();
    throw error;
  }
  return { db, close: () => db.close() };
}

function needsRollback(error: unknown): boolean {
  return error instanceof Database.SqliteError && error.code === 'SQLITE_READONLY_ROLLBACK';
}

/** A copy of file and journal, put right; null when somebody else wrote or put right the original meanwhile. */
function privateCopy(path: string): Connection | null {
  const folder = mkdtempSync(join(tmpdir(), 'footing-'));
  const discard = () => rmSync(folder, { recursive: true, force: true });
  try {
    const copyPath = join(folder, 'copy.footing');
    if (!copyAtRest(path, copyPath)) {
      discard();
      return null;
    }
    const { db } = start(copyPath, {});
    db.pragma('query_only = ON');
    return {
      db,
      close() {
        db.close();
        discard();
      },
    };
  } catch (error) {
    discard();
    throw error;
  }
}

/** Copies file and journal; false when they changed while they were copied. */
function copyAtRest(path: string, copyPath: string): boolean {
  const before = stateOf(path);
  copyFileSync(path, copyPath);
  try {
    copyFileSync(`${path}-journal`, `${copyPath}-journal`);
  } catch (error) {
    // Put right and cleared away by a writer who came just now.
    if (error instanceof Error && 'code' in error && error.code === 'ENOENT') return false;
    throw error;
  }
  return stateOf(path) === before;
}

function stateOf(path: string): string {
  return [path, `${path}-journal`]
    .map((file) => statSync(file, { throwIfNoEntry: false, bigint: true }))
    .map((stat) => (stat ? `${stat.ino} ${stat.size} ${stat.mtimeNs}` : 'none'))
    .join(', ');
}
