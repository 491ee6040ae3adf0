import type { CarbonBudgetInput, CarbonBudgetValue } from '../../contract/carbon.ts';
import { InputError } from '../../errors.ts';
import { mean, sum } from '../../statistics/summation.ts';
import { budgetCaveats } from './budget-caveats.ts';
import { budgetColumns, type BudgetColumns } from './budget-columns.ts';
import { budgetSign } from './budget-sign.ts';
import { budgetUnitDoubt } from './budget-unit-doubt.ts';

/**
 * Carbon budget by year: what land and ocean together must have given off or taken up, given what people emitted and what
 * stayed in the atmosphere.
 *
 * Model    natural net flux = growth − fossil − land use; into the atmosphere is positive, so below zero nature is a net
 *          sink. Airborne fraction = growth/(fossil + land use), or growth/fossil. Residual land sink = emissions −
 *          growth − ocean sink; imbalance = emissions − growth − ocean sink − land sink. Sinks are positive when they take up
 *          carbon, cement carbonation among them: where it is given it is taken off fossil emissions
 * Assumes  conservation of mass; the same years in every column. The means of fractions are fractions of the sums
 *
 * @param input  [nYears] each, GtC/yr; growth alternatively in ppm/yr
 * @returns  GtC/yr and fractions by year and over all years; in how many years nature was a net sink; caveats
 * @throws   InputError `wrong-length`, `not-finite`, `negative`, `unordered-years`, `out-of-range`, `suspected-unit`
 *           (GtCO2 for GtC, ppm for GtC)
 *
 * Differs   headline figures count fossil emissions net of cement carbonation, the tables by year often gross with
 *           carbonation beside it. Means printed to one decimal close only to a few tenths
 * Source    Friedlingstein et al. 2025, Earth Syst. Sci. Data 17, 965, eq. 1
 * Checked   test/reference/climate/carbon-budget.test.ts (A: decadal means of two editions, from memory, to their
 *           rounding; C: by hand)
 */
export function carbonBudget(input: CarbonBudgetInput): CarbonBudgetValue {
  const columns = budgetColumns(input);
  const doubt = budgetUnitDoubt(input, columns);
  if (doubt?.isCertain && !input.unitConfirmed) throw new InputError(doubt);
  const { fossil, landUse, growth, oceanSink, landSink } = columns;
  const each = (value: (t: number) => number) => Array.from(fossil, (_, t) => value(t));
  const emissions = each((t) => fossil[t]! + landUse[t]!);
  const naturalNetFlux = each((t) => growth[t]! - emissions[t]!);
  const residualLandSink = oceanSink && each((t) => emissions[t]! - growth[t]! - oceanSink[t]!);
  const imbalance = residualLandSink && landSink && each((t) => residualLandSink[t]! - landSink[t]!);
  return {
    emissionsGtCPerYr: emissions,
    growthGtCPerYr: [...growth],
    naturalNetFluxGtCPerYr: naturalNetFlux,
    airborneFractionOfTotal: emissions.map((total, t) => share(growth[t]!, total)),
    airborneFractionOfFossil: Array.from(fossil, (value, t) => share(growth[t]!, value)),
    ...(residualLandSink ? { residualLandSinkGtCPerYr: residualLandSink } : {}),
    ...(imbalance ? { imbalanceGtCPerYr: imbalance } : {}),
    mean: {
      ...overall(columns, emissions),
      naturalNetFluxGtCPerYr: mean(naturalNetFlux),
      ...(residualLandSink ? { residualLandSinkGtCPerYr: mean(residualLandSink) } : {}),
      ...(imbalance ? { imbalanceGtCPerYr: mean(imbalance) } : {}),
    },
    sign: budgetSign(naturalNetFlux, input.years),
    caveats: budgetCaveats(input, doubt),
  };
}

function overall({ fossil, growth }: BudgetColumns, emissions: readonly number[]) {
  const total = sum(growth);
  return {
    emissionsGtCPerYr: mean(emissions),
    growthGtCPerYr: mean(growth),
    airborneFractionOfTotal: share(total, sum(emissions)),
    airborneFractionOfFossil: share(total, sum(fossil)),
  };
}

function share(part: number, whole: number): number | null {
  return whole > 0 ? part / whole : null;
}
