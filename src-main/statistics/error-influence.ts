import type { LeastSquaresFit } from './least-squares.ts';

/**
 * Error influence: by how much each row's residual e_t moved each coefficient, ψ_t = (X′WX)⁻¹ x_t w_t e_t: the bread of
 * a sandwich covariance times the row's score. They sum to zero, and every robust covariance is a sum of their products.
 * Bread · meat · bread is the same in exact arithmetic, but loses twice as many digits when predictors resemble each other.
 *
 * @param factor  optional [nObs] factor on each residual (the leverage corrections of hc2 and hc3)
 * @returns  nCoefficients × [nObs], unit of the coefficient
 *
 * Source   Hampel 1974, J. Am. Stat. Assoc. 69, 383–393 (influence); Zeileis 2006, J. Stat. Softw. 16(9) (bread, meat)
 * Checked  through hc0–hc3 and newey-west in test/reference/statistics/lm-live.test.ts (B)
 */
export function errorInfluence(
  { observationInfluence, residuals }: LeastSquaresFit,
  factor?: Float64Array,
): Float64Array[] {
  return observationInfluence.map((column) => column.map((value, t) => value * residuals[t]! * (factor?.[t] ?? 1)));
}

/** Σ_t ψ_t ψ_{t−lag}′, [k × k] row by row; symmetric only at lag 0. */
export function laggedCrossProduct(columns: readonly Float64Array[], lag: number): Float64Array {
  const k = columns.length;
  const product = new Float64Array(k * k);
  for (let i = 0; i < k; i++) {
    for (let j = 0; j < k; j++) {
      let total = 0;
      for (let t = lag; t < columns[i]!.length; t++) total += columns[i]![t]! * columns[j]![t - lag]!;
      product[i * k + j] = total;
    }
  }
  return product;
}
