/**
 * Quantiles (type 7) of a sample of which some values are unbounded above: those rank above every finite value.
 *
 * @param finite       the finite values of the sample, in any order; **sorted in place**
 * @param nAll         size of the whole sample, unbounded values included
 * @param probabilities  0 … 1 each
 * @returns  a quantile per probability, null where it falls among the unbounded values
 *
 * Source    Hyndman & Fan 1996, Am. Stat. 50, 361–365, definition 7, on the extended real line
 * Checked   test/unit/climate/quantiles-with-unbounded.test.ts (C: by hand)
 */
export function quantilesWithUnbounded<const Probabilities extends readonly number[]>(
  finite: Float64Array,
  nAll: number,
  probabilities: Probabilities,
): { -readonly [Place in keyof Probabilities]: number | null } {
  finite.sort();
  return probabilities.map((probability) => {
    const place = (nAll - 1) * probability;
    const below = Math.floor(place);
    const share = place - below;
    const low = finite[below];
    const high = share === 0 ? low : finite[below + 1];
    return low === undefined || high === undefined ? null : low + share * (high - low);
  }) as { -readonly [Place in keyof Probabilities]: number | null };
}
