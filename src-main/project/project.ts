import type { Database } from 'better-sqlite3';
import type { RecordKind, TrailEntry, TrailHead } from '../contract/trail.ts';
import { InputError, ProjectError } from '../errors.ts';
import { type Change, ChangeSet, noSuchRecord } from './change-set.ts';
import { ContentTable } from './content-table.ts';
import { RecordTables } from './record-tables.ts';
import { parseRecord, type RecordOf } from './records.ts';
import { asProjectError } from './sqlite-error.ts';
import { parseEntry, TrailTable } from './trail-table.ts';
import type { WriterLock } from './writer-lock.ts';

/** Who does something, when, and with which version of Footing: goes into the trail entry. */
export interface Doing {
  reviewer: { name: string; role: string };
  /** UTC, to the millisecond. */
  at: string;
  engineVersion: string;
}

export interface CommandInfo<Outcome> extends Doing {
  /** A verb phrase: "import dataset". */
  action: string;
  /** What it is done to, in words: "claim 2 · zero-intercept". */
  subject: string | ((outcome: Outcome) => string);
}

/** An open project file. */
export class Project {
  readonly path: string;
  readonly isReadOnly: boolean;
  readonly #db: Database;
  readonly #lock: WriterLock | null;
  readonly #records: RecordTables;
  readonly #contents: ContentTable;
  readonly #trail: TrailTable;

  constructor(path: string, db: Database, lock: WriterLock | null) {
    this.path = path;
    this.isReadOnly = lock === null;
    this.#db = db;
    this.#lock = lock;
    this.#records = new RecordTables(db);
    this.#contents = new ContentTable(db);
    this.#trail = new TrailTable(db);
  }

  head(): TrailHead {
    return this.#trail.head();
  }

  /** @throws InputError no-such-record */
  get<Kind extends RecordKind>(kind: Kind, id: number): RecordOf<Kind> {
    const body = this.#records.read(kind, id);
    if (body === undefined) throw noSuchRecord(kind, id);
    return this.#parse(kind, body);
  }

  list<Kind extends RecordKind>(kind: Kind): RecordOf<Kind>[] {
    return this.#records.all(kind).map((body) => this.#parse(kind, body));
  }

  /** @throws ProjectError content-missing, content-altered */
  content(contentDigest: string): Uint8Array {
    return this.#contents.read(contentDigest);
  }

  /** @throws InputError no-such-record */
  trailEntry(sequence: number): { entry: TrailEntry; previousHash: string; hash: string } {
    const row = this.#trail.row(sequence);
    if (!row) {
      throw new InputError({
        code: 'no-such-entry',
        where: `trail entry ${sequence}`,
        expected: `an entry from 1 to ${this.head().sequence}`,
        received: String(sequence),
      });
    }
    return {
      entry: parseEntry(row),
      previousHash: this.#trail.row(sequence - 1)?.hash ?? '0'.repeat(64),
      hash: row.hash,
    };
  }

  /**
   * Makes one change to the project: everything that `make` does, and the trail entry that says so, become
   * permanent together or not at all. A command that changes nothing leaves no entry.
   */
  command<Outcome>(info: CommandInfo<Outcome>, make: (change: Change) => Outcome): Outcome {
    if (this.isReadOnly) throw this.#refusal('read-only', 'a project opened for writing', 'one opened read-only');
    if (this.#db.inTransaction)
      throw this.#refusal('nested-command', 'one command at a time', 'a command inside another');
    return this.#transaction(() => {
      const changeSet = new ChangeSet(this.#records, this.#contents);
      const outcome = make(changeSet);
      const { changes, content } = changeSet.close();
      if (isPromise(outcome)) throw this.#refusal('promise-in-command', 'a command that ends at once', 'a promise');
      if (changes.length + content.length > 0) {
        const { reviewer, at, action, engineVersion } = info;
        const subject = typeof info.subject === 'function' ? info.subject(outcome) : info.subject;
        this.#trail.append({ at, reviewer, action, subject, engineVersion, changes, content, undoes: null });
      }
      return outcome;
    });
  }

  close(): void {
    if (!this.#db.open) return;
    this.#db.close();
    this.#lock?.release();
  }

  #transaction<Outcome>(work: () => Outcome): Outcome {
    try {
      this.#db.exec('BEGIN IMMEDIATE');
      const outcome = work();
      this.#db.exec('COMMIT');
      return outcome;
    } catch (error) {
      if (this.#db.inTransaction) this.#db.exec('ROLLBACK');
      throw asProjectError(error, this.path);
    }
  }

  #parse<Kind extends RecordKind>(kind: Kind, body: string): RecordOf<Kind> {
    try {
      return parseRecord(kind, JSON.parse(body));
    } catch (error) {
      throw new ProjectError({
        code: 'record-unreadable',
        where: `a ${kind} in ${this.path}`,
        expected: 'a record as Footing writes it',
        received: error instanceof Error ? error.message : String(error),
        hint: 'The file was changed from outside. Verify the project; continue on an earlier copy of the file.',
      });
    }
  }

  #refusal(code: string, expected: string, received: string): ProjectError {
    return new ProjectError({ code, where: this.path, expected, received });
  }
}

function isPromise(value: unknown): boolean {
  return typeof value === 'object' && value !== null && 'then' in value && typeof value.then === 'function';
}
