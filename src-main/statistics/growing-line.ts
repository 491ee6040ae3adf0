import { straightLine } from './straight-line.ts';

export interface WindowLine {
  slope: number;
  /** Σ (x − xCentre)². */
  spread: number;
  /** Σ of squared residuals. */
  squares: number;
  /** What the line goes through: the means with an intercept, the anchor without. */
  xCentre: number;
  yCentre: number;
}

/** A difference of sums keeps at least 16 − 3 − log₁₀ n digits above this share of its terms; below, rows are summed anew. */
const SMALLEST_SHARE = 1e-3;

/**
 * Least-squares lines through windows that start at one row and grow by one row after the other, from running sums instead
 * of a fit for each: a row costs the same whatever the length of the window.
 *
 * Model    y − y0 = b (x − x0) [+ a]. The sums are taken of u = x − x0 and of what a guiding line of the whole record
 *          leaves, r = y − y0 − g u: b = g + S_ur/S_uu, RSS = S_rr − S_ur²/S_uu, so that a close fit does not cancel. Where
 *          a difference still loses more than three digits, the rows are summed anew about their centre
 *
 * @param x, y  [nRows] finite; record shared by all starts
 * @returns  for a start, its anchor (x0, y0) within the window's range, and whether there is an intercept: a function that
 *           gives the line up to a row; rows must be asked in ascending order. slope NaN where x does not vary
 *
 * Source   least squares in closed form
 * Checked  test/unit/statistics/growing-line.test.ts (C: `leastSquares` on each window, close fits and far levels among them)
 */
export function growingLine(x: Float64Array, y: Float64Array) {
  // Any slope would do; that of the whole record leaves little.
  const guide = straightLine(x, y)?.slope ?? 0;
  // Counted from the first row, so that a far level costs no digits.
  const restAt = (xValue: number, yValue: number) => yValue - y[0]! - guide * (xValue - x[0]!);
  const rest = y.map((value, row) => restAt(x[row]!, value));
  return (first: number, anchor: { x0: number; y0: number }, intercept: boolean): ((last: number) => WindowLine) => {
    const { x0, y0 } = anchor;
    const r0 = restAt(x0, y0);
    let [uSum, rSum, uu, ur, rr] = [0, 0, 0, 0, 0];
    let next = first;
    return (last) => {
      for (; next <= last; next++) {
        const u = x[next]! - x0;
        const r = rest[next]! - r0;
        uSum += u;
        rSum += r;
        uu += u * u;
        ur += u * r;
        rr += r * r;
      }
      const n = intercept ? last - first + 1 : Infinity;
      const spread = uu - (uSum * uSum) / n;
      const leftOver = rr - (rSum * rSum) / n;
      const turn = (ur - (uSum * rSum) / n) / spread;
      const squares = leftOver - turn * turn * spread;
      const isSafe = spread > SMALLEST_SHARE * uu && squares > SMALLEST_SHARE * rr;
      if (!isSafe) return summedAnew(x, y, { first, last, anchor, intercept });
      return { slope: guide + turn, spread, squares, xCentre: x0 + uSum / n, yCentre: y0 + (rSum + guide * uSum) / n };
    };
  };
}

function summedAnew(
  x: Float64Array,
  y: Float64Array,
  window: { first: number; last: number; anchor: { x0: number; y0: number }; intercept: boolean },
): WindowLine {
  const { first, last, anchor, intercept } = window;
  let { x0: xCentre, y0: yCentre } = anchor;
  if (intercept) {
    const n = last - first + 1;
    let [xSum, ySum] = [0, 0];
    for (let row = first; row <= last; row++) {
      xSum += x[row]! - anchor.x0;
      ySum += y[row]! - anchor.y0;
    }
    xCentre += xSum / n;
    yCentre += ySum / n;
  }
  let [spread, xy, squares] = [0, 0, 0];
  for (let row = first; row <= last; row++) {
    const u = x[row]! - xCentre;
    spread += u * u;
    xy += u * (y[row]! - yCentre);
  }
  const slope = xy / spread;
  for (let row = first; row <= last; row++) squares += (y[row]! - yCentre - slope * (x[row]! - xCentre)) ** 2;
  return { slope, spread, squares, xCentre, yCentre };
}
