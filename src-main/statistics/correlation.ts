import { deviations } from './deviations.ts';
import { sumOfProducts } from './summation.ts';

/**
 * Pearson's correlation coefficient r of two series, row by row.
 *
 * Model    Σ(x − x̄)(y − ȳ) / √(Σ(x − x̄)² Σ(y − ȳ)²)
 *
 * @param x, y  [nObs ≥ 2] finite, neither constant
 * @returns  −1 … 1
 * @throws   InputError wrong-length, too-few-values, not-finite; NumericError constant
 *
 * Source   Pearson 1896, Phil. Trans. R. Soc. A 187, 253–318
 * Checked  test/reference/statistics/correlation.test.ts (B: R's cor)
 */
export function correlation(x: ArrayLike<number>, y: ArrayLike<number>): number {
  const dx = unitVector(deviations('correlation', 'x', x, { atLeast: 2 }));
  const dy = unitVector(deviations('correlation', 'y', y, { length: x.length }));
  return Math.max(-1, Math.min(1, sumOfProducts(dx, dy)));
}

function unitVector(values: Float64Array): Float64Array {
  const largest = values.reduce((most, value) => Math.max(most, Math.abs(value)), 0);
  const scaled = values.map((value) => value / largest);
  const length = Math.sqrt(sumOfProducts(scaled, scaled));
  return scaled.map((value) => value / length);
}
