import normalQuantile from '@stdlib/stats-base-dists-normal-quantile';
import type { Caveat } from '../contract/primitives.ts';
import { InputError } from '../errors.ts';
import { finiteNumber } from './finite-values.ts';
import { quantileOfSorted } from './quantile.ts';
import { varyingValues } from './varying-values.ts';

export interface TheilSenRequest {
  x: ArrayLike<number>;
  y: ArrayLike<number>;
  /** Of the interval; 95 unless given. */
  levelPercent?: number;
}

export interface TheilSenFit {
  slope: number;
  intercept: number;
  /** null when the series is too short for an interval of this level. */
  confidence: [low: number, high: number] | null;
  caveats: Caveat[];
}

/** All pairs are held at once: 8 MB at 1000 rows… 100 MB here. */
const MOST_ROWS = 5000;

/**
 * Theil–Sen line: the median of the slopes of all pairs of points, which up to 29 % of wild values cannot carry away.
 *
 * Model    slope: median of (y_j − y_i)/(x_j − x_i) over pairs with x_i ≠ x_j; intercept: median y − slope · median x.
 *          Interval after Sen: the order statistics of the pair slopes at (N ± z σ)/2, N the number of pairs,
 *          σ² = [n(n−1)(2n+5) − Σ_ties k(k−1)(2k+5)]/18 of Kendall's statistic, ties of x and of y taken off
 * Assumes  independent errors for the interval: with positively correlated errors it is too narrow
 *
 * @param x, y  [3 ≤ nObs ≤ 5000] finite; neither constant
 * @returns  caveats no-interval, tied
 * @throws   InputError wrong-length, too-few-values, too-many-values, not-finite, out-of-range; NumericError constant
 *
 * Differs  the intercept is also defined as the median of y − slope · x, which scipy offers as "joint"; intervals of the
 *          paper for n ≤ 10 use exact tables of Kendall's statistic
 * Source   Theil 1950, Indag. Math. 12, 85, 173, 467; Sen 1968, J. Am. Stat. Assoc. 63, 1379–1389
 * Checked  test/reference/statistics/theil-sen.test.ts (A: Sen's example; B: base R)
 */
export function theilSen({ x: givenX, y: givenY, levelPercent = 95 }: TheilSenRequest): TheilSenFit {
  const x = varyingValues('theilSen', 'x', givenX, { atLeast: 3 });
  // Where all y are tied, every pair slope is 0 and the interval would claim to know that exactly.
  const y = varyingValues('theilSen', 'y', givenY, { length: x.length });
  finiteNumber('theilSen', 'levelPercent', levelPercent, { above: 0, below: 100 });
  if (x.length > MOST_ROWS) {
    throw new InputError({
      code: 'too-many-values',
      where: 'theilSen, x',
      expected: `at most ${MOST_ROWS} rows, whose pairs fit into memory`,
      received: `${x.length}`,
      hint: 'Take annual instead of monthly means.',
    });
  }
  const slopes = pairSlopes(x, y);
  const slope = quantileOfSorted(slopes, 0.5);
  const intercept = quantileOfSorted(y.slice().sort(), 0.5) - slope * quantileOfSorted(x.slice().sort(), 0.5);
  const confidence = senInterval(x, y, slopes, levelPercent);
  return { slope, intercept, confidence, caveats: caveatsOf(slopes, slope, confidence, levelPercent) };
}

function pairSlopes(x: Float64Array, y: Float64Array): Float64Array {
  const slopes = new Float64Array((x.length * (x.length - 1)) / 2);
  let count = 0;
  for (let i = 0; i < x.length; i++) {
    for (let j = i + 1; j < x.length; j++) {
      const run = x[j]! - x[i]!;
      if (run !== 0) slopes[count++] = (y[j]! - y[i]!) / run;
    }
  }
  return slopes.slice(0, count).sort();
}

function senInterval(
  x: Float64Array,
  y: Float64Array,
  slopes: Float64Array,
  levelPercent: number,
): TheilSenFit['confidence'] {
  const tied = (k: number) => k * (k - 1) * (2 * k + 5);
  const ties = [...tieCounts(x), ...tieCounts(y)].reduce((total, k) => total + tied(k), 0);
  const variance = Math.max(0, tied(x.length) - ties) / 18;
  const halfWidth = normalQuantile(0.5 + levelPercent / 200, 0, 1) * Math.sqrt(variance);
  const low = slopes[Math.round((slopes.length - halfWidth) / 2) - 1];
  const high = slopes[Math.round((slopes.length + halfWidth) / 2)];
  return low === undefined || high === undefined ? null : [low, high];
}

function caveatsOf(
  slopes: Float64Array,
  slope: number,
  confidence: TheilSenFit['confidence'],
  levelPercent: number,
): Caveat[] {
  const caveats: Caveat[] = [];
  if (!confidence) {
    const detail = `The ${slopes.length} pairs are too few for an interval at ${levelPercent} %.`;
    caveats.push({ code: 'no-interval', detail });
  }
  const nSame = slopes.filter((value) => value === slope).length;
  // One of them is the median itself.
  if (nSame > 1 && nSame > slopes.length / 10) {
    const detail = `${nSame} of ${slopes.length} pair slopes equal the median: rounded data make the interval coarse.`;
    caveats.push({ code: 'tied', detail });
  }
  return caveats;
}

function tieCounts(values: Float64Array): number[] {
  return [...Map.groupBy(values, (value) => value).values()].map((group) => group.length);
}
