import Database from 'better-sqlite3';
import { schemaSql } from './file-schema.ts';

interface SchemaRow {
  type: string;
  name: string;
  tbl_name: string;
  sql: string | null;
}

/** Every way in which a file's tables, indexes, triggers and views differ from those of a new project, in words. */
export function schemaDifferences(db: Database.Database): string[] {
  const found = schemaRows(db);
  const fresh = new Database(':memory:');
  fresh.exec(schemaSql);
  const ours = schemaRows(fresh);
  fresh.close();
  return [
    ...[...ours].filter(([name]) => !found.has(name)).map(([name]) => `${name} is missing`),
    ...[...found].filter(([name]) => !ours.has(name)).map(([name]) => `${name} does not belong here`),
    ...[...found]
      .filter(([name, text]) => ours.has(name) && ours.get(name) !== text)
      .map(([name]) => `${name} is not as Footing writes it`),
  ];
}

function schemaRows(db: Database.Database): Map<string, string> {
  const rows = db.prepare<[], SchemaRow>('SELECT type, name, tbl_name, sql FROM sqlite_schema').all();
  return new Map(rows.map(({ type, name, tbl_name, sql }) => [`${type} ${name}`, JSON.stringify([tbl_name, sql])]));
}
