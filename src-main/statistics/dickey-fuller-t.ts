import { refuseExactFit } from './exact-fit.ts';
import { finiteNumber } from './finite-values.ts';
import { leastSquares } from './least-squares.ts';
import type { Deterministic } from './mackinnon-tables.ts';
import { sumOfProducts } from './summation.ts';

/**
 * The t of γ in the augmented Dickey–Fuller regression, without a distribution to hold it against: `adf` has one for a
 * series as observed, `engleGranger` another for residuals.
 *
 * Model    Δy_t = [c] + [d t] + γ y_{t−1} + δ_1 Δy_{t−1} + … + δ_L Δy_{t−L} + u_t
 *
 * @param caller  who asks, for error messages
 * @param series  [nObs] finite, in order of time
 * @returns  nObs: rows of this regression, nObs − 1 − L of the series'
 * @throws   InputError out-of-range; NumericError rank-deficient, exact-fit
 *
 * Checked  test/reference/statistics/unit-root.test.ts (B: base R, through `adf` and `engleGranger`)
 */
export function dickeyFullerT(
  caller: string,
  series: Float64Array,
  lags: number,
  deterministic: Deterministic,
): { statistic: number; nObs: number } {
  const nDeterministic = { none: 0, constant: 1, trend: 2 }[deterministic];
  const mostLags = Math.floor((series.length - nDeterministic - 3) / 2);
  finiteNumber(caller, 'lags', lags, {
    isWhole: true,
    atLeast: 0,
    atMost: mostLags,
    hint: 'Take fewer lags or a longer series.',
  });

  const differences = series.subarray(1).map((value, t) => value - series[t]!);
  const response = differences.subarray(lags);
  const nObs = response.length;
  const level = series.subarray(lags, lags + nObs);
  const lagged = Array.from({ length: lags }, (_, j) => differences.subarray(lags - j - 1, lags - j - 1 + nObs));
  const terms = [response.map(() => 1), response.map((_, t) => t + 1)].slice(0, nDeterministic);
  const fit = leastSquares({ columns: [level, ...lagged, ...terms], y: response, caller });

  refuseExactFit(caller, fit.residualSumOfSquares, sumOfProducts(response, response));
  const variance = fit.residualSumOfSquares / (nObs - fit.nCoefficients);
  return { statistic: fit.coefficients[0]! / Math.sqrt(variance * fit.unscaledCovariance[0]!), nObs };
}
