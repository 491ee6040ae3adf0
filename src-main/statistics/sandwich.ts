import type { LeastSquaresFit } from './least-squares.ts';

/**
 * Scores of a least-squares fit: each row's contribution w·x·e to the equations X′We = 0 that define the coefficients.
 *
 * @param factor  optional [nObs] factor on each row's residual (the leverage corrections of hc2 and hc3)
 * @returns  nCoefficients × [nObs]
 */
export function scores({ columns, residuals, weights }: LeastSquaresFit, factor?: Float64Array): Float64Array[] {
  const rows = residuals.map((residual, i) => residual * (weights?.[i] ?? 1) * (factor?.[i] ?? 1));
  return columns.map((column) => column.map((value, i) => value * rows[i]!));
}

/** Σ_t s_t s_{t−lag}′ of scores s, [k × k] row by row; symmetric only at lag 0. */
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

/**
 * Sandwich covariance of least-squares coefficients: bread · meat · bread, with the bread (X′WX)⁻¹.
 *
 * @param bread, meat  [k × k] row by row, symmetric
 *
 * Source   White 1980, Econometrica 48, 817–838; the names after Zeileis 2006, J. Stat. Softw. 16(9)
 * Checked  through hc0–hc3 and newey-west in test/reference/statistics/lm-live.test.ts (B)
 */
export function sandwich(bread: Float64Array, meat: Float64Array): Float64Array {
  const k = Math.sqrt(bread.length);
  const product = multiply(multiply(bread, meat, k), bread, k);
  for (let i = 0; i < k; i++) for (let j = 0; j < i; j++) product[i * k + j] = product[j * k + i]!;
  return product;
}

function multiply(a: Float64Array, b: Float64Array, k: number): Float64Array {
  const product = new Float64Array(k * k);
  for (let i = 0; i < k; i++) {
    for (let j = 0; j < k; j++) {
      for (let m = 0; m < k; m++) product[i * k + j] = product[i * k + j]! + a[i * k + m]! * b[m * k + j]!;
    }
  }
  return product;
}
