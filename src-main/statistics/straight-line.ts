import { finiteValues } from './finite-values.ts';

/** Share of |x| below which a spread of x is rounding, and says nothing about a slope. */
const SMALLEST_DEVIATION = 1e-12;

/**
 * Straight line of least squares: slope and intercept and nothing else, for a line to draw or to start from. What is to
 * be said about a slope needs the table of `regression`.
 *
 * Model    y = a + b x; b = S_xy/S_xx from one pass of sums of deviations from the first row. At worst, where that row lies
 *          far from all others, this loses as many digits as nObs has
 *
 * @param x, y  [nObs ≥ 2] finite
 * @returns  null where x does not vary
 * @throws   InputError wrong-length, too-few-values, not-finite, too-large
 *
 * Source   least squares in closed form; shifted sums: Chan, Golub & LeVeque 1983, Am. Stat. 37, 242–247 (from memory)
 * Checked  test/reference/statistics/straight-line.test.ts (A: NIST Norris; C: `leastSquares`)
 */
export function straightLine(x: ArrayLike<number>, y: ArrayLike<number>): { intercept: number; slope: number } | null {
  const n = x.length;
  if (n < 2) finiteValues('straightLine', 'x', x, { atLeast: 2 });
  if (y.length !== n) finiteValues('straightLine', 'y', y, { length: n });
  const [x0, y0] = [x[0]!, y[0]!];
  let [uSum, vSum, uu, uv] = [0, 0, 0, 0];
  for (let i = 1; i < n; i++) {
    const u = x[i]! - x0;
    const v = y[i]! - y0;
    uSum += u;
    vSum += v;
    uu += u * u;
    uv += u * v;
  }
  // A NaN or an infinity always reaches these sums, so looking for it only then costs nothing otherwise.
  if (!Number.isFinite(uu + uv)) {
    finiteValues('straightLine', 'x', x);
    finiteValues('straightLine', 'y', y);
  }
  const spread = uu - (uSum * uSum) / n;
  if (!(spread > n * (SMALLEST_DEVIATION * x0) ** 2)) return null;
  const slope = (uv - (uSum * vSum) / n) / spread;
  return { intercept: y0 + vSum / n - slope * (x0 + uSum / n), slope };
}
