import { trailEntry, type TrailEntry, type TrailHead, type VerifyProblem } from '../contract/trail.ts';
import { canonicalJson } from './canonical-json.ts';
import { emptyHead, entryHash, type TrailRow } from './trail-table.ts';

export interface CheckedChain {
  problems: VerifyProblem[];
  /** Entries that can be read, in their own order. */
  entries: TrailEntry[];
  /** Sequence and hash of the last entry found. */
  last: TrailHead;
}

interface ReadEntry extends TrailRow {
  parsed: TrailEntry | null;
  /** The number that the entry itself carries; that of its row when it cannot be read. */
  ownSequence: number;
}

/**
 * Walks the hash chain. Each fault is named where it is and the walk goes on behind it, so that one changed entry
 * is one problem and not as many as there are entries after it.
 */
export function verifyChain(rows: readonly TrailRow[]): CheckedChain {
  const found = rows.map(readEntry);
  const problems = found
    .filter(({ sequence, ownSequence }) => sequence !== ownSequence)
    .map(({ sequence, ownSequence }) =>
      problem('entry-order', sequence, `the entry in this place says that it is entry ${ownSequence}`),
    );

  const inOwnOrder = found.toSorted((one, other) => one.ownSequence - other.ownSequence);
  let previous = emptyHead;
  for (const { ownSequence, entry, hash, parsed } of inOwnOrder) {
    problems.push(...missingBetween(previous.sequence, ownSequence));
    if (!parsed) problems.push(problem('entry-altered', ownSequence, 'it is not an entry as Footing writes it'));
    else if (ownSequence === previous.sequence + 1 && entryHash(previous.hash, entry) !== hash) {
      problems.push(problem('entry-altered', ownSequence, whyHashDiffers(ownSequence)));
    }
    previous = { sequence: ownSequence, hash };
  }
  return {
    problems,
    entries: inOwnOrder.flatMap(({ parsed }) => parsed ?? []),
    last: previous,
  };
}

function readEntry(row: TrailRow): ReadEntry {
  try {
    const parsed = trailEntry.parse(JSON.parse(row.entry));
    if (canonicalJson(parsed) === row.entry) return { ...row, parsed, ownSequence: parsed.sequence };
  } catch {
    // Reported by the walk.
  }
  return { ...row, parsed: null, ownSequence: row.sequence };
}

function whyHashDiffers(sequence: number): string {
  const before = sequence === 1 ? 'the beginning' : `entry ${sequence - 1}`;
  return `its hash does not follow from ${before} and its own words: one of them was changed`;
}

function missingBetween(previous: number, next: number): VerifyProblem[] {
  if (next <= previous) return [problem('entry-order', next, 'there is more than one entry of this number')];
  const nMissing = next - previous - 1;
  if (nMissing === 0) return [];
  if (nMissing === 1) return [problem('entry-missing', previous + 1, 'there is no such entry')];
  return [problem('entry-missing', previous + 1, `${nMissing} entries from here to entry ${next - 1} are not there`)];
}

/** Holds the last entry found against the project's record of it, which shows an entry removed from the end. */
export function compareWithHead(last: TrailHead, head: TrailHead | undefined): VerifyProblem[] {
  const where = 'head';
  if (!head) return [{ code: 'head-mismatch', where, detail: 'the record of the last entry is missing' }];
  if (head.sequence > last.sequence) return missingBetween(last.sequence, head.sequence + 1);
  if (head.sequence < last.sequence) {
    const detail = `the head is at entry ${head.sequence}, but the trail goes on to entry ${last.sequence}`;
    return [{ code: 'head-mismatch', where, detail }];
  }
  if (head.hash === last.hash) return [];
  return [{ code: 'head-mismatch', where, detail: `the head has another hash than entry ${last.sequence}` }];
}

function problem(code: VerifyProblem['code'], sequence: number, detail: string): VerifyProblem {
  return { code, where: `trail entry ${sequence}`, detail };
}
