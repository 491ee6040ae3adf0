import { finiteValues } from './finite-values.ts';

/**
 * Compensated sum: the sum of the values, as if added in doubled precision and rounded once at the end
 * (up to the condition of the sum).
 *
 * @param values [nObs] finite
 * @throws   InputError not-finite
 *
 * Source   Neumaier 1974, ZAMM 54, 39–51, algorithm IV
 * Checked  test/unit/statistics/summation.test.ts, level C: sums whose exact value is known
 */
export function sum(values: ArrayLike<number>): number {
  let total = 0;
  let lost = 0;
  for (let i = 0; i < values.length; i++) {
    const value = values[i]!;
    const next = total + value;
    lost += Math.abs(total) >= Math.abs(value) ? total - next + value : value - next + total;
    total = next;
  }
  // A NaN or an infinity always reaches the total, so looking for it only then costs nothing otherwise.
  if (!Number.isFinite(total + lost)) finiteValues('sum', 'values', values);
  return total + lost;
}

/** Arithmetic mean, from the compensated sum. @throws InputError too-few-values, not-finite */
export function mean(values: ArrayLike<number>): number {
  if (values.length === 0) finiteValues('mean', 'values', values);
  return sum(values) / values.length;
}

/** Splits a double into two halves of 26 bits (Veltkamp), so that products of halves are exact. */
const SPLITTER = 2 ** 27 + 1;

/**
 * Sum of products Σ a_i b_i, as if computed in doubled precision and rounded once at the end.
 *
 * @param a, b  [nObs] finite, of equal length
 * @throws   InputError wrong-length, not-finite, too-large
 *
 * Source   Ogita, Rump & Oishi 2005, SIAM J. Sci. Comput. 26, 1955–1988, algorithm 5.3 (Dot2)
 * Checked  test/unit/statistics/summation.test.ts, level C: against exact rational arithmetic
 */
export function sumOfProducts(a: ArrayLike<number>, b: ArrayLike<number>): number {
  if (a.length !== b.length) finiteValues('sumOfProducts', 'b', b, { length: a.length });
  let total = 0;
  let lost = 0;
  for (let i = 0; i < a.length; i++) {
    const x = a[i]!;
    const y = b[i]!;
    const product = x * y;
    const xShifted = SPLITTER * x;
    const xHigh = xShifted - (xShifted - x);
    const xLow = x - xHigh;
    const yShifted = SPLITTER * y;
    const yHigh = yShifted - (yShifted - y);
    const yLow = y - yHigh;
    const productLost = xLow * yLow - (product - xHigh * yHigh - xLow * yHigh - xHigh * yLow);
    const next = total + product;
    const added = next - total;
    lost += total - (next - added) + (product - added) + productLost;
    total = next;
  }
  if (!Number.isFinite(total + lost)) {
    finiteValues('sumOfProducts', 'a', a);
    finiteValues('sumOfProducts', 'b', b);
  }
  return total + lost;
}
