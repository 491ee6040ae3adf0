import type { TrailSummary } from './trail-index.ts';

/** One step back or forth along the trail. */
export interface UndoStep {
  /** The entry that this step takes back. */
  sequence: number;
  /** What would be undone or done again, in words: "mark assumption · claim 2 · window". */
  words: string;
  /** Why the step cannot be taken; null when it can. */
  refusal: string | null;
}

export interface UndoPlan {
  undo: UndoStep | null;
  redo: UndoStep | null;
  /** Entries whose effect is taken back at present. */
  undone: ReadonlySet<number>;
}

/**
 * Works out from the trail alone what Undo and Redo would do next. An entry that takes back an ordinary entry is an
 * undo; one that takes back an undo is a redo, and can be undone in turn. An ordinary entry ends what could be redone.
 * Signatures stay, and so does everything that a signed finding stood on when it was signed.
 */
export function undoPlan(trail: readonly TrailSummary[]): UndoPlan {
  const toUndo: TrailSummary[] = [];
  let toRedo: TrailSummary[] = [];
  const bySequence = new Map(trail.map((entry) => [entry.sequence, entry]));
  const signedAt = new Map<number, number>();

  for (const entry of trail) {
    for (const claimId of entry.signsClaimIds) signedAt.set(claimId, entry.sequence);
    if (entry.undoes === null) {
      toRedo = [];
      if (entry.permanentBecause === null) toUndo.push(entry);
    } else if (toRedo.at(-1)?.sequence === entry.undoes) {
      toRedo.pop();
      toUndo.push(entry);
    } else {
      toUndo.pop();
      toRedo.push(entry);
    }
  }

  const step = (entry: TrailSummary | undefined): UndoStep | null =>
    entry ? { sequence: entry.sequence, words: wordsOf(entry, bySequence), refusal: refusalOf(entry, signedAt) } : null;
  return { undo: step(toUndo.at(-1)), redo: step(toRedo.at(-1)), undone: undoneEntries(trail) };
}

function refusalOf(entry: TrailSummary, signedAt: ReadonlyMap<number, number>): string | null {
  const signedClaimId = entry.claimIds.find((claimId) => (signedAt.get(claimId) ?? 0) > entry.sequence);
  if (signedClaimId === undefined) return null;
  return `the finding on claim ${signedClaimId} was signed after it (entry ${signedAt.get(signedClaimId)}); revise the finding instead`;
}

/** The words of the ordinary entry at the root of a chain of undoing and redoing. */
function wordsOf(entry: TrailSummary, bySequence: ReadonlyMap<number, TrailSummary>): string {
  let root = entry;
  for (let undone = bySequence.get(root.undoes ?? 0); undone; undone = bySequence.get(root.undoes ?? 0)) root = undone;
  return `${root.action} · ${root.subject}`;
}

/** Backwards: an entry is undone when a later one takes it back that is not itself undone. */
function undoneEntries(trail: readonly TrailSummary[]): Set<number> {
  const undone = new Set<number>();
  for (const entry of trail.toReversed()) {
    if (entry.undoes !== null && !undone.has(entry.sequence)) undone.add(entry.undoes);
  }
  return undone;
}
