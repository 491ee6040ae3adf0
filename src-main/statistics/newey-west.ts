import { laggedCrossProduct } from './error-influence.ts';
import { finiteNumber } from './finite-values.ts';
import type { LeastSquaresFit } from './least-squares.ts';
import { neweyWestRows, type NeweyWestSetting } from './newey-west-rows.ts';

export interface NeweyWestOptions extends NeweyWestSetting {
  /** Largest lag L with a non-zero weight. 0 gives hc0. */
  lag: number;
  /** Multiplies the covariance by n/(n − k). */
  smallSample: boolean;
}

/**
 * Newey–West covariance of least-squares coefficients: errors may differ in variance and may be correlated with their
 * neighbours up to a stated lag.
 *
 * Model    (X′WX)⁻¹ [Γ_0 + Σ_{j=1…L} (1 − j/(L + 1))(Γ_j + Γ_j′)] (X′WX)⁻¹, Γ_j = Σ_t s_t s_{t−j}′, s_t = w_t x_t e_t.
 *          With `years`, Γ_j is over the pairs of rows whose years differ by exactly j. With prewhitening, the n − 1
 *          innovations of a VAR(1) of s_t stand for s_t, and (I − A)⁻¹ is put around the bracket
 * Assumes  rows in order of time; equally spaced, without gaps, unless `years` are given
 *
 * @returns  [k × k] row by row, in the order of the fit's columns
 * @throws   InputError out-of-range when the lag is not a whole number from 0 to n − 1; as `neweyWestRows`
 *
 * Differs  no prewhitening and no automatic lag unless asked for, which R's sandwich::NeweyWest does by default: there
 *          use lag = L, prewhite = FALSE, adjust = smallSample. Stata's newey is smallSample = true; statsmodels'
 *          cov_type "HAC" is smallSample = false unless use_correction is set. Without `years` a gap is closed up, which
 *          is the "equal spacing" estimator of Datta & Du, with `years` their "amplitude modulated" one: both are
 *          consistent; the first has the lower bias in most of their simulations, the second the lower variance in
 *          short, weakly correlated series
 * Source   Newey & West 1987, Econometrica 55, 703–708; Datta & Du 2012, Int. Finance Discuss. Pap. 1060,
 *          doi:10.17016/ifdp.2012.1060 (gaps; its abstract seen); prewhitening as `prewhitenedScores`
 * Checked  test/reference/statistics/lm-live.test.ts (B: base R, lags 0, 3 and 8, both small-sample options),
 *          newey-west.test.ts (B: base R, prewhitening and gaps)
 */
export function neweyWest(fit: LeastSquaresFit, { lag, smallSample, ...setting }: NeweyWestOptions): Float64Array {
  finiteNumber('neweyWest', 'lag', lag, {
    isWhole: true,
    atLeast: 0,
    atMost: fit.nObs - 1,
    hint: 'Choose a smaller lag or a longer window.',
  });
  const k = fit.nCoefficients;
  const { influence } = neweyWestRows(fit, setting);
  const covariance = laggedCrossProduct(influence, 0);
  for (let j = 1; j <= lag; j++) {
    const weight = 1 - j / (lag + 1);
    const product = laggedCrossProduct(influence, j);
    for (let row = 0; row < k; row++) {
      for (let column = 0; column < k; column++) {
        const both = product[row * k + column]! + product[column * k + row]!;
        covariance[row * k + column]! += weight * both;
      }
    }
  }
  const factor = smallSample ? fit.nObs / (fit.nObs - k) : 1;
  return covariance.map((value) => value * factor);
}
