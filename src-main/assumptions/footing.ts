import { fitLogRegression } from '../climate/procedures/fit-log-regression.ts';
import type { LogRegressionProcedure } from '../contract/procedure.ts';
import type { Caveat } from '../contract/primitives.ts';
import type { DrawnNumber, JointDraws } from '../robustness/ladder.ts';
import { splitNormal, splitNormalAt } from '../statistics/split-normal.ts';
import { logClaimLine } from './claim-line.ts';
import { forcingLine } from './forcing-line.ts';
import { heatUptakeRatio } from './heat-uptake-ratio.ts';
import { perDoublingFactor } from '../quantities/per-doubling-factor.ts';
import type { TestContext } from './test-context.ts';

/** What a log-regression's number stands on: the choices that the ladder changes one by one, in any order. */
export interface Footing {
  hasFreeIntercept: boolean;
  /** What the warming is put on: CO2 alone, or all forcings together. */
  predictor: 'co2' | 'total-forcing';
  /** Whether the heat that the planet still takes up is counted as warming to come. */
  countsHeatUptake: boolean;
}

/** A change that an assumption can make to a footing, with the doubts that it brings; or why it cannot make one. */
export type RungOffer =
  { label: string; change: (footing: Footing) => Footing; caveats: Caveat[] } | { reason: string };

export function footingOf({ intercept }: LogRegressionProcedure): Footing {
  return { hasFreeIntercept: intercept, predictor: 'co2', countsHeatUptake: false };
}

/**
 * The number of a log-regression on another footing, with joint draws.
 *
 * Model    on CO2: b·factor, b the slope on ln(C/C0), with or without intercept. On all forcings: F2x b_F, b_F the slope
 *          of the same temperatures on total forcing. On CO2 alone F = F2x log2(C/C0) makes the two the same number:
 *          b ln 2 = F2x b_CO2. With heat uptake: times ΔF/(ΔF − ΔN), because a planet that takes up ΔN answers with
 *          ΔT = (ΔF − ΔN)/λ so far, and F2x/λ = (F2x ΔT/ΔF) · ΔF/(ΔF − ΔN)
 * Assumes  slopes normal with Newey–West errors; F2x, ΔF and ΔN split normal and independent. One standard-normal draw moves
 *          whichever slope is in use: slopes of one record err together. The last factor takes the ΔF and ΔN of the
 *          energy budget to describe the years of the record
 *
 * Source   Gregory et al. 2002, J. Climate 15, 3117; AR6 WG1 §7.5.2.1
 * Checked  test/unit/assumptions/footing.test.ts (C: records built so that each footing's number is known)
 */
export function numberOnFooting(context: TestContext, footing: Footing, draws: JointDraws): DrawnNumber {
  const { hasFreeIntercept, predictor, countsHeatUptake } = footing;
  const number =
    predictor === 'co2' ? onCo2(context, hasFreeIntercept, draws) : onForcing(context, hasFreeIntercept, draws);
  if (!countsHeatUptake) return { ...number, quantity: 'apparent-sensitivity' };
  const ratio = heatUptakeRatio(context.computation.evidence, draws);
  return {
    value: number.value * ratio.value,
    draws: number.draws.map((value, draw) =>
      ratio.draws[draw] === Infinity ? Infinity : value * (ratio.draws[draw] ?? NaN),
    ),
    quantity: 'effective-climate-sensitivity',
  };
}

type Drawn = Pick<DrawnNumber, 'value' | 'draws'>;

function onCo2(context: TestContext, intercept: boolean, draws: JointDraws): Drawn {
  const { rows, procedure, factor, serialCovariance } = logClaimLine(context);
  const fit = fitLogRegression(rows, { anchor: procedure.anchor, intercept, covariance: serialCovariance });
  const slopes = draws.standardNormal('slope');
  return {
    value: fit.slope * factor,
    draws: slopes.map((z) => (fit.slope + fit.slopeStandardError * z) * factor),
  };
}

function onForcing(context: TestContext, intercept: boolean, draws: JointDraws): Drawn {
  const { slope, slopeStandardError, doublingWm2 } = forcingLine(context, intercept);
  const factor = perDoublingFactor(context.recomputation.unit);
  const doubling = splitNormal(doublingWm2);
  const slopes = draws.standardNormal('slope');
  const doublings = draws.standardNormal('doubling');
  return {
    value: doublingWm2.best * slope * factor,
    draws: slopes.map(
      (z, draw) => splitNormalAt(doubling, doublings[draw] ?? NaN) * (slope + slopeStandardError * z) * factor,
    ),
  };
}
