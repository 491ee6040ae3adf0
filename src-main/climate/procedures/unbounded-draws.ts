import type { Caveat } from '../../contract/primitives.ts';

/** What must stand beside a range of which some draws have no finite value. */
export function unboundedDraws(shareUndefined: number, because: string): Caveat[] {
  if (shareUndefined === 0) return [];
  return [
    {
      code: 'unbounded-draws',
      detail: `In ${(100 * shareUndefined).toPrecision(2)} % of the draws ${because}; they count as unbounded above.`,
    },
  ];
}
