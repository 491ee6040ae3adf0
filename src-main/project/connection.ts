import Database from 'better-sqlite3';

/** Opens SQLite on a project file with everything switched off that a file from outside could make use of. */
export function connect(path: string, options: { readonly: boolean }): Database.Database {
  // The driver itself sets SQLite's defensive mode.
  const db = new Database(path, { readonly: options.readonly, fileMustExist: true, timeout: 5000 });
  db.pragma('trusted_schema = OFF');
  db.pragma('cell_size_check = ON');
  db.pragma('foreign_keys = ON');
  db.pragma('recursive_triggers = ON');
  db.pragma('synchronous = FULL');
  return db;
}
