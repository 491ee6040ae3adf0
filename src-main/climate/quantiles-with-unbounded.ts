import { orderStatistic } from '../statistics/order-statistic.ts';

/**
 * Quantiles (type 7) of a sample of which some values are unbounded above: those rank above every finite value.
 *
 * @param finite         the finite values of the sample, in any order; **rearranged in place**
 * @param nAll           size of the whole sample, unbounded values included
 * @param probabilities  0 … 1 each, ascending
 * @returns  a quantile per probability, null where it falls among the unbounded values
 *
 * Source    Hyndman & Fan 1996, Am. Stat. 50, 361–365, definition 7, on the extended real line
 * Checked   test/unit/climate/quantiles-with-unbounded.test.ts (C: by hand, and against `quantile`)
 */
export function quantilesWithUnbounded<const Probabilities extends readonly number[]>(
  finite: Float64Array,
  nAll: number,
  probabilities: Probabilities,
): { -readonly [Place in keyof Probabilities]: number | null } {
  // What lies before a place that was asked for is not larger: the next search need not look there again.
  let settled = 0;
  const at = (place: number): number => {
    const value = orderStatistic(finite, place, settled);
    settled = place;
    return value;
  };
  return probabilities.map((probability) => {
    const place = (nAll - 1) * probability;
    const below = Math.floor(place);
    const share = place - below;
    const above = share === 0 ? below : below + 1;
    if (above >= finite.length) return null;
    const low = at(below);
    return low + share * (at(above) - low);
  }) as { -readonly [Place in keyof Probabilities]: number | null };
}
