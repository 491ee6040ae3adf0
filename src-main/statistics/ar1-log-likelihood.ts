import { ar1GapVariance, ar1Rows } from './ar1-rows.ts';
import { refuseExactFit } from './exact-fit.ts';
import { finiteNumber, finiteValues } from './finite-values.ts';
import { sumOfProducts } from './summation.ts';

/**
 * Exact log-likelihood of errors under an AR(1) process, all rows counted, at the variance that makes it largest: holds
 * lines from different estimators of ρ against each other.
 *
 * Model    −n/2 (log 2πσ² + 1) + ½ log(1 − ρ²) − ½ Σ log F_t, σ² = Σ e*²/n, e* the errors freed from ρ by `ar1Rows`, whose
 *          F_t is 1 but behind a gap
 * Assumes  errors in order of time; equally spaced unless `steps` says where years are missing
 *
 * @param errors  [nObs] y − Xb, finite, not all zero
 * @param rho     −1 < ρ < 1
 * @param steps   [nObs] calendar distance of each row from the one before; all 1 unless given
 * @throws   InputError not-finite, out-of-range; NumericError exact-fit
 *
 * Source   Beach & MacKinnon 1978, Econometrica 46, 51–58
 * Checked  test/reference/statistics/ar1-line.test.ts (B: dense covariance matrices in base R)
 */
export function ar1LogLikelihood(errors: ArrayLike<number>, rho: number, steps?: Float64Array): number {
  const e = finiteValues('ar1LogLikelihood', 'errors', errors);
  finiteNumber('ar1LogLikelihood', 'rho', rho, { above: -1, below: 1 });
  const freed = ar1Rows(e, rho, steps);
  const squares = sumOfProducts(freed, freed);
  refuseExactFit('ar1LogLikelihood', squares);
  const n = e.length;
  const stationary = 0.5 * Math.log((1 - rho) * (1 + rho));
  return -0.5 * n * (Math.log((2 * Math.PI * squares) / n) + 1) + stationary - ar1GapHeight(rho, steps).height;
}

/** ½ Σ log F_t over the gaps, and its derivative by ρ: what they take off a log-likelihood. */
export function ar1GapHeight(rho: number, steps?: Float64Array): { height: number; slope: number } {
  let [height, slope] = [0, 0];
  steps?.forEach((step) => {
    const gap = ar1GapVariance(rho, step);
    height += 0.5 * Math.log(gap.variance);
    slope += (0.5 * gap.slope) / gap.variance;
  });
  return { height, slope };
}
