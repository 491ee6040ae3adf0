import regularisedIncompleteBeta from '@stdlib/math-base-special-betainc';
import { finiteNumber } from './finite-values.ts';

/**
 * Upper-tail p-value of an F statistic: P(F > f) with d1 and d2 degrees of freedom.
 *
 * Model    I_z(d2/2, d1/2) at z = d2/(d2 + d1 f), I the regularised incomplete beta function: taken directly, and from
 *          whichever side is the smaller, so that neither a tiny p nor a tiny f loses its digits. (A cumulative
 *          distribution F(f) keeps none of a p below 1e-16, and some lose half of them from f ≈ 1e5 on.)
 *
 * @returns  p to a relative 1e-12 up to 1e4 degrees of freedom, 1e-11 up to 1e6
 * @throws   InputError out-of-range
 *
 * Source   Abramowitz & Stegun 1964, 26.6.2
 * Checked  test/reference/statistics/distributions.test.ts (B: R's pf over the tails)
 */
export function upperTailF(f: number, numeratorDegrees: number, denominatorDegrees: number): number {
  finiteNumber('upperTailF', 'f', f, { atLeast: 0 });
  finiteNumber('upperTailF', 'numeratorDegrees', numeratorDegrees, { above: 0 });
  finiteNumber('upperTailF', 'denominatorDegrees', denominatorDegrees, { above: 0 });
  // The square of a Cauchy variable, where the library's closed form cancels.
  if (numeratorDegrees === 1 && denominatorDegrees === 1) return (2 / Math.PI) * Math.atan2(1, Math.sqrt(f));

  const explained = numeratorDegrees * f;
  const total = denominatorDegrees + explained;
  const [a, b] = [denominatorDegrees / 2, numeratorDegrees / 2];
  return explained > denominatorDegrees
    ? regularisedIncompleteBeta(denominatorDegrees / total, a, b, true, false)
    : regularisedIncompleteBeta(explained / total, b, a, true, true);
}
