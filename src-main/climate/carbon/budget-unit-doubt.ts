import type { CarbonBudgetInput } from '../../contract/carbon.ts';
import type { ErrorFields } from '../../errors.ts';
import { formatNumber } from '../../quantities/notation.ts';
import { mean, sum } from '../../statistics/summation.ts';
import type { BudgetColumns } from './budget-columns.ts';

/** World fossil emissions by year, GtC/yr, roughly and from memory: only to suspect a unit from. */
const usualFossil: readonly (readonly [year: number, gtCPerYr: number])[] = [
  [1850, 0.1],
  [1900, 0.5],
  [1950, 1.6],
  [1960, 2.6],
  [1980, 5.3],
  [2000, 6.9],
  [2024, 10.2],
];

/** Between one and 3.664, so that neither a high estimate nor CO2 in place of carbon is missed. */
const suspectedExcess = 1.9;

/** Five years average over the ups and downs that El Niño and eruptions give the growth of single years. */
const settledYears = 5;

/**
 * Whether a budget's numbers look like another unit than GtC per year.
 *
 * Model    fossil emissions more than 1.9 times the world's in the same years: GtCO2. Growth over emissions, 0.44 ± 0.1
 *          in every span of years since 1959: near 0.12 when emissions are GtCO2, near 0.21 when growth is ppm, near 1.6 when
 *          growth is GtCO2
 *
 * @returns  what an error says; null when nothing is suspected. `isCertain` is false where a few years could be that way
 *
 * Source    mass ratio of CO2 to carbon 3.664 and 2.124 GtC per ppm; airborne fraction from memory
 * Checked   test/unit/climate/carbon/carbon-budget.test.ts (C: each slip made and found, right units not suspected)
 */
export function budgetUnitDoubt(
  input: CarbonBudgetInput,
  { fossil, landUse, growth }: BudgetColumns,
): (ErrorFields & { isCertain: boolean }) | null {
  const meanFossil = mean(fossil);
  const usual = input.years ? mean(input.years.map(usualFossilIn)) : usualFossilIn(Infinity);
  const confirm = 'If the values are right, say so with unitConfirmed.';
  if (meanFossil > suspectedExcess * usual) {
    return {
      code: 'suspected-unit',
      where: 'carbonBudget, fossilGtCPerYr',
      expected: `fossil emissions in GtC per year, in the world about ${formatNumber(usual, 1)} in these years`,
      received: `${formatNumber(meanFossil, 1)} in the mean`,
      hint: `It looks like GtCO2: divide by 3.664, which gives ${formatNumber(meanFossil / 3.664, 1)}. ${confirm}`,
      isCertain: true,
    };
  }
  const emissions = sum(fossil) + sum(landUse);
  const share = sum(growth) / emissions;
  const slip = emissions > 0 ? slipBehind(share, input.growthPpmPerYr !== undefined) : null;
  if (!slip) return null;
  return {
    code: 'suspected-unit',
    where: `carbonBudget, ${slip.field}`,
    expected: 'growth and emissions in one unit; the atmosphere has kept 0.35 to 0.55 of emissions since 1959',
    received: `a growth of ${formatNumber(share, 2)} times the emissions`,
    hint: `${slip.hint} ${confirm}`,
    isCertain: fossil.length >= settledYears,
  };
}

function slipBehind(share: number, isGrowthFromPpm: boolean): { field: string; hint: string } | null {
  const growthField = isGrowthFromPpm ? 'growthPpmPerYr' : 'growthGtCPerYr';
  // A growth in GtC that is multiplied by 2.124 once more comes to about 0.93.
  if (share > (isGrowthFromPpm ? 0.75 : 1.1)) {
    const hint = isGrowthFromPpm
      ? 'Growth looks like GtC: give it as growthGtCPerYr.'
      : 'Growth looks like GtCO2: divide by 3.664.';
    return { field: growthField, hint };
  }
  // Between 0.12 and 0.21, and below the 0.35 of any five years.
  if (share > 0 && share < 0.16) {
    return { field: 'fossilGtCPerYr', hint: 'Emissions look like GtCO2: divide by 3.664.' };
  }
  if (share > 0 && share < 0.28 && !isGrowthFromPpm) {
    return { field: growthField, hint: 'Growth looks like ppm: give it as growthPpmPerYr.' };
  }
  return null;
}

/** Straight between the years of the table, level beyond its ends. */
function usualFossilIn(year: number): number {
  const after = usualFossil.findIndex(([tableYear]) => tableYear >= year);
  const [endYear, end] = usualFossil.at(after)!;
  if (after <= 0) return end;
  const [startYear, start] = usualFossil[after - 1]!;
  return start + ((end - start) * (year - startYear)) / (endYear - startYear);
}
