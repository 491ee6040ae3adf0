import type { Database } from 'better-sqlite3';
import type { RecordChange, RecordKind, TrailEntry, TrailHead, TrailLine } from '../contract/trail.ts';
import { InputError, ProjectError } from '../errors.ts';
import { canonicalJson } from './canonical-json.ts';
import { type Change, ChangeSet, noSuchRecord } from './change-set.ts';
import { ContentTable } from './content-table.ts';
import { FrozenRecords } from './frozen-records.ts';
import { RecordTables } from './record-tables.ts';
import { parseRecord, type RecordOf } from './records.ts';
import { asProjectError, brokenReference } from './sqlite-error.ts';
import { TrailIndex } from './trail-index.ts';
import { emptyHead, parseEntry, TrailTable } from './trail-table.ts';
import { undoPlan, type UndoPlan, type UndoStep } from './undo-plan.ts';

/** Who does something, when, and with which version of Footing: goes into the trail entry. */
export interface Doing {
  reviewer: { name: string; role: string };
  /** UTC, to the millisecond. */
  at: string;
  engineVersion: string;
}

export interface CommandInfo extends Doing {
  /** A verb phrase: "import dataset". */
  action: string;
  /** What it is done to, in words: "claim 2 · zero-intercept". */
  subject: string;
}

/** An open project file. */
export class Project {
  readonly path: string;
  readonly isReadOnly: boolean;
  readonly #db: Database;
  readonly #close: () => void;
  readonly #records: RecordTables;
  readonly #contents: ContentTable;
  readonly #frozen: FrozenRecords;
  readonly #trail: TrailTable;
  readonly #index: TrailIndex;

  /** Takes over a connection whose file has been checked. To get a project, use openProject or createProject. */
  constructor(path: string, db: Database, { isReadOnly, close }: { isReadOnly: boolean; close: () => void }) {
    this.path = path;
    this.isReadOnly = isReadOnly;
    this.#db = db;
    this.#close = close;
    this.#records = new RecordTables(db);
    this.#contents = new ContentTable(db);
    this.#frozen = new FrozenRecords(db);
    this.#trail = new TrailTable(db);
    this.#index = new TrailIndex(this.#trail);
  }

  head(): TrailHead {
    return this.#reading(() => this.#trail.head());
  }

  /** @throws InputError no-such-record */
  get<Kind extends RecordKind>(kind: Kind, id: number): RecordOf<Kind> {
    const body = this.#reading(() => this.#records.read(kind, id));
    if (body === undefined) throw noSuchRecord(kind, id);
    return this.#parse(kind, body);
  }

  list<Kind extends RecordKind>(kind: Kind): RecordOf<Kind>[] {
    return this.#reading(() => this.#records.all(kind)).map((body) => this.#parse(kind, body));
  }

  /** @throws ProjectError content-missing, content-altered */
  content(contentDigest: string): Buffer {
    return this.#reading(() => this.#contents.read(contentDigest));
  }

  /** Entries from the newest, or from the one before `before`, to the oldest. */
  trailLines({ claimId, before = Infinity, limit }: { claimId?: number; before?: number; limit: number }): TrailLine[] {
    const { undo, undone } = this.#undoPlan();
    return this.#summaries()
      .filter((entry) => entry.sequence < before && (claimId === undefined || entry.claimIds.includes(claimId)))
      .slice(-limit)
      .reverse()
      .map(({ permanentBecause: _permanentBecause, signsClaimIds: _signsClaimIds, ...line }) => ({
        ...line,
        isUndone: undone.has(line.sequence),
        canUndo: undo?.sequence === line.sequence && undo.refusal === null && !this.isReadOnly,
      }));
  }

  /** @throws InputError no-such-entry */
  trailEntry(sequence: number): { entry: TrailEntry; previousHash: string; hash: string } {
    const row = this.#reading(() => this.#trail.row(sequence));
    if (!row) {
      throw new InputError({
        code: 'no-such-entry',
        where: `trail entry ${sequence}`,
        expected: `an entry from 1 to ${this.head().sequence}`,
        received: String(sequence),
      });
    }
    const previous = this.#reading(() => this.#trail.row(sequence - 1)) ?? emptyHead;
    return { entry: parseEntry(row), previousHash: previous.hash, hash: row.hash };
  }

  /**
   * Makes one change to the project: everything that `make` does, and the trail entry that says so, become
   * permanent together or not at all. A command that changes nothing leaves no entry.
   *
   * @throws InputError frozen, no-such-record, record-shape, still-referenced, nested-command, promise-in-command
   * @throws ProjectError read-only, trail-broken, busy, disk
   */
  command<Outcome>(info: CommandInfo, make: (change: Change) => Outcome): Outcome {
    const { reviewer, at, engineVersion, action, subject } = info;
    return this.#write({ reviewer, at, engineVersion, action, subject, undoes: null }, make);
  }

  /** What Undo and Redo would do next, in words; null when there is nothing, or nothing that may be. */
  undoState(): { undo: string | null; redo: string | null } {
    const { undo, redo } = this.#undoPlan();
    const words = (step: UndoStep | null) => (step && step.refusal === null && !this.isReadOnly ? step.words : null);
    return { undo: words(undo), redo: words(redo) };
  }

  /** @throws InputError nothing-to-undo, cannot-undo */
  undo(doing: Doing): void {
    this.#takeBack(this.#undoPlan().undo, 'undo', doing);
  }

  /** @throws InputError nothing-to-redo, cannot-redo */
  redo(doing: Doing): void {
    this.#takeBack(this.#undoPlan().redo, 'redo', doing);
  }

  close(): void {
    if (this.#db.open) this.#close();
  }

  /** Undo and redo are one thing: a new entry that turns an earlier one's changes round. */
  #takeBack(step: UndoStep | null, action: 'undo' | 'redo', doing: Doing): void {
    if (!step || step.refusal !== null) throw cannotTakeBack(step, action);
    const { changes } = this.trailEntry(step.sequence).entry;
    const subject = `entry ${step.sequence}: ${step.words}`;
    this.#write({ ...doing, action, subject, undoes: step.sequence }, (changeSet) => {
      for (const change of changes.toReversed()) this.#turnRound(changeSet, change);
    });
  }

  #turnRound(changeSet: ChangeSet, { kind, id, before, after }: RecordChange): void {
    const text = (body: RecordChange['after']) => (body === null ? null : canonicalJson(body));
    if ((this.#records.read(kind, id) ?? null) !== text(after)) {
      throw new ProjectError({
        code: 'record-altered',
        where: `${kind} ${id}`,
        expected: 'what the trail says about it',
        received: 'something else',
        hint: 'The file was changed from outside. Verify the project; continue on an earlier copy of the file.',
      });
    }
    changeSet.write(kind, id, text(before));
  }

  #write<Outcome>(
    entry: Omit<TrailEntry, 'sequence' | 'changes' | 'content'>,
    make: (changeSet: ChangeSet) => Outcome,
  ): Outcome {
    if (this.isReadOnly) throw readOnly(this.path);
    if (this.#db.inTransaction) throw misuse('nested-command', 'one command at a time', 'a command inside another');
    try {
      this.#db.exec('BEGIN IMMEDIATE');
      const changeSet = new ChangeSet(this.#records, this.#contents, this.#frozen);
      const outcome = make(changeSet);
      const changed = changeSet.close();
      if (isPromise(outcome)) throw misuse('promise-in-command', 'a command that ends at once', 'a promise');
      const isEmpty = changed.changes.length + changed.content.length === 0;
      if (!isEmpty) this.#trail.append({ ...entry, ...changed });
      this.#db.exec(isEmpty ? 'ROLLBACK' : 'COMMIT');
      return outcome;
    } catch (error) {
      const reason = brokenReference(error, this.#db) ?? asProjectError(error, this.path);
      if (this.#db.inTransaction) this.#db.exec('ROLLBACK');
      throw reason;
    }
  }

  #summaries() {
    return this.#reading(() => this.#index.summaries());
  }

  #undoPlan(): UndoPlan {
    return undoPlan(this.#summaries());
  }

  #reading<Value>(read: () => Value): Value {
    try {
      return read();
    } catch (error) {
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
}

function isPromise(value: unknown): boolean {
  return typeof value === 'object' && value !== null && 'then' in value && typeof value.then === 'function';
}

function misuse(code: string, expected: string, received: string): InputError {
  return new InputError({ code, where: 'command', expected, received });
}

function readOnly(path: string): ProjectError {
  return new ProjectError({
    code: 'read-only',
    where: path,
    expected: 'a project opened for writing',
    received: 'one opened read-only',
    hint: 'Open it again without read-only.',
  });
}

function cannotTakeBack(step: UndoStep | null, action: 'undo' | 'redo'): InputError {
  if (!step) {
    return new InputError({
      code: `nothing-to-${action}`,
      where: action,
      expected: action === 'undo' ? 'a change to take back' : 'an undone change to do again',
      received: 'nothing',
      hint: action === 'undo' ? 'The trail goes back no further.' : 'A new change ends what could be done again.',
    });
  }
  return new InputError({
    code: `cannot-${action}`,
    where: `${action} “${step.words}”`,
    expected: 'an entry that may be taken back',
    received: `one that may not: ${step.refusal}`,
  });
}
