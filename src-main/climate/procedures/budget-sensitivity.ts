import type { ClaimComputation } from '../../contract/compute.ts';
import type { EnergyBudgetAnswer } from '../../contract/energy-budget.ts';
import type { EnergyBudgetProcedure } from '../../contract/procedure.ts';
import type { Recomputation } from '../../contract/result.ts';
import { InputError, NumericError } from '../../errors.ts';
import { inputText } from '../../quantities/input-text.ts';
import { formatNumber, formatQuantity } from '../../quantities/notation.ts';
import { perDoublingFactor } from '../../quantities/per-doubling-factor.ts';
import { quantityNames } from '../../quantities/quantity-names.ts';
import { agreementWithStated } from '../../quantities/stated-number.ts';
import { energyBudget } from '../energy-budget.ts';
import { withRoundedInputs } from './rounded-inputs.ts';

type Estimate = EnergyBudgetProcedure['estimate'];

const answerOf = {
  'effective-climate-sensitivity': 'effcs',
  'transient-climate-response': 'tcr',
  'equilibrium-climate-sensitivity': 'ecs',
} as const satisfies Record<Estimate, keyof EnergyBudgetAnswer['central']>;

/**
 * A sensitivity from an energy budget between two periods: the number of the central inputs, with its 5–95 % range by
 * Monte Carlo.
 *
 * @returns  agreement takes the inputs with the rounding of their digits
 * @throws   InputError `pattern-missing`, `unit-mismatch`; NumericError `no-finite-sensitivity` where the central inputs
 *           leave nothing below the line; as `energyBudget`
 *
 * Source    as `energyBudget`
 * Checked   test/unit/climate/procedures/budget-sensitivity.test.ts (A: AR6 §7.5.2.1 as published)
 */
export function budgetSensitivity(
  { statement, seed }: ClaimComputation,
  procedure: EnergyBudgetProcedure,
): Recomputation {
  const { estimate, warmingK, forcingWm2, uptakeWm2, doublingWm2, patternWm2PerK, correlation, draws } = procedure;
  if (estimate === 'equilibrium-climate-sensitivity' && !patternWm2PerK) {
    throw new InputError({
      code: 'pattern-missing',
      where: 'procedure energy-budget',
      expected: 'a pattern effect, by which the equilibrium differs from the effective sensitivity',
      received: 'none',
      hint: 'Give it, 0 to 0 if it is taken as absent, or ask for the effective sensitivity.',
    });
  }
  const factor = perDoublingFactor(statement.unit);
  const inputs = { warmingK, forcingWm2, uptakeWm2, doublingWm2, ...(patternWm2PerK ? { patternWm2PerK } : {}) };
  const budget = energyBudget({ ...inputs, correlation, draws, seed });
  const central = budget.central[answerOf[estimate]];
  if (central === null) {
    throw new NumericError({
      code: 'no-finite-sensitivity',
      where: 'procedure energy-budget',
      expected: `a forcing change that exceeds ${estimate === 'transient-climate-response' ? 'zero' : 'the heat uptake'}${patternWm2PerK ? ' and the pattern effect' : ''}`,
      received: `ΔF ${forcingWm2.best}, ΔN ${uptakeWm2.best} W/m²`,
      hint: 'Check signs and units. Such a budget bounds the sensitivity from below only and gives no best value.',
    });
  }
  const value = central * factor;
  const quantiles = budget[answerOf[estimate]];
  const { unit } = statement;
  return {
    quantity: estimate,
    unit,
    value,
    standardError: null,
    interval: { low: scaled(quantiles?.q05, factor), high: scaled(quantiles?.q95, factor), levelPercent: 90 },
    agreement: agreementWithStated(statement.value, value, {
      bound: statement.bound,
      unit,
      computedInterval: withRoundedInputs(
        [warmingK, forcingWm2, uptakeWm2, doublingWm2, patternWm2PerK ?? { best: 0 }].map(({ best }) => best),
        (warming = NaN, forcing = NaN, uptake = NaN, doubling = NaN, pattern = NaN) =>
          (factor * doubling * warming) / denominator(estimate, { warming, forcing, uptake, pattern }),
      ),
    }),
    fit: null,
    conversion: `${formulas[estimate]} = ${formatQuantity(value, unit, { significantDigits: 4 })}`,
    working: workingOf(procedure, budget),
    caveats: budget.caveats,
  };
}

const formulas: Record<Estimate, string> = {
  'effective-climate-sensitivity': 'F2x ΔT / (ΔF − ΔN)',
  'transient-climate-response': 'F2x ΔT / ΔF',
  'equilibrium-climate-sensitivity': 'F2x ΔT / (ΔF − ΔN − α′ΔT)',
};

function denominator(
  estimate: Estimate,
  { warming, forcing, uptake, pattern }: { warming: number; forcing: number; uptake: number; pattern: number },
): number {
  if (estimate === 'transient-climate-response') return forcing;
  return forcing - uptake - (estimate === 'equilibrium-climate-sensitivity' ? pattern * warming : 0);
}

function workingOf(procedure: EnergyBudgetProcedure, budget: EnergyBudgetAnswer): Recomputation['working'] {
  const { warmingK, forcingWm2, uptakeWm2, doublingWm2, patternWm2PerK, correlation } = procedure;
  const { central, fieller90 } = budget;
  const row = (estimate: Estimate): (string | number | null)[] => {
    const name = answerOf[estimate];
    const { q05 = null, q17 = null, q50 = null, q83 = null, q95 = null } = budget[name] ?? {};
    return [quantityNames[estimate].label, central[name], q05, q17, q50, q83, q95];
  };
  const fiellerRow = (name: 'effcs' | 'tcr', estimate: Estimate): (string | number | null)[] => [
    `${quantityNames[estimate].label}, Fieller’s 90 % set`,
    null,
    fieller90[name]?.low ?? null,
    null,
    null,
    null,
    fieller90[name]?.high ?? null,
  ];
  return [
    {
      caption: 'What goes in',
      columns: ['Quantity', 'Value and range'],
      rows: [
        ['warming ΔT', inputText(warmingK, 'K')],
        ['forcing change ΔF', inputText(forcingWm2, 'W/m²')],
        ['heat-uptake change ΔN', inputText(uptakeWm2, 'W/m²')],
        ['forcing of a doubling F2x', inputText(doublingWm2, 'W/m²')],
        ...(patternWm2PerK ? [['pattern effect α′', inputText(patternWm2PerK, 'W/m² per K')]] : []),
        ...(correlation === 0 ? [] : [['correlation of ΔF and F2x', formatNumber(correlation)]]),
      ],
    },
    {
      caption: 'What comes out, K per doubling; an empty end is unbounded',
      columns: ['Quantity', 'Central', '5 %', '17 %', '50 %', '83 %', '95 %'],
      rows: [
        row('effective-climate-sensitivity'),
        fiellerRow('effcs', 'effective-climate-sensitivity'),
        row('transient-climate-response'),
        fiellerRow('tcr', 'transient-climate-response'),
        ...(patternWm2PerK ? [row('equilibrium-climate-sensitivity')] : []),
      ],
    },
    {
      caption: 'On the way',
      columns: ['Figure', 'Value'],
      rows: [
        ['feedback λ = (ΔF − ΔN)/ΔT, W/m² per K', central.feedbackWm2PerK],
        ['draws without a positive ΔF − ΔN, %', 100 * budget.shareUndefined],
        ['random numbers', `${budget.random.generator}, seed ${budget.random.seed}, ${budget.random.nDraws} draws`],
      ],
    },
  ];
}

function scaled(value: number | null | undefined, factor: number): number | null {
  return value === null || value === undefined ? null : value * factor;
}
