import { NumericError } from '../errors.ts';
import { finiteValues } from './finite-values.ts';
import { mean, sumOfProducts } from './summation.ts';

/**
 * Lag-one autocorrelation, demeaned: how much a value resembles the one before it.
 *
 * Model    r = Σ_{t≥2} (e_t − ē)(e_{t−1} − ē) / Σ (e_t − ē)², ē the mean of all values
 * Assumes  values in order of time, equally spaced
 *
 * @param values  [nObs ≥ 3] finite, not all equal
 * @returns  r between −1 and 1; biased towards 0 by about (1 + 3r)/n in short series
 * @throws   InputError too-few-values, not-finite; NumericError constant
 *
 * Differs  residuals through the origin do not average to zero; without demeaning r would be larger
 * Source   Box & Jenkins 1970, Time Series Analysis, §2.1.5 (from memory)
 * Checked  test/reference/statistics/serial-correlation.test.ts (B: R's acf)
 */
export function lagOneAutocorrelation(values: ArrayLike<number>): number {
  const e = finiteValues('lagOneAutocorrelation', 'values', values, { atLeast: 3 });
  const average = mean(e);
  const deviations = e.map((value) => value - average);
  const squares = sumOfProducts(deviations, deviations);
  if (squares === 0 || e.every((value) => value === e[0])) {
    throw new NumericError({
      code: 'constant',
      where: 'lagOneAutocorrelation, values',
      expected: 'values that are not all equal',
      received: `${e.length} times ${e[0]}`,
      hint: 'A constant has no autocorrelation.',
    });
  }
  return sumOfProducts(deviations.subarray(1), deviations.subarray(0, -1)) / squares;
}
