import { finiteNumber, finiteValues } from './finite-values.ts';

/**
 * Quantile, type 7: linear between the order statistics, with the smallest value at 0 and the largest at 1.
 *
 * Model    h = (n − 1)p; x_(⌊h⌋) + (h − ⌊h⌋)(x_(⌊h⌋+1) − x_(⌊h⌋)), order statistics counted from 0
 *
 * @param values       [nObs ≥ 1] finite, in any order
 * @param probability  0 … 1
 * @throws   InputError too-few-values, not-finite, out-of-range
 *
 * Differs  nine definitions are in use; type 7 is the default of R, NumPy and spreadsheets, not of SAS or Minitab
 * Source   Hyndman & Fan 1996, Am. Stat. 50, 361–365, definition 7
 * Checked  test/reference/statistics/quantile.test.ts (B: R's quantile)
 */
export function quantile(values: ArrayLike<number>, probability: number): number {
  return quantileOfSorted(finiteValues('quantile', 'values', values).slice().sort(), probability);
}

/** The same for values that are in ascending order and finite already: sort once, ask often. */
export function quantileOfSorted(sorted: Float64Array, probability: number): number {
  finiteNumber('quantile', 'probability', probability, { atLeast: 0, atMost: 1 });
  const place = (sorted.length - 1) * probability;
  const below = Math.floor(place);
  const low = sorted[below]!;
  const high = sorted[Math.min(below + 1, sorted.length - 1)]!;
  return low + (place - below) * (high - low);
}
