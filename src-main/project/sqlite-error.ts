import Database from 'better-sqlite3';
import { InputError, ProjectError } from '../errors.ts';

/** What SQLite said about a project file, as a ProjectError; anything else is handed back as it came. */
export function asProjectError(error: unknown, path: string): unknown {
  if (!(error instanceof Database.SqliteError)) return error;
  const { code, message } = error;
  const fields = { where: path, received: message };
  if (/^SQLITE_(NOTADB|CORRUPT)/.test(code)) {
    return new ProjectError({
      ...fields,
      code: 'damaged',
      expected: 'an undamaged project file',
      hint: 'Nothing was changed. Continue on an earlier copy of the file; `footing verify` lists what can still be read.',
    });
  }
  if (/^SQLITE_(BUSY|LOCKED)/.test(code)) {
    return new ProjectError({
      ...fields,
      code: 'busy',
      expected: 'the file to be free for a moment',
      hint: 'Another program is reading or writing it. Try again; close the other program if this goes on.',
    });
  }
  if (code === 'SQLITE_READONLY_ROLLBACK') {
    return new ProjectError({
      ...fields,
      code: 'half-written',
      expected: 'a file whose last change is complete',
      hint: 'The program that writes it was stopped. Close the project and open it again.',
    });
  }
  if (/^SQLITE_(READONLY|CANTOPEN|PERM|AUTH)/.test(code)) {
    return new ProjectError({
      ...fields,
      code: 'not-writable',
      expected: 'a file and folder that may be written',
      hint: 'Open it read-only, or copy it to a folder of your own.',
    });
  }
  if (/^SQLITE_(FULL|IOERR)/.test(code)) {
    return new ProjectError({
      ...fields,
      code: 'disk',
      expected: 'a working disk with room left',
      hint: 'The last change was not kept; everything before it was. Make room or change the disk, then open the project again.',
    });
  }
  return new ProjectError({
    ...fields,
    code: 'sqlite',
    expected: 'a project file as Footing writes it',
    hint: 'Nothing was changed. Verify the project.',
  });
}

/** For a COMMIT that failed on a record pointing at what is not there: the error that names both. Before ROLLBACK only. */
export function brokenReference(error: unknown, db: Database.Database): InputError | undefined {
  if (!(error instanceof Database.SqliteError) || error.code !== 'SQLITE_CONSTRAINT_FOREIGNKEY') return undefined;
  const broken = db.prepare<[], { table: string; rowid: number; parent: string }>('PRAGMA foreign_key_check').get();
  if (!broken) return undefined;
  return new InputError({
    code: 'still-referenced',
    where: `${broken.table} ${broken.rowid}`,
    expected: `the ${broken.parent} that it refers to`,
    received: 'none',
    hint: `Remove or change ${broken.table} ${broken.rowid} first.`,
  });
}
