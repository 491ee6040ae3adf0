import type { TrailEntry, TrailLine } from '../contract/trail.ts';
import { parseEntry, type TrailTable } from './trail-table.ts';

/** An entry without its records: what lists and undo need. */
export interface TrailSummary extends Omit<TrailLine, 'isUndone' | 'canUndo'> {
  /** Why this entry can never be taken back; null when it can. */
  permanentBecause: string | null;
  /** Claims whose finding this entry signs. */
  signsClaimIds: number[];
}

/** The whole trail in short, read once and then only as far as it has grown. */
export class TrailIndex {
  readonly #trail: TrailTable;
  readonly #summaries: TrailSummary[] = [];

  constructor(trail: TrailTable) {
    this.#trail = trail;
  }

  summaries(): readonly TrailSummary[] {
    for (const row of this.#trail.rowsAfter(this.#summaries.at(-1)?.sequence ?? 0)) {
      this.#summaries.push(summarise(parseEntry(row), row.hash));
    }
    return this.#summaries;
  }
}

function summarise({ changes, content: _content, ...line }: TrailEntry, hash: string): TrailSummary {
  const claimIds = changes.flatMap(({ kind, id, before, after }) =>
    kind === 'claim' ? id : [before?.['claimId'], after?.['claimId']].filter((value) => typeof value === 'number'),
  );
  const signsClaimIds = changes.flatMap(({ kind, after }) =>
    kind === 'signature' && typeof after?.['claimId'] === 'number' ? after['claimId'] : [],
  );
  const createsProject = changes.some(({ kind, before }) => kind === 'project' && before === null);
  return {
    ...line,
    hash,
    claimIds: [...new Set(claimIds)].sort((one, other) => one - other),
    signsClaimIds,
    permanentBecause: createsProject ? 'it created the project' : signsClaimIds.length > 0 ? 'a signature stays' : null,
  };
}
