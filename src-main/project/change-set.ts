import type { RecordChange, RecordKind } from '../contract/trail.ts';
import { InputError } from '../errors.ts';
import { canonicalJson } from './canonical-json.ts';
import type { ContentTable } from './content-table.ts';
import type { FrozenRecords } from './frozen-records.ts';
import type { RecordTables } from './record-tables.ts';
import { type NewRecord, parseRecord, type RecordOf } from './records.ts';

/** What a command may do to a project. */
export interface Change {
  /** Adds a record under the next free number of its kind. */
  add<Kind extends RecordKind>(kind: Kind, record: NewRecord<Kind>): RecordOf<Kind>;
  /** Replaces the record of the same number. */
  put<Kind extends RecordKind>(kind: Kind, record: RecordOf<Kind>): RecordOf<Kind>;
  remove(kind: RecordKind, id: number): void;
  /** Keeps bytes under their digest, which is returned. */
  addContent(bytes: Uint8Array): string;
}

interface Touched {
  kind: RecordKind;
  id: number;
  before: string | null;
  after: string | null;
}

/** Carries a command's changes out on the tables, and remembers them for its trail entry. */
export class ChangeSet implements Change {
  readonly #records: RecordTables;
  readonly #contents: ContentTable;
  readonly #frozen: FrozenRecords;
  readonly #touched = new Map<string, Touched>();
  readonly #newContent: string[] = [];
  readonly #firstNewIds = new Map<RecordKind, number>();
  #isOpen = true;

  constructor(records: RecordTables, contents: ContentTable, frozen: FrozenRecords) {
    this.#records = records;
    this.#contents = contents;
    this.#frozen = frozen;
  }

  add<Kind extends RecordKind>(kind: Kind, record: NewRecord<Kind>): RecordOf<Kind> {
    const id = this.#records.nextId(kind);
    if (!this.#firstNewIds.has(kind)) this.#firstNewIds.set(kind, id);
    const added = parseRecord(kind, { ...record, id });
    this.write(kind, added.id, canonicalJson(added));
    return added;
  }

  put<Kind extends RecordKind>(kind: Kind, record: RecordOf<Kind>): RecordOf<Kind> {
    const replacement = parseRecord(kind, record);
    this.#requireExisting(kind, replacement.id);
    this.write(kind, replacement.id, canonicalJson(replacement));
    return replacement;
  }

  remove(kind: RecordKind, id: number): void {
    this.#requireExisting(kind, id);
    this.write(kind, id, null);
  }

  addContent(bytes: Uint8Array): string {
    this.#requireOpen();
    const { digest, isNew } = this.#contents.add(bytes);
    if (isNew) this.#newContent.push(digest);
    return digest;
  }

  /** Makes the record what `body` says; null: makes it not be there. */
  write(kind: RecordKind, id: number, body: string | null): void {
    this.#requireOpen();
    const before = this.#records.read(kind, id) ?? null;
    if (before === body) return;
    this.#frozen.refuseChange(kind, id, before, body);
    this.#records.write(kind, id, body);
    const key = `${kind} ${id}`;
    const first = this.#touched.get(key);
    this.#touched.set(key, { kind, id, before: first ? first.before : before, after: body });
  }

  /** Ends the set: the changes in order of first touch, leaving out what came back to where it was. */
  close(): { changes: RecordChange[]; content: string[] } {
    this.#isOpen = false;
    const changed = [...this.#touched.values()].filter(({ before, after }) => before !== after);
    this.#takeBackUnusedNumbers(changed);
    const changes = changed.map(({ kind, id, before, after }) => ({
      kind,
      id,
      before: parseBody(before),
      after: parseBody(after),
    }));
    return { changes, content: this.#newContent };
  }

  /** Numbers of records that were added and removed again never left this command, so they are free. */
  #takeBackUnusedNumbers(changed: readonly Touched[]): void {
    for (const [kind, firstNewId] of this.#firstNewIds) {
      const usedIds = changed.filter((change) => change.kind === kind).map(({ id }) => id);
      this.#records.setNextId(kind, Math.max(firstNewId, ...usedIds.map((id) => id + 1)));
    }
  }

  #requireExisting(kind: RecordKind, id: number): void {
    if (this.#records.read(kind, id) === undefined) throw noSuchRecord(kind, id);
  }

  #requireOpen(): void {
    if (!this.#isOpen) {
      throw new InputError({
        code: 'command-over',
        where: 'change to the project',
        expected: 'a change made while its command runs',
        received: 'one made after it had ended',
        hint: 'Do slow work first, then give its outcome to a command.',
      });
    }
  }
}

function parseBody(body: string | null): RecordChange['before'] {
  return body === null ? null : (JSON.parse(body) as RecordChange['before']);
}

export function noSuchRecord(kind: RecordKind, id: number): InputError {
  return new InputError({
    code: 'no-such-record',
    where: `${kind} ${id}`,
    expected: `the number of a ${kind} in this project`,
    received: String(id),
  });
}
