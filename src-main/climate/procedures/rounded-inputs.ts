import { statedInterval, type RoundingInterval } from '../../quantities/stated-number.ts';

/**
 * The numbers that a formula gives when its inputs are taken with the rounding of their digits: the least and the greatest
 * over all ends. Exact for formulas that rise or fall with each input over its interval.
 *
 * @param inputs  as given; trailing zeros are not known, so that the interval is rather too wide than too narrow
 *
 * Source   interval arithmetic on rounded numbers: common practice
 * Checked  test/unit/climate/procedures/rounded-inputs.test.ts (C: by hand)
 */
export function withRoundedInputs(
  inputs: readonly number[],
  formula: (...inputs: number[]) => number,
): RoundingInterval | undefined {
  const corners = inputs.reduce<number[][]>(
    (partial, input) => {
      const { low, high } = statedInterval(String(input));
      return partial.flatMap((rest) => [
        [...rest, low],
        [...rest, high],
      ]);
    },
    [[]],
  );
  const results = corners.map((corner) => formula(...corner));
  if (!results.every(Number.isFinite)) return undefined;
  return { low: Math.min(...results), high: Math.max(...results) };
}
