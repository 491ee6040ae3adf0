import type { CarbonBudgetInput } from '../../contract/carbon.ts';
import { gtCFromPpm, gtCPerPpm as usualGtCPerPpm } from '../../quantities/carbon-units.ts';
import { finiteNumber, finiteValues } from '../../statistics/finite-values.ts';
import { yearSteps } from '../../statistics/year-steps.ts';

export interface BudgetColumns {
  /** Less cement carbonation. */
  fossil: Float64Array;
  landUse: Float64Array;
  growth: Float64Array;
  oceanSink: Float64Array | null;
  landSink: Float64Array | null;
}

/**
 * The door for a carbon budget: columns of one length in GtC per year, growth converted when it came in ppm, cement
 * carbonation (a sink, positive) taken off fossil emissions.
 *
 * @returns  [nYears] each, GtC/yr
 * @throws   InputError `wrong-length`, `not-finite`, `too-large`, `negative` (fossil emissions, carbonation),
 *           `unordered-years`, `out-of-range` (a factor that is none for GtC per ppm)
 *
 * Checked   test/unit/climate/carbon/carbon-budget.test.ts (C: each refusal; columns by hand)
 */
export function budgetColumns(input: CarbonBudgetInput): BudgetColumns {
  const given = finiteValues('carbonBudget', 'fossilGtCPerYr', input.fossilGtCPerYr, { sign: 'non-negative' });
  const length = given.length;
  yearSteps('carbonBudget', input.years, length);
  const column = (name: 'landUseGtCPerYr' | 'oceanSinkGtCPerYr' | 'landSinkGtCPerYr') => {
    const values = input[name];
    return values ? finiteValues('carbonBudget', name, values, { length }) : null;
  };
  const carbonation = input.cementCarbonationGtCPerYr
    ? finiteValues('carbonBudget', 'cementCarbonationGtCPerYr', input.cementCarbonationGtCPerYr, {
        length,
        sign: 'non-negative',
      })
    : null;
  return {
    fossil: carbonation ? given.map((value, t) => value - carbonation[t]!) : given,
    landUse: column('landUseGtCPerYr') ?? new Float64Array(length),
    growth: growthOf(input, length),
    oceanSink: column('oceanSinkGtCPerYr'),
    landSink: column('landSinkGtCPerYr'),
  };
}

function growthOf(
  { growthGtCPerYr, growthPpmPerYr, gtCPerPpm = usualGtCPerPpm }: CarbonBudgetInput,
  length: number,
): Float64Array {
  // The span of what has been published, and far from 7.8 GtCO2 per ppm.
  finiteNumber('carbonBudget', 'gtCPerPpm', gtCPerPpm, { atLeast: 2, atMost: 2.3 });
  if (growthGtCPerYr) return finiteValues('carbonBudget', 'growthGtCPerYr', growthGtCPerYr, { length });
  return finiteValues('carbonBudget', 'growthPpmPerYr', growthPpmPerYr ?? [], { length }).map((ppm) =>
    gtCFromPpm(ppm, gtCPerPpm),
  );
}
