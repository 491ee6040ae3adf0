import { NumericError } from '../errors.ts';
import { errorInfluence, laggedCrossProduct } from './error-influence.ts';
import { LEVERAGE_OF_ONE, type LeastSquaresFit } from './least-squares.ts';

export type HeteroskedasticKind = 'hc0' | 'hc1' | 'hc2' | 'hc3';

/**
 * Heteroskedasticity-consistent covariance of least-squares coefficients: errors may differ in variance from row to
 * row, but must be uncorrelated.
 *
 * Model    (X′WX)⁻¹ [Σ f_i² w_i² e_i² x_i x_i′] (X′WX)⁻¹ with
 *          hc0: f = 1 · hc1: f² = n/(n − k) · hc2: f² = 1/(1 − h_i) · hc3: f² = 1/(1 − h_i)²
 *
 * @returns  [k × k] row by row, in the order of the fit's columns
 * @throws   NumericError leverage-of-one for hc2 and hc3
 *
 * Source   hc0 White 1980; hc1 Hinkley 1977; hc2 Horn, Horn & Duncan 1975; hc3 MacKinnon & White 1985,
 *          J. Econometrics 29, 305–325; the labels are theirs
 * Checked  test/reference/statistics/lm-live.test.ts (B: base R, plain and weighted)
 */
export function heteroskedasticCovariance(fit: LeastSquaresFit, kind: HeteroskedasticKind): Float64Array {
  const factor = fit.leverage.map((leverage, i) => {
    if (kind === 'hc0') return 1;
    if (kind === 'hc1') return Math.sqrt(fit.nObs / (fit.nObs - fit.nCoefficients));
    if (leverage > LEVERAGE_OF_ONE) throw leverageOfOne(kind, i);
    return kind === 'hc2' ? 1 / Math.sqrt(1 - leverage) : 1 / (1 - leverage);
  });
  return laggedCrossProduct(errorInfluence(fit, factor), 0);
}

function leverageOfOne(kind: HeteroskedasticKind, row: number): NumericError {
  return new NumericError({
    code: 'leverage-of-one',
    where: `heteroskedasticCovariance, ${kind}`,
    expected: 'every row to leave something to the others (leverage below 1)',
    received: `row ${row}, which the line goes through exactly whatever its value`,
    hint: 'Use hc0 or hc1, or leave out the predictor that only this row decides.',
  });
}
