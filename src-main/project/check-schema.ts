import Database from 'better-sqlite3';
import { schemaSql } from './file-schema.ts';

interface SchemaRow {
  type: string;
  name: string;
  tbl_name: string;
  sql: string | null;
}

export interface SchemaCheck {
  /** Every way in which tables, indexes, triggers and views differ from those of a new project, in words. */
  differences: string[];
  /** The tables that are exactly as Footing makes them. */
  soundTables: Set<string>;
}

/** Compares a file's whole schema with that of a new project, letter by letter. Reads nothing but the schema. */
export function checkSchema(db: Database.Database): SchemaCheck {
  const found = schemaOf(db);
  const fresh = new Database(':memory:');
  fresh.exec(schemaSql);
  const ours = schemaOf(fresh);
  fresh.close();
  const isSame = (name: string) => ours.get(name) === found.get(name);
  return {
    differences: [
      ...[...ours.keys()].filter((name) => !found.has(name)).map((name) => `${name} is missing`),
      ...[...found.keys()].filter((name) => !ours.has(name)).map((name) => `${name} does not belong here`),
      ...[...ours.keys()].filter((name) => found.has(name) && !isSame(name)).map((name) => `${name} was changed`),
    ],
    soundTables: new Set([...ours.keys()].filter(isSame).flatMap((name) => /^table (.*)$/.exec(name)?.[1] ?? [])),
  };
}

function schemaOf(db: Database.Database): Map<string, string> {
  const rows = db.prepare<[], SchemaRow>('SELECT type, name, tbl_name, sql FROM sqlite_schema').all();
  return new Map(rows.map(({ type, name, tbl_name, sql }) => [`${type} ${name}`, JSON.stringify([tbl_name, sql])]));
}
