import type { ClaimUnit } from '../contract/stated.ts';
import type { Caveat, QuantityId } from '../contract/primitives.ts';
import type { AssumptionId, Ladder } from '../contract/result.ts';
import { isFootingError } from '../errors.ts';
import { quantilesWithUnbounded } from '../climate/quantiles-with-unbounded.ts';
import { generatorId, randomStream } from '../statistics/random-stream.ts';

/** What the draws of a ladder are about. The place in this list is the block of the random stream: append only. */
const drawnNames = ['slope', 'doubling', 'forcing', 'uptake'] as const;
export type DrawnName = (typeof drawnNames)[number];

/** Standard-normal draws by name. Whoever asks for a name gets the same draws: that is what joins the rungs. */
export interface JointDraws {
  seed: number;
  nDraws: number;
  standardNormal: (name: DrawnName) => Float64Array;
}

/** The number on one footing: its central value, and one value per draw (+Infinity where it is unbounded above). */
export interface DrawnNumber {
  value: number;
  draws: Float64Array;
  quantity: QuantityId;
}

/** One change of assumption. It changes the footing that the rungs above have left, whatever that is. */
export interface Rung<Footing> {
  assumptionId: AssumptionId;
  label: string;
  change: (footing: Footing) => Footing;
}

export interface LadderPlan<Footing> {
  start: Footing;
  /** In order of application. */
  rungs: readonly Rung<Footing>[];
  numberOn: (footing: Footing, draws: JointDraws) => DrawnNumber;
  notApplied: Ladder['notApplied'];
  unit: ClaimUnit;
  draws: JointDraws;
  caveats: Caveat[];
}

/**
 * Ladder: changes of assumption applied one after the other, from the number as recomputed to the number on the
 * reviewer's footing, each step on top of the steps before.
 *
 * Model    value_i = number(change_i(… change_1(start))), step_i = value_i − value_{i−1}, so the steps add up to the
 *          whole move. Every uncertain input is drawn once and shared by all rungs: a rung's interval contains the
 *          uncertainty of everything that it uses, the steps do not double it. Values are central values, not medians
 *          of draws. The steps depend on the order; the last value does not, because a footing is a set of choices
 *
 * @param plan  start, rungs, and the function that gives the number on a footing for joint draws
 * @returns  5–95 % of the draws per rung; null at an end where that quantile is unbounded. A rung whose number
 *           cannot be computed, or has no finite central value, is not applied and says why
 *
 * Source   Monte Carlo propagation of distributions: JCGM 101:2008, §5.9 and §7
 * Checked  test/unit/robustness/ladder.test.ts (C: additive and multiplicative footings with known quantiles)
 */
export function ladder<Footing>(plan: LadderPlan<Footing>): Ladder {
  const { rungs, numberOn, unit, draws, caveats } = plan;
  const start = numberOn(plan.start, draws);
  const notApplied = [...plan.notApplied];
  const applied: Ladder['rungs'] = [];
  let footing = plan.start;
  let before = start.value;
  for (const { assumptionId, label, change } of rungs) {
    const changed = change(footing);
    const number = numberOrReason(() => numberOn(changed, draws));
    if (typeof number === 'string') {
      notApplied.push({ assumptionId, reason: number });
      continue;
    }
    const { value, quantity } = number;
    applied.push({ assumptionId, label, value, interval90: interval90(number.draws), quantity, step: value - before });
    footing = changed;
    before = value;
  }
  return {
    start: { value: start.value, interval90: interval90(start.draws), quantity: start.quantity },
    rungs: applied,
    notApplied,
    unit,
    random: { generator: generatorId, seed: draws.seed, nDraws: draws.nDraws },
    caveats,
  };
}

function numberOrReason(compute: () => DrawnNumber): DrawnNumber | string {
  try {
    const number = compute();
    return Number.isFinite(number.value) ? number : 'The number has no finite central value under this change.';
  } catch (error) {
    if (isFootingError(error)) return error.message;
    throw error;
  }
}

/** Draws that are made when first asked for and then kept. The digits depend on the seed and the name alone. */
export function jointDraws(seed: number, nDraws: number): JointDraws {
  const kept = new Map<DrawnName, Float64Array>();
  return {
    seed,
    nDraws,
    standardNormal(name) {
      const known = kept.get(name);
      if (known) return known;
      const stream = randomStream(seed, drawnNames.indexOf(name));
      const drawn = Float64Array.from({ length: nDraws }, () => stream.normal());
      kept.set(name, drawn);
      return drawn;
    },
  };
}

/** Central 90 % of draws, of which some may be unbounded above. */
export function interval90(draws: Float64Array): Ladder['start']['interval90'] {
  const finite = draws.filter(Number.isFinite);
  const [low, high] = quantilesWithUnbounded(finite, draws.length, [0.05, 0.95]);
  return { low, high, levelPercent: 90 };
}
