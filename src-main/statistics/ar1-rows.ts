/**
 * Rows freed from AR(1) errors: v_t − ρ v_{t−1}, and the first row times √(1 − ρ²), so that errors e_t = ρ e_{t−1} + u_t
 * become the uncorrelated u_t of one variance. Across a gap, d years after the row before, (v_t − ρ^d v_{t−1})/√F_t with
 * F_t = 1 + ρ² + … + ρ^(2(d−1)).
 *
 * @param values  [nObs] in order of time
 * @param rho     −1 < ρ < 1
 * @param steps   [nObs] calendar distance of each row from the one before; all 1 unless given
 *
 * Source   Prais & Winsten 1954, Cowles Commission Discussion Paper 383; across gaps by d-fold substitution
 * Checked  test/unit/statistics/ar1-rows.test.ts (C: their product gives the inverse of the AR(1) covariance)
 */
export function ar1Rows(values: Float64Array, rho: number, steps?: Float64Array): Float64Array {
  return values.map((value, t) => {
    if (t === 0) return value * Math.sqrt((1 - rho) * (1 + rho));
    const step = steps?.[t] ?? 1;
    if (step === 1) return value - rho * values[t - 1]!;
    return (value - rho ** step * values[t - 1]!) / Math.sqrt(ar1GapVariance(rho, step).variance);
  });
}

/** F = Σ_{i<d} ρ^2i: the variance that errors gain in d years, in units of σ²; and its derivative by ρ. */
export function ar1GapVariance(rho: number, step: number): { variance: number; slope: number } {
  let [variance, slope] = [1, 0];
  for (let i = 1; i < step; i++) {
    variance += rho ** (2 * i);
    slope += 2 * i * rho ** (2 * i - 1);
  }
  return { variance, slope };
}
