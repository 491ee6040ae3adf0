import { finiteNumber } from './finite-values.ts';

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
 * Checked  test/reference/statistics/serial-correlation.test.ts (B: R's LakeHuron, 98 → 13.3)
 */
export function effectiveSampleSize(nObs: number, lagOneCorrelation: number): number {
  finiteNumber('effectiveSampleSize', 'nObs', nObs, { atLeast: 1 });
  finiteNumber('effectiveSampleSize', 'lagOneCorrelation', lagOneCorrelation, { above: -1, below: 1 });
  return (nObs * (1 - lagOneCorrelation)) / (1 + lagOneCorrelation);
}
