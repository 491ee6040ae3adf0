import { finiteNumber } from './finite-values.ts';
import { upperTailF } from './upper-tail-f.ts';

/**
 * Two-sided p-value of a t statistic: P(|T| > |t|), as the upper tail of t², which is F with 1 and ν degrees of freedom.
 * Tiny values keep their digits (2(1 − F(|t|)) has none left at t ≈ 9).
 *
 * @throws   InputError out-of-range
 *
 * Checked  test/reference/statistics/distributions.test.ts (B: R's pt over the tails)
 */
export function twoSidedP(t: number, degreesOfFreedom: number): number {
  finiteNumber('twoSidedP', 't', t, { atLeast: -1e150, atMost: 1e150 });
  finiteNumber('twoSidedP', 'degreesOfFreedom', degreesOfFreedom, { above: 0 });
  return upperTailF(t ** 2, 1, degreesOfFreedom);
}
