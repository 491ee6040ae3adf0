import { deviations } from './deviations.ts';
import { finiteNumber, finiteValues } from './finite-values.ts';
import { sum, sumOfProducts } from './summation.ts';

/**
 * Autocorrelations by calendar distance: how much a value resembles the one k steps of time before it.
 *
 * Model    r_k = Σ (e_s − ē)(e_t − ē) / Σ (e_t − ē)², over the pairs with t − s = k that are both there; the divisor
 *          is that of all values, so that the r_k of a series with few pairs are small
 * Assumes  times in ascending order, a whole number of steps apart; gaps are allowed
 *
 * @param values  [nObs ≥ 3] finite, not all equal
 * @param times   [nObs] whole numbers: years
 * @param maxLag  1 … nObs − 1
 * @returns  [maxLag] r_1 … r_maxLag, each between −1 and 1
 * @throws   InputError wrong-length, too-few-values, not-finite, out-of-range; NumericError constant
 *
 * Differs  R's acf is the same without gaps; with NA (na.pass) it divides by the number of pairs
 * Source   Box & Jenkins 1970, Time Series Analysis, §2.1.5 (from memory); Parzen 1963, Sankhyā A 25, 383–392 (gaps;
 *          from memory)
 * Checked  test/reference/statistics/residual-plots.test.ts (B: R's acf; C: a gap by hand)
 */
export function autocorrelations(values: ArrayLike<number>, times: ArrayLike<number>, maxLag: number): number[] {
  const e = deviations('autocorrelations', 'values', values, { atLeast: 3 });
  const at = finiteValues('autocorrelations', 'times', times, { length: e.length });
  finiteNumber('autocorrelations', 'maxLag', maxLag, {
    isWhole: true,
    atLeast: 1,
    atMost: e.length - 1,
    hint: 'Take fewer lags or a longer series.',
  });
  const rowAt = new Map(Array.from(at, (time, row) => [time, row]));
  const squares = sumOfProducts(e, e);
  return Array.from({ length: maxLag }, (_, k) => {
    const products = e.map((value, row) => {
      const before = rowAt.get(at[row]! - (k + 1));
      return before === undefined ? 0 : value * e[before]!;
    });
    return sum(products) / squares;
  });
}
