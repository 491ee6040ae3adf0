import { NumericError } from '../errors.ts';

/** Residuals below this share of y's size are rounding: nothing may be inferred from them. */
const EXACT_FIT_SHARE = 8 * 2 ** -52;

/** Is what a fit leaves of y nothing but rounding? Both sums of squares weighted alike; also for y about its mean. */
export function isExactFit(residualSumOfSquares: number, sumOfSquares: number): boolean {
  return residualSumOfSquares <= EXACT_FIT_SHARE ** 2 * sumOfSquares;
}

/**
 * The door for whatever is inferred from residuals.
 *
 * @param sumOfSquares  Σ y²; 0 where y is not known, so that only residuals that are all zero are refused
 * @throws   NumericError exact-fit
 */
export function refuseExactFit(caller: string, residualSumOfSquares: number, sumOfSquares = 0): void {
  if (!isExactFit(residualSumOfSquares, sumOfSquares)) return;
  throw new NumericError({
    code: 'exact-fit',
    where: caller,
    expected: 'residuals that are more than rounding',
    received: 'an exact fit',
    hint: 'An exact fit has no errors that could be judged: check that the series is not interpolated, smoothed or computed.',
  });
}
