import type { SlopeCovariance } from '../contract/procedure.ts';
import { growingLine } from './growing-line.ts';

/** Slope with its standard error. */
export interface WindowSlope {
  slope: number;
  standardError: number;
}

/** Share of the largest |x| below which a window's deviations of x are rounding, and say nothing about a slope. */
const SMALLEST_DEVIATION = 1e-12;

/**
 * Least-squares slopes, with their standard errors, through windows that start at one row and grow by one row after the
 * other.
 *
 * Model    the lines of `growingLine`. Classical: RSS/(n − k)/S_xx. Newey–West: with the scores s_t = (x_t − x̄) e_t (x0
 *          for x̄ without an intercept), [Σ s_t² + Σ_{j=1…L} 2(1 − j/(L + 1)) Σ s_t s_{t−j}]/S_xx²; what stands in the
 *          brackets is the mean square of the sums over L + 1 scores in a row, with zeros before the first and after the
 *          last, which costs the same whatever the lag and is never below zero
 * Assumes  rows in order of time, equally spaced where the covariance is newey-west, its lag below the rows of a window
 *
 * @param x, y  [nRows] finite; record shared by all starts
 * @returns  for a start and its anchor, as in `growingLine`, a function that gives the slope up to a row; null where x
 *           does not vary. Rows must be asked in ascending order
 *
 * Source   Newey & West 1987, Econometrica 55, 703–708
 * Checked  test/unit/statistics/growing-slope.test.ts (C: `regression` on each window)
 */
export function growingSlope(
  x: Float64Array,
  y: Float64Array,
  { intercept, covariance }: { intercept: boolean; covariance: SlopeCovariance },
) {
  const lineFrom = growingLine(x, y);
  const smallestSpread =
    (SMALLEST_DEVIATION * x.reduce((largest, value) => Math.max(largest, Math.abs(value)), 0)) ** 2;
  /** Σ of the scores up to each row, put back by L + 1 rows. */
  const scoreSums = new Float64Array(2 * x.length);
  const nCoefficients = intercept ? 2 : 1;
  return (first: number, anchor: { x0: number; y0: number }) => {
    const lineTo = lineFrom(first, anchor, intercept);
    return (last: number): WindowSlope | null => {
      const n = last - first + 1;
      const { slope, spread, squares, xCentre, yCentre } = lineTo(last);
      if (!(spread > n * smallestSpread)) return null;
      if (covariance.kind === 'classical') {
        return { slope, standardError: Math.sqrt(squares / (n - nCoefficients) / spread) };
      }
      const width = covariance.lag + 1;
      scoreSums.fill(0, first, first + width);
      let [scoreSum, squaredSums] = [0, 0];
      for (let row = first; row <= last; row++) {
        const dx = x[row]! - xCentre;
        scoreSum += dx * (y[row]! - yCentre - slope * dx);
        scoreSums[row + width] = scoreSum;
        squaredSums += (scoreSum - scoreSums[row]!) ** 2;
      }
      for (let row = last + 1; row < last + width; row++) squaredSums += (scoreSum - scoreSums[row]!) ** 2;
      const factor = covariance.smallSample ? n / (n - nCoefficients) : 1;
      return { slope, standardError: Math.sqrt((factor * squaredSums) / width) / spread };
    };
  };
}
