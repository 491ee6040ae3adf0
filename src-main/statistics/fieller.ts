import { finiteNumber } from './finite-values.ts';

/** A ratio of two estimates with normal errors. */
export interface EstimatedRatio {
  numerator: number;
  denominator: number;
  numeratorVariance: number;
  covariance: number;
  denominatorVariance: number;
  /** Quantile of the normal or of the t distribution that makes the level. */
  multiple: number;
}

/**
 * Fieller's set for a ratio: all ratios r at which numerator − r·denominator cannot be told from zero.
 *
 * Model    {r : (a − rb)² ≤ z² (v_aa − 2r v_ab + r² v_bb)}. Between two roots while b is distinct from zero, b² > z² v_bb;
 *          else the set reaches over infinity, and the end beyond the estimate is open; without real roots it is the whole
 *          line
 *
 * @param ratio  estimates and their (co)variances, any unit; denominator not zero
 * @returns  null at an end that is open
 * @throws   InputError out-of-range
 *
 * Source   Fieller 1954, J. R. Stat. Soc. B 16, 175–185
 * Checked  test/unit/statistics/fieller.test.ts (C: both ends meet the definition; D: coverage of simulated ratios),
 *          test/reference/climate/gregory.test.ts (B: uniroot in R on the inequality itself)
 */
export function fieller(ratio: EstimatedRatio): { low: number | null; high: number | null } {
  const { numerator: a, denominator: b, numeratorVariance, denominatorVariance, covariance, multiple } = ratio;
  finiteNumber('fieller', 'numerator', a);
  finiteNumber('fieller', 'covariance', covariance);
  finiteNumber('fieller', 'numeratorVariance', numeratorVariance, { atLeast: 0 });
  finiteNumber('fieller', 'denominatorVariance', denominatorVariance, { atLeast: 0 });
  finiteNumber('fieller', 'denominator', Math.abs(b), { above: 0 });
  finiteNumber('fieller', 'multiple', multiple, { above: 0 });
  const zSquared = multiple ** 2;
  const square = b * b - zSquared * denominatorVariance;
  const half = a * b - zSquared * covariance;
  // half² − square·(a² − z² v_aa), as a sum that does not cancel where the variances are small.
  const discriminant =
    zSquared *
    (numeratorVariance * b * b -
      2 * a * b * covariance +
      a * a * denominatorVariance -
      zSquared * (numeratorVariance * denominatorVariance - covariance ** 2));
  if (square > 0) {
    const root = Math.sqrt(Math.max(0, discriminant));
    return { low: (half - root) / square, high: (half + root) / square };
  }
  if (discriminant < 0) return { low: null, high: null };
  // The estimate lies beyond one of the ends that are left; from there the set runs to infinity.
  const root = Math.sqrt(discriminant);
  const ends =
    square === 0
      ? [(a * a - zSquared * numeratorVariance) / (2 * half)]
      : [(half - root) / square, (half + root) / square];
  const low = Math.max(...ends.filter((end) => end <= a / b));
  return Number.isFinite(low) ? { low, high: null } : { low: null, high: Math.min(...ends) };
}
