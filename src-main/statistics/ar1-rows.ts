/**
 * Rows freed from AR(1) errors: v_t − ρ v_{t−1}, and the first row times √(1 − ρ²), so that errors e_t = ρ e_{t−1} + u_t
 * become the uncorrelated u_t of one variance.
 *
 * @param values  [nObs] in order of time, equally spaced
 * @param rho     −1 < ρ < 1
 *
 * Source   Prais & Winsten 1954, Cowles Commission Discussion Paper 383
 * Checked  test/unit/statistics/ar1-rows.test.ts (C: their product gives the inverse of the AR(1) covariance)
 */
export function ar1Rows(values: Float64Array, rho: number): Float64Array {
  return values.map((value, t) => (t === 0 ? value * Math.sqrt((1 - rho) * (1 + rho)) : value - rho * values[t - 1]!));
}
