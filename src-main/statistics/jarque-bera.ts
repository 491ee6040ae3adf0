import { deviations } from './deviations.ts';
import { mean } from './summation.ts';
import { upperTailChiSquared } from './upper-tail-chi-squared.ts';

export interface JarqueBeraTest {
  statistic: number;
  /** Degrees of freedom of the chi-squared distribution: 2. */
  df: number;
  p: number;
  skewness: number;
  /** 3 for a normal distribution. */
  kurtosis: number;
}

/**
 * Jarque–Bera test: are values skewed, or their tails heavier or lighter than those of a normal distribution?
 *
 * Model    n/6 (S² + (K − 3)²/4), S = m₃/m₂^1.5, K = m₄/m₂², m_k = Σ(e − ē)^k/n; chi-squared with 2 degrees of freedom
 *          when the values are normal and many
 * Assumes  independent values. In short series the distribution has longer tails than χ²: p is then too large near 0.1 and
 *          too small near 0.01
 *
 * @param values  [nObs ≥ 4] finite, not all equal
 * @throws   InputError too-few-values, not-finite; NumericError constant
 *
 * Differs  residuals of a line through the origin do not average to zero; without demeaning the figures would be others
 * Source   Jarque & Bera 1980, Econ. Lett. 6, 255–259
 * Checked  test/reference/statistics/residual-distribution.test.ts (B: base R)
 */
export function jarqueBera(values: ArrayLike<number>): JarqueBeraTest {
  const d = deviations('jarqueBera', 'values', values, { atLeast: 4 });
  // In units of the standard deviation, so that no power leaves the range of a double.
  const largest = d.reduce((most, value) => Math.max(most, Math.abs(value)), 0);
  const root = largest * Math.sqrt(mean(d.map((value) => (value / largest) ** 2)));
  const u = d.map((value) => value / root);
  const skewness = mean(u.map((value) => value ** 3));
  const kurtosis = mean(u.map((value) => value ** 4));
  const statistic = (d.length / 6) * (skewness ** 2 + (kurtosis - 3) ** 2 / 4);
  return { statistic, df: 2, p: upperTailChiSquared(statistic, 2), skewness, kurtosis };
}
