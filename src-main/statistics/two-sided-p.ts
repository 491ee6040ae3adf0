import tCdf from '@stdlib/stats-base-dists-t-cdf';
import { finiteNumber } from './finite-values.ts';

/**
 * Two-sided p-value of a t statistic, taken from the lower tail, so that it keeps its digits when it is tiny
 * (1 − F(t) would be 0 or rounding from t ≈ 9 on).
 *
 * @throws   InputError out-of-range
 *
 * Checked  test/reference/statistics/distributions.test.ts (B: R's pt over the tails)
 */
export function twoSidedP(t: number, degreesOfFreedom: number): number {
  finiteNumber('twoSidedP', 't', t);
  finiteNumber('twoSidedP', 'degreesOfFreedom', degreesOfFreedom, { above: 0 });
  return 2 * tCdf(-Math.abs(t), degreesOfFreedom);
}
