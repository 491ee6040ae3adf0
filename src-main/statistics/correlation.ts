import { NumericError } from '../errors.ts';
import { finiteValues } from './finite-values.ts';
import { mean, sumOfProducts } from './summation.ts';

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
  const dx = unitDeviations('x', finiteValues('correlation', 'x', x, { atLeast: 2 }));
  const dy = unitDeviations('y', finiteValues('correlation', 'y', y, { length: x.length }));
  return Math.max(-1, Math.min(1, sumOfProducts(dx, dy)));
}

function unitDeviations(name: string, values: Float64Array): Float64Array {
  const average = mean(values);
  const deviations = values.map((value) => value - average);
  const largest = deviations.reduce((most, value) => Math.max(most, Math.abs(value)), 0);
  if (largest === 0 || values.every((value) => value === values[0])) {
    throw new NumericError({
      code: 'constant',
      where: `correlation, ${name}`,
      expected: 'values that are not all equal',
      received: `${values.length} times ${values[0]}`,
      hint: 'A constant correlates with nothing.',
    });
  }
  const scaled = deviations.map((value) => value / largest);
  const length = Math.sqrt(sumOfProducts(scaled, scaled));
  return scaled.map((value) => value / length);
}
