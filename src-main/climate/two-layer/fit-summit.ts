import { simplexMaximum, type Summit } from '../../statistics/simplex-maximum.ts';
import { fitLikelihood, parametersAt, searchBounds, type FitProblem } from './fit-likelihood.ts';

/** Starts of the search over λ and γ, and over heat capacities that are fitted: about the span of climate models. */
const STARTS = {
  feedback: [0.1, 0.5, 1, 1.7, 3],
  exchange: [0.05, 0.3, 0.8, 2],
  heatCapacity: [3, 8, 20],
  deepHeatCapacity: [40, 120, 400],
};
const N_CLIMBS = 6;
/** Summits closer than this in height are one. */
const SAME_HEIGHT = 1e-5;

export interface FitSummit extends Summit {
  nClimbs: number;
  /** Climbs that ended this high. */
  nAtTop: number;
}

/** Height of a point of the search; −∞ where a fitted heat capacity leaves its bounds. */
export function fitHeight(problem: FitProblem): (point: readonly number[]) => number {
  return (point) => {
    const parameters = parametersAt(problem, point);
    const isInside = (['heatCapacity', 'deepHeatCapacity'] as const).every((name) => {
      const { low, high } = searchBounds[name];
      return problem[name] !== null || (parameters[name] >= low && parameters[name] <= high);
    });
    return isInside ? fitLikelihood(problem, parameters).logLikelihood : -Infinity;
  };
}

/** First steps along the variables of the search: √λ, √γ, logarithms of heat capacities. */
export function fitSteps(problem: FitProblem): number[] {
  const nFitted = [problem.heatCapacity, problem.deepHeatCapacity].filter((value) => value === null).length;
  return [0.15, 0.15, ...Array.from({ length: nFitted }, () => 0.3)];
}

/**
 * The highest point of the likelihood of a two-layer fit: climbs from the best of a grid of starts, and the highest summit
 * of all.
 *
 * @param onClimb  called after each climb with the share done; may throw to stop
 *
 * Checked  test/reference/climate/two-layer-fit.test.ts (B: R's optim)
 */
export function fitSummit(problem: FitProblem, onClimb?: (shareDone: number) => void): FitSummit {
  const height = fitHeight(problem);
  const grids = [
    STARTS.feedback.map(Math.sqrt),
    STARTS.exchange.map(Math.sqrt),
    ...(problem.heatCapacity === null ? [STARTS.heatCapacity.map(Math.log)] : []),
    ...(problem.deepHeatCapacity === null ? [STARTS.deepHeatCapacity.map(Math.log)] : []),
  ];
  const starts = grids
    .reduce<number[][]>((points, grid) => points.flatMap((point) => grid.map((value) => [...point, value])), [[]])
    .map((at) => ({ at, height: height(at) }))
    .sort((a, b) => b.height - a.height)
    .slice(0, N_CLIMBS);
  const summits = starts.map(({ at }, i) => {
    const summit = simplexMaximum(height, at, fitSteps(problem));
    onClimb?.((i + 1) / starts.length);
    return summit;
  });
  const best = summits.reduce((a, b) => (b.height > a.height ? b : a));
  const nAtTop = summits.filter((summit) => summit.height > best.height - SAME_HEIGHT).length;
  return { ...best, nClimbs: summits.length, nAtTop };
}
