import gammainc from '@stdlib/math-base-special-gammainc';
import { finiteNumber } from './finite-values.ts';

/**
 * Upper-tail p-value of a chi-squared statistic, from the upper incomplete gamma function itself, so that it keeps its
 * digits when it is tiny.
 *
 * @throws   InputError out-of-range
 *
 * Checked  test/reference/statistics/distributions.test.ts (B: R's pchisq over the tails)
 */
export function upperTailChiSquared(statistic: number, degreesOfFreedom: number): number {
  finiteNumber('upperTailChiSquared', 'statistic', statistic, { atLeast: 0 });
  finiteNumber('upperTailChiSquared', 'degreesOfFreedom', degreesOfFreedom, { above: 0 });
  return gammainc(statistic / 2, degreesOfFreedom / 2, true, true);
}
