import { NumericError } from '../errors.ts';
import { finiteNumber, finiteValues } from './finite-values.ts';

/**
 * Effective sample size under AR(1) errors: how many independent values would say as much about a mean or a trend.
 *
 * Model    n_eff = n (1 − r)/(1 + r), r the lag-one autocorrelation. Below n for positive r, above n for negative r
 * Assumes  errors of an AR(1) process and n large against 1/(1 − r)
 *
 * @param nObs               number of values, at least 1
 * @param lagOneCorrelation  r, −1 < r < 1
 * @throws   InputError out-of-range
 *
 * Source   Santer et al. 2000, J. Geophys. Res. 105, 7337–7356, equation 6 (number of the equation from memory)
 * Checked  test/reference/statistics/effective-sample-size.test.ts (B: R's LakeHuron, 98 → 13.3)
 */
export function effectiveSampleSize(nObs: number, lagOneCorrelation: number): number {
  checkAr1('effectiveSampleSize', nObs, lagOneCorrelation);
  return (nObs * (1 - lagOneCorrelation)) / (1 + lagOneCorrelation);
}

/**
 * Effective sample size of a mean under AR(1) errors, for a record of any length: the n_eff for which σ²/n_eff is the
 * variance of the mean of n values.
 *
 * Model    n_eff = n / [1 + 2 Σ_{k=1…n−1} (1 − k/n) r^k]; towards `effectiveSampleSize` for long records. It stays at
 *          1 or above for r ≥ 0, where that one can fall below
 * Assumes  errors of an AR(1) process
 *
 * @param nObs               whole number of values, at least 1
 * @param lagOneCorrelation  r, −1 < r < 1
 * @throws   InputError out-of-range
 *
 * Source   Bayley & Hammersley 1946, J. R. Stat. Soc. Suppl. 8, 184–197, with r_k = r^k (from memory)
 * Checked  test/reference/statistics/effective-sample-size.test.ts (B: the covariance matrix in R; C: by hand)
 */
export function effectiveSampleSizeOfMean(nObs: number, lagOneCorrelation: number): number {
  checkAr1('effectiveSampleSizeOfMean', nObs, lagOneCorrelation, true);
  const powers = Float64Array.from({ length: nObs - 1 }, (_, k) => lagOneCorrelation ** (k + 1));
  return nObs / inflation(nObs, powers);
}

/**
 * Effective sample size of a mean from autocorrelations as they were found, without a model of the errors.
 *
 * Model    n_eff = n / [1 + 2 Σ_{k=1…L} (1 − k/n) r_k], L the number of autocorrelations given. The L must be stated:
 *          over all lags of a record the r_k about its own mean add up to −1/2 whatever its errors
 *
 * @param nObs              whole number of values, above L
 * @param autocorrelations  [L ≥ 1] r_1 … r_L, each from −1 to 1
 * @throws   InputError out-of-range, too-few-values; NumericError no-effective-sample-size where the sum is not positive
 *
 * Source   Bayley & Hammersley 1946, J. R. Stat. Soc. Suppl. 8, 184–197 (from memory)
 * Checked  test/reference/statistics/effective-sample-size.test.ts (B: R's acf and its covariance matrix)
 */
export function effectiveSampleSizeToLag(nObs: number, autocorrelations: ArrayLike<number>): number {
  const caller = 'effectiveSampleSizeToLag';
  const found = finiteValues(caller, 'autocorrelations', autocorrelations);
  found.forEach((value, k) => finiteNumber(caller, `autocorrelations[${k}]`, value, { atLeast: -1, atMost: 1 }));
  finiteNumber(caller, 'nObs', nObs, { isWhole: true, above: found.length });
  const factor = inflation(nObs, found);
  if (factor > 0) return nObs / factor;
  throw noSize(
    caller,
    'autocorrelations that leave the mean a variance',
    `1 + 2 Σ (1 − k/n) r_k = ${factor.toPrecision(3)}`,
  );
}

/**
 * Effective sample size for the interval of a trend in a short record: that of Santer et al. with r raised by 0.68/√n,
 * which allows for the doubt about r itself.
 *
 * Model    n_eff = n (1 − r − 0.68/√n)/(1 + r + 0.68/√n)
 * Assumes  errors of an AR(1) process; r of the residuals of a linear trend
 *
 * @param nObs               number of values, at least 1
 * @param lagOneCorrelation  r, −1 < r < 1
 * @throws   InputError out-of-range; NumericError no-effective-sample-size where r + 0.68/√n reaches 1
 *
 * Source   Nychka et al. 2000, Confidence intervals for trend estimates with autocorrelated observations, unpublished
 *          manuscript, National Center for Atmospheric Research; second-hand and from memory, as works on temperature
 *          trends cite it: the manuscript was not seen
 * Checked  test/reference/statistics/effective-sample-size.test.ts (C: by hand)
 */
export function effectiveSampleSizeNychka2000(nObs: number, lagOneCorrelation: number): number {
  const caller = 'effectiveSampleSizeNychka2000';
  checkAr1(caller, nObs, lagOneCorrelation);
  const raised = lagOneCorrelation + 0.68 / Math.sqrt(nObs);
  if (raised < 1) return (nObs * (1 - raised)) / (1 + raised);
  throw noSize(caller, 'r + 0.68/√n below 1', raised.toPrecision(3));
}

function checkAr1(caller: string, nObs: number, lagOneCorrelation: number, isWhole = false): void {
  finiteNumber(caller, 'nObs', nObs, { isWhole, atLeast: 1 });
  finiteNumber(caller, 'lagOneCorrelation', lagOneCorrelation, { above: -1, below: 1 });
}

/** 1 + 2 Σ (1 − k/n) r_k: the variance of a mean over that of a mean of independent values. */
function inflation(nObs: number, autocorrelations: Float64Array): number {
  return autocorrelations.reduce((total, value, k) => total + 2 * (1 - (k + 1) / nObs) * value, 1);
}

function noSize(caller: string, expected: string, received: string): NumericError {
  return new NumericError({
    code: 'no-effective-sample-size',
    where: caller,
    expected,
    received,
    hint: 'Take another definition, fewer lags or a longer record.',
  });
}
