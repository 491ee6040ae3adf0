import { energyBudget } from '../climate/energy-budget.ts';
import type { EnergyBudgetAnswer } from '../contract/energy-budget.ts';
import type { Interval } from '../contract/primitives.ts';
import type { AssumptionOutcome, Weight } from '../contract/result.ts';
import { inputText } from '../quantities/input-text.ts';
import { formatInterval, formatNumber } from '../quantities/notation.ts';
import { quantityNames } from '../quantities/quantity-names.ts';
import { outcome, untestable, type Assumption } from './assumption.ts';
import { perDoublingFactor } from '../quantities/per-doubling-factor.ts';
import { isEquilibrium, presentedQuantity } from './presented-quantity.ts';
import type { TestContext } from './test-context.ts';
import { weightWords } from './weigh.ts';

/** Draws behind the energy budget: its outer quantiles are steep, so more than for the ladder. */
const nBudgetDraws = 100_000;

/**
 * The planet has stopped taking up heat. While it takes up ΔN, ΔT = (ΔF − ΔN)/λ falls short of the equilibrium ΔF/λ by
 * the share ΔN/ΔF: EffCS/TCR = ΔF/(ΔF − ΔN).
 */
export const transientAsEquilibrium: Assumption = {
  id: 'transient-as-equilibrium',
  group: 'What the slope stands for',
  title: 'The planet has stopped taking up heat',
  shortTitle: 'Heat uptake',
  explanation:
    'The oceans are still warming up. What the thermometers show so far is not the whole answer to today’s forcing, so a number read from the record is a transient one and smaller than that of a settled climate.',
  method:
    'Energy budget between two periods from warming, forcing and heat uptake, each with its range: effective sensitivity and transient response by Monte Carlo, and their quotient.',
  formula: 'EffCS = F2x ΔT / (ΔF − ΔN); TCR = F2x ΔT / ΔF; EffCS / TCR = ΔF / (ΔF − ΔN)',
  needs:
    'Warming, forcing change and heat-uptake change between two periods, and the forcing of a CO₂ doubling, each with its range.',
  source: 'Gregory et al. 2002, J. Climate 15, 3117; Otto et al. 2013, Nat. Geosci. 6, 415; AR6 WG1 §7.5.2.1',

  applies: ({ procedure }) => procedure.kind === 'log-regression',

  test(context) {
    const { computation, recomputation, show, showWithUnit, showShift } = context;
    const { energyBudget: inputs } = computation.evidence;
    if (!inputs) return untestable(transientAsEquilibrium, missing);
    const budget = energyBudget({ ...inputs, draws: nBudgetDraws, seed: computation.seed });
    const factor = perDoublingFactor(recomputation.unit);
    const effcs = inUnit(budget, 'effcs', factor);
    const tcr = inUnit(budget, 'tcr', factor);
    const ratio = effcs.value !== null && tcr.value !== null ? effcs.value / tcr.value : null;
    const effect = effcs.value === null ? null : effcs.value - recomputation.value;
    const weight: Weight = effcs.value === null ? 'decisive' : context.weigh(effcs.value);
    const ratioText = ratio === null ? 'unbounded' : formatNumber(ratio, { decimals: 2 });
    const toNumber = effcs.value === null ? null : effcs.value / recomputation.value;
    const uptake = inputText(inputs.uptakeWm2, 'W/m²');
    const effcsText = effcs.value === null ? 'no finite value' : showWithUnit(effcs.value);
    const tcrText = tcr.value === null ? 'no finite value' : show(tcr.value);
    return outcome('transient-as-equilibrium', {
      statistic:
        ratio === null
          ? null
          : {
              label: 'EffCS ÷ TCR',
              value: ratio,
              p: null,
              interval: null,
              convention: `ΔF/(ΔF − ΔN) at the central values, ΔF ${inputText(inputs.forcingWm2, 'W/m²')}; ΔN ${uptake}; F2x ${inputText(inputs.doublingWm2, 'W/m²')}; ΔT ${inputText(inputs.warmingK, 'K')} (split normal, independent)`,
            },
      test: `energy budget, ΔN ${uptake}: EffCS ${formatInterval(effcs.interval)}, TCR ${formatInterval(tcr.interval)}`,
      alternative:
        effcs.value === null
          ? null
          : {
              value: effcs.value,
              interval: effcs.interval,
              quantity: 'effective-climate-sensitivity',
              unit: recomputation.unit,
              label: 'energy budget with heat uptake',
            },
      effect,
      weight,
      reading: `With a heat uptake of ${uptake} the effective sensitivity is ${effcsText} (${formatInterval(effcs.interval)}, 5–95 %) and the transient response ${tcrText} (${formatInterval(tcr.interval)}): a factor of ${ratioText} between them.${toNumber === null ? '' : ` The effective sensitivity is ${formatNumber(toNumber, { decimals: 2 })} times the number of the claim; part of that is heat uptake, the rest comes from other data and from forcings other than CO₂.`}`,
      proposal: proposal(context, weight, effect),
      sentence: `The number reads a record of a planet that is still taking up heat. The energy budget of the same changes gives an effective sensitivity of ${effcsText} (${formatInterval(effcs.interval)}, 5–95 %) and a transient response of ${tcrText} (${formatInterval(tcr.interval)}), against ${show(recomputation.value)} as recomputed${effect === null ? '' : `: a difference of ${showShift(effect)}`}, ${weightWords[weight]}.`,
      table: {
        columns: [`Energy budget (${recomputation.unit})`, 'Central', '5 %', '17 %', '50 %', '83 %', '95 %'],
        rows: [
          ['effective climate sensitivity', effcs.value, ...quantilesIn(budget.effcs, factor)],
          ['transient climate response', tcr.value, ...quantilesIn(budget.tcr, factor)],
          ['number × ΔF/(ΔF − ΔN)', ratio === null ? null : recomputation.value * ratio, null, null, null, null, null],
        ],
      },
      caveats: budget.caveats,
    });
  },

  rung({ computation, recomputation }) {
    if (!computation.evidence.energyBudget) return { reason: `${missing.reason} ${missing.wouldNeed}` };
    perDoublingFactor(recomputation.unit);
    return {
      label: 'Heat still going into the oceans',
      change: (footing) => ({ ...footing, countsHeatUptake: true }),
      caveats: [
        {
          code: 'budget-periods',
          detail:
            'The step for heat uptake takes the forcing and heat uptake of the energy budget for those of the record’s own years.',
        },
      ],
    };
  },
};

const missing = {
  reason: 'No energy budget is given.',
  wouldNeed:
    'Give warming, forcing change and heat-uptake change between two periods and the forcing of a doubling, with their ranges, under Assumptions.',
};

function inUnit(
  budget: EnergyBudgetAnswer,
  which: 'effcs' | 'tcr',
  factor: number,
): { value: number | null; interval: Interval } {
  const central = budget.central[which];
  const [low = null, , , , high = null] = quantilesIn(budget[which], factor);
  return { value: central === null ? null : central * factor, interval: { low, high, levelPercent: 90 } };
}

function quantilesIn({ q05, q17, q50, q83, q95 }: EnergyBudgetAnswer['effcs'], factor: number): (number | null)[] {
  return [q05, q17, q50, q83, q95].map((value) => (value === null ? null : value * factor));
}

function proposal(
  { computation, recomputation, showShift }: TestContext,
  weight: Weight,
  effect: number | null,
): AssumptionOutcome['proposal'] {
  const presented = presentedQuantity(computation, recomputation);
  const move = effect === null ? 'leaves it without an upper end' : `moves it by ${showShift(effect)}`;
  if (presented === null) {
    return {
      mark: 'untested',
      reason: `Counting heat uptake ${move}, but the statement does not say which kind of sensitivity the number is. Say so under Statement.`,
    };
  }
  const { label } = quantityNames[presented];
  if (!isEquilibrium(presented)) {
    return {
      mark: 'met',
      reason: `The number is presented as ${label}, which is a number for a planet still taking up heat.`,
    };
  }
  if (weight === 'negligible') return { mark: 'met', reason: `Counting heat uptake ${move} only.` };
  return { mark: 'not met', reason: `The number is presented as ${label}, and counting heat uptake ${move}.` };
}
