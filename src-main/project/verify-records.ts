import type { RecordKind, TrailEntry, VerifyProblem } from '../contract/trail.ts';
import { canonicalJson } from './canonical-json.ts';
import { firstDifference } from './first-difference.ts';
import type { RecordRow } from './raw-tables.ts';

/** The records of a project as its trail alone gives them. */
export interface ReplayedRecords {
  problems: VerifyProblem[];
  /** By kind and number: the record as canonical JSON, and the entry that made it so. */
  records: Map<RecordKind, Map<number, { body: string; sequence: number }>>;
  /** The largest number ever given out, by kind. */
  lastIds: Map<RecordKind, number>;
}

/** Carries out all entries from an empty project; an entry whose "before" is not what was there is named. */
export function replay(entries: readonly TrailEntry[]): ReplayedRecords {
  const replayed: ReplayedRecords = { problems: [], records: new Map(), lastIds: new Map() };
  for (const { sequence, changes } of entries) {
    for (const { kind, id, before, after } of changes) {
      const ofKind = replayed.records.get(kind) ?? new Map<number, { body: string; sequence: number }>();
      replayed.records.set(kind, ofKind);
      if ((ofKind.get(id)?.body ?? null) !== textOf(before)) {
        const detail = `it changes ${kind} ${id} from a state that the entries before it do not lead to`;
        replayed.problems.push({ code: 'entry-altered', where: `trail entry ${sequence}`, detail });
      }
      const body = textOf(after);
      if (body === null) ofKind.delete(id);
      else ofKind.set(id, { body, sequence });
      replayed.lastIds.set(kind, Math.max(id, replayed.lastIds.get(kind) ?? 0));
    }
  }
  return replayed;
}

/** Holds the table of one kind of record against the replay. */
export function compareRecords(
  kind: RecordKind,
  rows: readonly RecordRow[],
  { records }: ReplayedRecords,
): VerifyProblem[] {
  const replayed = new Map(records.get(kind));
  const problems: VerifyProblem[] = [];
  for (const { id, body } of rows) {
    const where = `${kind} ${id}`;
    const expected = replayed.get(id);
    replayed.delete(id);
    if (!expected) {
      problems.push({ code: 'record-without-entry', where, detail: 'no trail entry accounts for it' });
    } else if (expected.body !== body) {
      problems.push({ code: 'record-altered', where, detail: howItDiffers(expected.body, body, expected.sequence) });
    }
  }
  for (const [id, { sequence }] of replayed) {
    problems.push({
      code: 'record-missing',
      where: `${kind} ${id}`,
      detail: `trail entry ${sequence} says that it is there`,
    });
  }
  return problems;
}

/** Holds the last number given out for a kind against the largest that the trail gives out. */
export function compareNumbering(kind: RecordKind, given = 0, { lastIds }: ReplayedRecords): VerifyProblem[] {
  const expected = lastIds.get(kind) ?? 0;
  if (given === expected) return [];
  const detail = `the last number given out is ${given}, but ${expected} by the trail`;
  return [{ code: 'record-altered', where: `numbering of ${kind}`, detail }];
}

function howItDiffers(expected: string, found: string, sequence: number): string {
  try {
    const difference = firstDifference(JSON.parse(expected), JSON.parse(found));
    if (!difference) return `written in another form than trail entry ${sequence} gives it`;
    return `${difference.path} is ${difference.other}, but ${difference.one} by trail entry ${sequence}`;
  } catch {
    return 'it cannot be read';
  }
}

function textOf(body: object | null): string | null {
  return body === null ? null : canonicalJson(body);
}
