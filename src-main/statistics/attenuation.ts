import type { Caveat } from '../contract/primitives.ts';
import { NumericError } from '../errors.ts';
import { deviations } from './deviations.ts';
import { finiteNumber } from './finite-values.ts';
import { sumOfProducts } from './summation.ts';

export interface AttenuationRequest {
  x: ArrayLike<number>;
  y: ArrayLike<number>;
  /** Standard deviation of the errors of x, in the unit of x. */
  xErrorStandardDeviation: number;
}

export interface Attenuation {
  /** Of y on x by least squares with an intercept. */
  slope: number;
  /** κ: the share of the variance of x that is not error. */
  reliability: number;
  /** slope/κ. */
  correctedSlope: number;
  /**
   * Between which the slope lies whatever the error variances, as long as the errors are uncorrelated: y on x (b), and x on
   * y turned round (1/b′), null when x and y are uncorrelated.
   */
  bounds: { direct: number; reverse: number | null };
  caveats: Caveat[];
}

/**
 * Attenuation of a slope by errors in the predictor: by how much the line of least squares, which takes x for exact, is too
 * flat.
 *
 * Model    observed x = ξ + ε, y = a + β ξ + e, ε and e independent of ξ and of each other;
 *          κ = 1 − σ_ε²/s_x², s_x² = Σ(x − x̄)²/(n − 1); E b ≈ κβ; b = s_xy/s_xx, 1/b′ = s_yy/s_xy
 * Assumes  errors of constant variance, uncorrelated from row to row
 *
 * @param x, y   [nObs ≥ 3] finite, neither constant
 * @param xErrorStandardDeviation  0 or more
 * @returns  caveat low-reliability below ½
 * @throws   InputError wrong-length, too-few-values, not-finite, out-of-range; NumericError constant, no-signal when the
 *           errors account for all of the variance of x
 *
 * Differs  Frost & Thompson call 1/κ the regression dilution ratio
 * Source   Frost & Thompson 2000, J. R. Stat. Soc. A 163, 173–189; bounds: Frisch 1934, Statistical Confluence Analysis
 * Checked  test/reference/statistics/deming.test.ts (A: Pearson's data, both regressions; C: errors that are exactly
 *          uncorrelated in the sample give β back)
 */
export function attenuation({ x, y, xErrorStandardDeviation }: AttenuationRequest): Attenuation {
  finiteNumber('attenuation', 'xErrorStandardDeviation', xErrorStandardDeviation, { atLeast: 0 });
  const dx = deviations('attenuation', 'x', x, { atLeast: 3 });
  const dy = deviations('attenuation', 'y', y, { length: dx.length });
  const xx = sumOfProducts(dx, dx);
  const xy = sumOfProducts(dx, dy);
  const reliability = 1 - (xErrorStandardDeviation ** 2 * (dx.length - 1)) / xx;
  if (reliability <= 0) {
    const standardDeviation = Math.sqrt(xx / (dx.length - 1));
    throw new NumericError({
      code: 'no-signal',
      where: 'attenuation, xErrorStandardDeviation',
      expected: `errors smaller than the standard deviation of x, ${standardDeviation.toPrecision(4)}`,
      received: String(xErrorStandardDeviation),
      hint: 'Check the unit of the errors. If they are as large as that, x says nothing.',
    });
  }
  const slope = xy / xx;
  const detail = `Errors account for ${(100 * (1 - reliability)).toFixed(0)} % of the variance of x: the corrected slope hangs on their size.`;
  return {
    slope,
    reliability,
    correctedSlope: slope / reliability,
    bounds: { direct: slope, reverse: xy === 0 ? null : sumOfProducts(dy, dy) / xy },
    caveats: reliability < 0.5 ? [{ code: 'low-reliability', detail }] : [],
  };
}
