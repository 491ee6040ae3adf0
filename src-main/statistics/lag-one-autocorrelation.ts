import { deviations } from './deviations.ts';
import { sumOfProducts } from './summation.ts';

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
  const e = deviations('lagOneAutocorrelation', 'values', values, { atLeast: 3 });
  return sumOfProducts(e.subarray(1), e.subarray(0, -1)) / sumOfProducts(e, e);
}
