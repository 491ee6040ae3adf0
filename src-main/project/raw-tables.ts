import type { Database } from 'better-sqlite3';
import { recordKind, type RecordKind, type TrailHead, type VerifyProblem } from '../contract/trail.ts';
import { checkSchema } from './check-schema.ts';
import { digest } from './digest.ts';
import type { TrailRow } from './trail-table.ts';

export interface RecordRow {
  id: number;
  body: string;
}

/** A project's tables as they are, unchecked. null: the table is not one of ours, or its pages cannot be read. */
export interface RawTables {
  /** What is wrong with the file as such: its schema and its pages. */
  problems: VerifyProblem[];
  trail: TrailRow[] | null;
  heads: TrailHead[] | null;
  records: ReadonlyMap<RecordKind, RecordRow[] | null>;
  /** The last number given out, by table. */
  numbering: ReadonlyMap<string, number> | null;
  /** The digest under which content is kept, with that of its bytes. */
  contentDigests: ReadonlyMap<string, string> | null;
  contentBytes: (contentDigest: string) => Uint8Array | undefined;
}

/** Reads whatever can be read of a project file that may have been altered or damaged. */
export function readRawTables(db: Database): RawTables {
  const { differences, soundTables } = checkSchema(db);
  const problems: VerifyProblem[] = differences.map((detail) => ({ code: 'schema', where: 'schema', detail }));
  problems.push(...damagedPages(db, differences.length === 0 ? [''] : [...soundTables].map((table) => `(${table})`)));

  function rowsOf<Row, Kept = Row>(table: string, columns: string, keep: (row: Row) => Kept): Kept[] | null {
    if (!soundTables.has(table)) return null;
    try {
      return Array.from(db.prepare<[], Row>(`SELECT ${columns} FROM ${table} ORDER BY rowid`).iterate(), keep);
    } catch (error) {
      problems.push({ code: 'file-damaged', where: `table ${table}`, detail: messageOf(error) });
      return null;
    }
  }
  const asIs = <Row>(row: Row) => row;

  const trail = rowsOf<TrailRow>('trail', 'sequence, entry, hash', asIs);
  const heads = rowsOf<TrailHead>('head', 'sequence, hash', asIs);
  const records = new Map(recordKind.options.map((kind) => [kind, rowsOf<RecordRow>(kind, 'id, body', asIs)] as const));
  const numbering = rowsOf(
    'sqlite_sequence',
    'name, seq',
    ({ name, seq }: { name: string; seq: number }) => [name, seq] as const,
  );
  const contents = rowsOf(
    'content',
    'digest, bytes',
    (row: { digest: string; bytes: Buffer }) => [row.digest, digest(row.bytes)] as const,
  );
  const contentDigests = contents && new Map(contents);
  return {
    problems,
    trail,
    heads,
    records,
    numbering: numbering && new Map(numbering),
    contentDigests,
    contentBytes: (contentDigest) =>
      contentDigests?.has(contentDigest)
        ? db.prepare<[string], Buffer>('SELECT bytes FROM content WHERE digest = ?').pluck().get(contentDigest)
        : undefined,
  };
}

/** What SQLite's own check of pages, indexes and constraints finds, in the whole file or in some tables of it. */
function damagedPages(db: Database, scopes: string[]): VerifyProblem[] {
  return scopes.flatMap((scope) => {
    try {
      return db
        .prepare<[], string>(`PRAGMA integrity_check${scope}`)
        .pluck()
        .all()
        .filter((message) => message !== 'ok')
        .map((detail): VerifyProblem => ({ code: 'file-damaged', where: 'file', detail }));
    } catch (error) {
      return [{ code: 'file-damaged' as const, where: 'file', detail: messageOf(error) }];
    }
  });
}

function messageOf(error: unknown): string {
  return error instanceof Error ? error.message : String(error);
}
