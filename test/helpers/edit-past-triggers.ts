import Database from 'better-sqlite3';

/** What somebody with a database program at hand would do to a project. */
export function editFile(path: string, work: (db: Database.Database) => void): void {
  const db = new Database(path);
  db.pragma('foreign_keys = OFF');
  work(db);
  db.close();
}

/** Somebody careful: takes the triggers of a table away, works, and puts them back as they were. */
export function editPastTriggers(path: string, table: string, work: (db: Database.Database) => void): void {
  editFile(path, (db) => {
    const triggers = db
      .prepare<[string], { name: string; sql: string }>(
        `SELECT name, sql FROM sqlite_schema WHERE type = 'trigger' AND tbl_name = ?`,
      )
      .all(table);
    for (const { name } of triggers) db.exec(`DROP TRIGGER ${name}`);
    work(db);
    for (const { sql } of triggers) db.exec(sql);
  });
}
