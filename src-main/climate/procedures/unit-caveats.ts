import type { ClaimUnit } from '../../contract/stated.ts';
import type { Caveat } from '../../contract/primitives.ts';

/** The procedure may give another unit than the statement names: a slip of the source that the reviewer retraces. */
export function unitCaveats(computed: ClaimUnit, stated: ClaimUnit): Caveat[] {
  if (computed === stated) return [];
  return [
    {
      code: 'unit-differs',
      detail: `The procedure gives ${computed}, the statement says ${stated}: the numbers are compared as printed.`,
    },
  ];
}
