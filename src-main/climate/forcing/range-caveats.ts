import type { ForcingFormula } from '../../contract/forcing.ts';
import type { Caveat } from '../../contract/primitives.ts';
import { gasUnits, type Gas } from './gas-values.ts';

interface ValidRange {
  low: number;
  high: number;
}

const lineByLine = 'the range of the line-by-line results that it was fitted to';
const firstAssessment = 'stated with the formulas in 1990';

/**
 * Where each set of formulas holds. Etminan 2016: second-hand. IPCC 1990: 1000 ppm second-hand, 5 ppm from memory.
 * Meinshausen 2020 is a refit to the results of Etminan 2016 (from memory); it is held constant above instead of
 * bending down. Myhre 1998: no range of its own is on record here.
 */
const validity: Readonly<Record<ForcingFormula, { ranges: Partial<Record<Gas, ValidRange>>; origin: string }>> = {
  ipcc1990: {
    ranges: {
      co2Ppm: { low: 0, high: 1000 },
      ch4Ppb: { low: 0, high: 5000 },
      n2oPpb: { low: 0, high: 5000 },
    },
    origin: firstAssessment,
  },
  myhre1998: {
    ranges: { co2Ppm: { low: 0, high: 1000 } },
    origin: `${firstAssessment} whose form it keeps; Myhre’s own range is not on record here`,
  },
  etminan2016: {
    ranges: {
      co2Ppm: { low: 180, high: 2000 },
      ch4Ppb: { low: 340, high: 3500 },
      n2oPpb: { low: 200, high: 525 },
    },
    origin: lineByLine,
  },
  meinshausen2020: {
    ranges: {
      co2Ppm: { low: 180, high: 2000 },
      ch4Ppb: { low: 340, high: 3500 },
      n2oPpb: { low: 200, high: 525 },
    },
    origin: lineByLine,
  },
};

/**
 * One caveat for each gas that leaves the range where the formulas hold, naming the range, the value furthest outside
 * and how many there are.
 *
 * @param values  concentrations by gas, current and reference alike
 */
export function rangeCaveats(formula: ForcingFormula, values: Partial<Record<Gas, readonly Float64Array[]>>): Caveat[] {
  const { ranges, origin } = validity[formula];
  return (Object.keys(gasUnits) as Gas[]).flatMap((gas) => {
    const range = ranges[gas];
    const columns = values[gas];
    if (!range || !columns) return [];
    const { worst, nOutside } = outside(columns, range);
    if (nOutside === 0) return [];
    const { name, unit } = gasUnits[gas];
    const span = range.low === 0 ? `up to ${range.high} ${unit}` : `${range.low}–${range.high} ${unit}`;
    const others = nOutside > 1 ? `, the furthest of ${nOutside} such values` : '';
    return [
      {
        code: 'outside-formula-range',
        detail: `${name} of ${worst} ${unit}${others}, is outside ${span}, ${origin} (${formula}). The forcing there is extrapolated.`,
      },
    ];
  });
}

/** By ratio to the end that it passes: concentrations force by ratios. */
function outside(columns: readonly Float64Array[], { low, high }: ValidRange): { worst: number; nOutside: number } {
  let worst = NaN;
  let furthest = 1;
  let nOutside = 0;
  for (const column of columns) {
    for (const value of column) {
      const excess = Math.max(low / value, value / high);
      if (excess <= 1) continue;
      nOutside++;
      if (excess > furthest) [worst, furthest] = [value, excess];
    }
  }
  return { worst, nOutside };
}
