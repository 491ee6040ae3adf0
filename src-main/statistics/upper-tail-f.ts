import fCdf from '@stdlib/stats-base-dists-f-cdf';
import { finiteNumber } from './finite-values.ts';

/**
 * Upper-tail p-value of an F statistic: P(F > f) with d1 and d2 degrees of freedom. Taken as the lower tail of 1/F,
 * which has d2 and d1 degrees of freedom, so that it keeps its digits when it is tiny.
 *
 * @throws   InputError out-of-range
 *
 * Checked  test/reference/statistics/distributions.test.ts (B: R's pf over the tails)
 */
export function upperTailF(f: number, numeratorDegrees: number, denominatorDegrees: number): number {
  finiteNumber('upperTailF', 'f', f, { atLeast: 0 });
  finiteNumber('upperTailF', 'numeratorDegrees', numeratorDegrees, { above: 0 });
  finiteNumber('upperTailF', 'denominatorDegrees', denominatorDegrees, { above: 0 });
  return f === 0 ? 1 : fCdf(1 / f, denominatorDegrees, numeratorDegrees);
}
