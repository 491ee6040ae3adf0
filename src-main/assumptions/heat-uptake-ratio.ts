import type { ClaimComputation } from '../contract/compute.ts';
import { InputError } from '../errors.ts';
import type { JointDraws } from '../robustness/ladder.ts';
import { splitNormal, splitNormalAt } from '../statistics/split-normal.ts';

export interface DrawnRatio {
  /** +Infinity when the forcing does not exceed the uptake. */
  value: number;
  draws: Float64Array;
}

/**
 * ΔF/(ΔF − ΔN): effective over transient sensitivity, from the reviewer's energy budget. A denominator that is not
 * positive counts as unbounded above.
 *
 * @throws  InputError `no-energy-budget`
 *
 * Source   AR6 WG1 §7.5.2.1: the quotient of its two expressions
 */
export function heatUptakeRatio({ energyBudget }: ClaimComputation['evidence'], draws: JointDraws): DrawnRatio {
  if (!energyBudget) {
    throw new InputError({
      code: 'no-energy-budget',
      where: 'heat uptake',
      expected: 'forcing and heat uptake between two periods',
      received: 'none',
      hint: 'Give the energy budget under Assumptions.',
    });
  }
  const { forcingWm2, uptakeWm2 } = energyBudget;
  const forcing = splitNormal(forcingWm2);
  const uptake = splitNormal(uptakeWm2);
  const uptakes = draws.standardNormal('uptake');
  return {
    value: ratioOf(forcingWm2.best, uptakeWm2.best),
    draws: draws
      .standardNormal('forcing')
      .map((z, draw) => ratioOf(splitNormalAt(forcing, z), splitNormalAt(uptake, uptakes[draw] ?? NaN))),
  };
}

function ratioOf(forcing: number, uptake: number): number {
  return forcing > uptake ? forcing / (forcing - uptake) : Infinity;
}
