/** A ratio of two estimates with normal errors. */
export interface EstimatedRatio {
  numerator: number;
  denominator: number;
  numeratorVariance: number;
  covariance: number;
  denominatorVariance: number;
  /** Quantile of t or of the normal distribution that makes the level. */
  multiple: number;
}

/**
 * Fieller's interval of a ratio: all ratios r at which numerator − r·denominator cannot be told from zero.
 *
 * Model    (a − rb)² ≤ z² (v_aa − 2r v_ab + r² v_bb), solved for r
 * Assumes  a denominator distinct from zero, b² > z² v_bb: otherwise the set is no interval
 *
 * @returns  null at both ends when the denominator is not distinct from zero
 *
 * Source   Fieller 1954, J. Roy. Stat. Soc. B 16, 175–185
 * Checked  test/reference/climate/gregory.test.ts (B: uniroot in R on the inequality itself)
 */
export function fiellerInterval({
  numerator: a,
  denominator: b,
  numeratorVariance,
  covariance,
  denominatorVariance,
  multiple,
}: EstimatedRatio): { low: number | null; high: number | null } {
  const z2 = multiple ** 2;
  const square = b * b - z2 * denominatorVariance;
  if (!(square > 0)) return { low: null, high: null };
  const middle = (a * b - z2 * covariance) / square;
  // middle² − (a² − z² v_aa)/square, as a sum that does not cancel where the variances are small.
  const spread =
    numeratorVariance * b * b -
    2 * a * b * covariance +
    a * a * denominatorVariance -
    z2 * (numeratorVariance * denominatorVariance - covariance ** 2);
  const half = (multiple * Math.sqrt(Math.max(0, spread))) / square;
  return { low: middle - half, high: middle + half };
}
