import { NumericError } from '../errors.ts';
import { refuseExactFit } from './exact-fit.ts';
import type { LeastSquaresFit } from './least-squares.ts';
import { neweyWestRows, type NeweyWestSetting } from './newey-west-rows.ts';
import { sumOfProducts } from './summation.ts';

export interface AutomaticLag {
  lag: number;
  /** Autocovariances that γ was estimated from. */
  preliminaryLag: number;
  /** γ̂: the lag is floor(γ̂ T^(1/3)). */
  gamma: number;
}

/**
 * Lag of Newey–West errors chosen from the data for the Bartlett kernel: more lags where the scores of the fit
 * resemble their past for longer.
 *
 * Model    h_t = Σ of the scores x_t w_t e_t of all predictors: weight 1 on each predictor, 0 on the constant column of
 *          an intercept (1 when there is nothing else); m = floor(4 (T/100)^(2/9)), with 3 for 4 after prewhitening;
 *          σ_j = Σ_t h_t h_{t−j}; s0 = σ_0 + 2 Σ_{j ≤ m} σ_j; s1 = 2 Σ_{j ≤ m} j σ_j; γ̂ = 1.1447 (s1/s0)^(2/3);
 *          L = floor(γ̂ T^(1/3)). T counts the rows, or the years from the first to the last when `years` are given
 * Assumes  rows in order of time; as `neweyWest`
 *
 * @param hasIntercept  whether the fit's first column is the constant
 * @returns  lag at most n − 1
 * @throws   NumericError exact-fit; NumericError no-automatic-lag when s0 is zero to rounding; as `neweyWestRows`
 *
 * Differs  the scores of the predictors are added up as they are, so that with an intercept the lag depends on where
 *          the predictor's zero is, and with several predictors on their units. R's sandwich::bwNeweyWest has the same
 *          weights; other programs put weight 1 on the constant too, or on it alone
 * Source   Newey & West 1994, Rev. Econ. Stud. 61, 631–653, Tables I and II (from memory; the 3 after prewhitening
 *          second-hand, from public code that cites Table II C)
 * Checked  test/reference/statistics/newey-west.test.ts (B: base R from the formulas)
 */
export function neweyWestAutomaticLag(
  fit: LeastSquaresFit,
  { hasIntercept, ...setting }: NeweyWestSetting & { hasIntercept: boolean },
): AutomaticLag {
  refuseExactFit('neweyWestAutomaticLag', fit.residualSumOfSquares, sumOfProducts(fit.y, fit.y));
  const { scores } = neweyWestRows(fit, setting);
  const counted = hasIntercept && scores.length > 1 ? scores.slice(1) : scores;
  const h = Float64Array.from(counted[0]!, (_, t) => counted.reduce((total, score) => total + score[t]!, 0));
  const length = setting.prewhiten === undefined ? h.length : h.length + 1;
  const most = setting.prewhiten === undefined ? 4 : 3;
  const preliminaryLag = Math.min(h.length - 1, Math.floor(most * (length / 100) ** (2 / 9)));
  const autocovariance = (j: number) => sumOfProducts(h.subarray(j), h.subarray(0, h.length - j));
  let flat = autocovariance(0);
  const rounding = h.length * Number.EPSILON * flat;
  let sloping = 0;
  for (let j = 1; j <= preliminaryLag; j++) {
    flat += 2 * autocovariance(j);
    sloping += 2 * j * autocovariance(j);
  }
  if (!(Math.abs(flat) > rounding)) throw noAutomaticLag(preliminaryLag);
  const gamma = 1.1447 * Math.cbrt((sloping / flat) ** 2);
  return { lag: Math.min(fit.nObs - 1, Math.floor(gamma * Math.cbrt(length))), preliminaryLag, gamma };
}

function noAutomaticLag(preliminaryLag: number): NumericError {
  return new NumericError({
    code: 'no-automatic-lag',
    where: 'neweyWestAutomaticLag',
    expected: 'autocovariances that do not cancel',
    received: `a sum of zero over ${preliminaryLag} lags`,
    hint: 'State a lag: a common rule of thumb is floor(4 (n/100)^(2/9)).',
  });
}
