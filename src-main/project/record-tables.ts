import type { Database, Statement } from 'better-sqlite3';
import { recordKind, type RecordKind } from '../contract/trail.ts';

interface TableStatements {
  read: Statement<[number], string>;
  all: Statement<[], string>;
  insert: Statement<[number, string]>;
  update: Statement<[string, number]>;
  delete: Statement<[number]>;
}

/** The tables of records: canonical JSON in and out, no meaning. */
export class RecordTables {
  readonly #statements: Map<RecordKind, TableStatements>;
  readonly #lastId: Statement<[string], number>;
  readonly #setLastId: Statement<[number, string]>;

  constructor(db: Database) {
    this.#statements = new Map(
      recordKind.options.map((kind) => [
        kind,
        {
          read: db.prepare<[number], string>(`SELECT body FROM ${kind} WHERE id = ?`).pluck(),
          all: db.prepare<[], string>(`SELECT body FROM ${kind} ORDER BY id`).pluck(),
          insert: db.prepare<[number, string]>(`INSERT INTO ${kind} (id, body) VALUES (?, ?)`),
          update: db.prepare<[string, number]>(`UPDATE ${kind} SET body = ? WHERE id = ?`),
          delete: db.prepare<[number]>(`DELETE FROM ${kind} WHERE id = ?`),
        },
      ]),
    );
    this.#lastId = db.prepare<[string], number>('SELECT seq FROM sqlite_sequence WHERE name = ?').pluck();
    this.#setLastId = db.prepare<[number, string]>('UPDATE sqlite_sequence SET seq = ? WHERE name = ?');
  }

  read(kind: RecordKind, id: number): string | undefined {
    return this.#of(kind).read.get(id);
  }

  all(kind: RecordKind): string[] {
    return this.#of(kind).all.all();
  }

  /** One more than the largest id ever given out: the number of a removed record is not used again. */
  nextId(kind: RecordKind): number {
    return (this.#lastId.get(kind) ?? 0) + 1;
  }

  setNextId(kind: RecordKind, id: number): void {
    this.#setLastId.run(id - 1, kind);
  }

  /** Makes the record what `body` says; null removes it. */
  write(kind: RecordKind, id: number, body: string | null): void {
    const statements = this.#of(kind);
    if (body === null) statements.delete.run(id);
    else if (statements.update.run(body, id).changes === 0) statements.insert.run(id, body);
  }

  #of(kind: RecordKind): TableStatements {
    const statements = this.#statements.get(kind);
    if (!statements) throw new Error(`no table for records of kind ${kind}`);
    return statements;
  }
}
