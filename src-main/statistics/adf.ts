import { refuseExactFit } from './exact-fit.ts';
import { finiteNumber, finiteValues } from './finite-values.ts';
import { leastSquares } from './least-squares.ts';
import type { Deterministic } from './mackinnon-tables.ts';
import { mackinnonCritical, mackinnonP, type CriticalValues } from './mackinnon.ts';
import { sumOfProducts } from './summation.ts';

export interface AdfRequest {
  y: ArrayLike<number>;
  /** Lagged differences that soak up serial correlation. */
  lags: number;
  deterministic: Deterministic;
}

export interface AdfTest {
  /** t of γ. */
  statistic: number;
  p: number;
  /** Rows of the test regression. */
  nObs: number;
  critical: CriticalValues;
}

/**
 * Augmented Dickey–Fuller test: does a series wander like a random walk (the null hypothesis), or return to a level or a
 * trend?
 *
 * Model    Δy_t = [c] + [d t] + γ y_{t−1} + δ_1 Δy_{t−1} + … + δ_L Δy_{t−L} + u_t; the statistic is the t of γ, whose
 *          distribution under γ = 0 is not Student's
 * Assumes  values in order of time, equally spaced, without gaps
 *
 * @param y     [nObs] finite
 * @param lags  L, 0 or more; every lag costs a row
 * @returns  p after MacKinnon 1994 (asymptotic); critical values after MacKinnon 2010 at the rows used
 * @throws   InputError too-few-values, not-finite, out-of-range; NumericError rank-deficient, exact-fit
 *
 * Differs  R's tseries::adf.test always has a trend and interpolates p in a table; statsmodels' adfuller chooses the lags
 *          itself unless autolag=None
 * Source   Dickey & Fuller 1979, J. Am. Stat. Assoc. 74, 427–431; Said & Dickey 1984, Biometrika 71, 599–607
 * Checked  test/reference/statistics/unit-root.test.ts (B: base R)
 */
export function adf({ y, lags, deterministic }: AdfRequest): AdfTest {
  const series = finiteValues('adf', 'y', y, { atLeast: 6 });
  const nDeterministic = { none: 0, constant: 1, trend: 2 }[deterministic];
  const mostLags = Math.floor((series.length - nDeterministic - 3) / 2);
  finiteNumber('adf', 'lags', lags, { isWhole: true, atLeast: 0, atMost: mostLags });

  const differences = series.subarray(1).map((value, t) => value - series[t]!);
  const response = differences.subarray(lags);
  const nObs = response.length;
  const level = series.subarray(lags, lags + nObs);
  const lagged = Array.from({ length: lags }, (_, j) => differences.subarray(lags - j - 1, lags - j - 1 + nObs));
  const terms = [response.map(() => 1), response.map((_, t) => t + 1)].slice(0, nDeterministic);
  const fit = leastSquares({ columns: [level, ...lagged, ...terms], y: response, caller: 'adf' });

  refuseExactFit('adf', fit.residualSumOfSquares, sumOfProducts(response, response));
  const variance = fit.residualSumOfSquares / (nObs - fit.nCoefficients);
  const standardError = Math.sqrt(variance * fit.unscaledCovariance[0]!);
  const statistic = fit.coefficients[0]! / standardError;
  return { statistic, p: mackinnonP(statistic, deterministic), nObs, critical: mackinnonCritical(deterministic, nObs) };
}
