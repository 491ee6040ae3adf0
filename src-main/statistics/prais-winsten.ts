import { ar1Rows } from './ar1-rows.ts';
import { iteratedAr1, type Ar1LineRequest, type IteratedAr1Fit } from './iterated-ar1.ts';

/**
 * Iterated Prais–Winsten estimator: the line, and its standard error, when each error carries over a share ρ of the
 * one before.
 *
 * Model    y = Xb + e, e_t = ρ e_{t−1} + u_t. Least squares on rows freed from ρ: y_t − ρ y_{t−1}, and the first row
 *          times √(1 − ρ²), which Cochrane–Orcutt leaves out; ρ and its iteration as in `iteratedAr1`. Errors classical
 *          on the freed rows, n − k degrees of freedom
 * Assumes  rows in order of time, equally spaced, without gaps
 *
 * @param x  [nObs], or columns; y [nObs]; finite
 * @throws   InputError as `leastSquares`, too-few-observations; NumericError exact-fit, not-stationary when |ρ| reaches
 *           1, not-converged
 *
 * Differs  other estimators of ρ (demeaned, or half the Durbin–Watson statistic) change the third digit or so.
 *          Standard errors take ρ for known: too small in short series
 * Source   Prais & Winsten 1954, Cowles Commission Discussion Paper 383
 * Checked  test/reference/statistics/prais-winsten.test.ts (B: the same steps in base R, LakeHuron and a real record)
 */
export function praisWinsten(request: Ar1LineRequest): IteratedAr1Fit {
  return iteratedAr1('praisWinsten', request, ar1Rows);
}
