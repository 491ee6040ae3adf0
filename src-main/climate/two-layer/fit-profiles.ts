import type { OpenInterval } from '../../contract/climate-response.ts';
import { profileEnd } from '../../statistics/profile-end.ts';
import { simplexMaximum, type Summit } from '../../statistics/simplex-maximum.ts';
import { searchBounds, type FitProblem } from './fit-likelihood.ts';
import { fitHeight, fitSteps } from './fit-summit.ts';

const FEEDBACK = 0;
const EXCHANGE = 1;
/** A profile that rises above the top by this has found a higher summit. */
const HIGHER = 1e-6;
/** Of the estimate, on the way down to 0. */
const shares = Array.from({ length: 10 }, (_, i) => 0.7 ** (i + 1));

type Ends = Pick<OpenInterval, 'low' | 'high'>;
export interface FitProfiles {
  feedback: Ends;
  exchange: Ends;
  fallAtZeroFeedback: number;
  /** A point higher than the summit, when one was met on the way. */
  higher: Summit | null;
}

/**
 * Profile-likelihood intervals of λ and γ about a summit of the fit, and how far the likelihood falls to λ = 0.
 *
 * @param fall  z²/2, by which the log-likelihood falls to an end
 * @returns  ends: low 0 where 0 belongs to the interval, high null where none lies within the bounds of the search
 *
 * Checked  test/reference/climate/two-layer-fit.test.ts (B: R's optim at each end; C: coverage)
 */
export function fitProfiles(
  problem: FitProblem,
  summit: Summit,
  fall: number,
  onProgress?: (shareDone: number) => void,
): FitProfiles {
  const height = fitHeight(problem);
  const steps = fitSteps(problem);
  let higher: Summit | null = null;
  let nDone = 0;
  /** The best of the other variables with one held, sought from where it was at the value before. */
  const follower = (held: number) => {
    const others = (point: readonly number[]) => point.filter((_, i) => i !== held);
    const whole = (point: readonly number[], value: number) => point.toSpliced(held, 0, value);
    let from = others(summit.at);
    return (value: number) => {
      const root = Math.sqrt(value);
      const best = simplexMaximum((point) => height(whole(point, root)), from, others(steps));
      from = best.at;
      if (best.height > Math.max(summit.height, higher?.height ?? -Infinity) + HIGHER) {
        higher = { at: whole(best.at, root), height: best.height };
      }
      onProgress?.(Math.min(0.99, 0.5 + 0.005 * nDone++));
      return best.height;
    };
  };
  const search = (held: number, profile: (value: number) => number, stations: readonly number[]) =>
    profileEnd({ profile, estimate: summit.at[held]! ** 2, top: summit.height, fall, stations });
  const down = (held: number, profile: (value: number) => number) =>
    search(held, profile, [...shares.map((share) => share * summit.at[held]! ** 2), 0]) ?? 0;
  const up = (held: number, highest: number) =>
    search(held, follower(held), stationsUpTo(summit.at[held]! ** 2, highest));

  const withoutFeedback = follower(FEEDBACK);
  const feedback = { low: down(FEEDBACK, withoutFeedback), high: up(FEEDBACK, searchBounds.feedback) };
  const fallAtZeroFeedback = Math.max(0, summit.height - withoutFeedback(0));
  const exchange = { low: down(EXCHANGE, follower(EXCHANGE)), high: up(EXCHANGE, searchBounds.exchange) };
  return { feedback, exchange, fallAtZeroFeedback, higher };
}

function stationsUpTo(estimate: number, highest: number): number[] {
  const stations: number[] = [];
  for (let value = Math.max(1.3 * estimate, 0.05); value < highest; value *= 1.4) stations.push(value);
  return [...stations, highest];
}
