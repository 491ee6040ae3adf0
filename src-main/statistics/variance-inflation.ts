import type { LeastSquaresFit } from './least-squares.ts';
import { mean, sum, sumOfProducts } from './summation.ts';

/**
 * Variance inflation factor of each predictor: by how much its coefficient's variance exceeds what it would be if no
 * other predictor resembled it. 1 for a lone predictor.
 *
 * Model    VIF_j = [(X′WX)⁻¹]_jj Σ w (x_j − x̄_j)², x̄_j the weighted mean; with no intercept, x̄_j = 0
 *
 * @param fit           a fit; its first column is the intercept when hasIntercept
 * @returns  one factor per predictor, the intercept left out
 *
 * Source   Marquardt 1970, Technometrics 12, 591–612
 * Checked  test/reference/statistics/lm-live.test.ts (B: 1/(1 − R²) of each predictor on the others in R)
 */
export function varianceInflation(fit: LeastSquaresFit, hasIntercept: boolean): number[] {
  const { columns, weights, unscaledCovariance, nCoefficients } = fit;
  return columns.slice(hasIntercept ? 1 : 0).map((column, place) => {
    const j = hasIntercept ? place + 1 : place;
    const centre = !hasIntercept ? 0 : weights ? sumOfProducts(column, weights) / sum(weights) : mean(column);
    const spread = sum(column.map((value, i) => (weights?.[i] ?? 1) * (value - centre) ** 2));
    return unscaledCovariance[j * nCoefficients + j]! * spread;
  });
}
