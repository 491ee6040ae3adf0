import normalQuantile from '@stdlib/stats-base-dists-normal-quantile';
import type { Interval } from '../contract/primitives.ts';
import { finiteNumber } from './finite-values.ts';

export interface RatioOfNormals {
  numerator: number;
  denominator: number;
  numeratorVariance: number;
  denominatorVariance: number;
  covariance: number;
}

/**
 * Fieller's confidence set for the ratio of two normal means.
 *
 * Model    {θ : (a − θb)² ≤ z² (v_a − 2θ v_ab + θ² v_b)}. Between two roots while b differs from zero at the level; else
 *          the set reaches over infinity, and the end beyond the estimate is open; without real roots it is the whole line
 *
 * @param ratio  means and their (co)variances, any unit; denominator not zero
 * @param levelPercent  of the interval, two-sided
 * @returns  null at an end that is open
 * @throws   InputError out-of-range
 *
 * Source   Fieller 1954, J. R. Stat. Soc. B 16, 175–185
 * Checked  test/unit/statistics/fieller.test.ts (C: both ends meet the definition; D: coverage of simulated ratios)
 */
export function fieller(ratio: RatioOfNormals, levelPercent: number): Interval {
  const { numerator: a, denominator: b, numeratorVariance, denominatorVariance, covariance } = ratio;
  finiteNumber('fieller', 'numerator', a);
  finiteNumber('fieller', 'covariance', covariance);
  finiteNumber('fieller', 'numeratorVariance', numeratorVariance, { atLeast: 0 });
  finiteNumber('fieller', 'denominatorVariance', denominatorVariance, { atLeast: 0 });
  finiteNumber('fieller', 'denominator', Math.abs(b), { above: 0 });
  finiteNumber('fieller', 'levelPercent', levelPercent, { above: 0, below: 100 });
  const zSquared = normalQuantile(0.5 + levelPercent / 200, 0, 1) ** 2;
  const square = b * b - zSquared * denominatorVariance;
  const half = a * b - zSquared * covariance;
  const constant = a * a - zSquared * numeratorVariance;
  const discriminant = half * half - square * constant;
  if (discriminant < 0) return { low: null, high: null, levelPercent };
  const root = Math.sqrt(discriminant);
  if (square > 0) return { low: (half - root) / square, high: (half + root) / square, levelPercent };
  // The estimate lies beyond one of the two ends that are left; from there the set runs to infinity.
  const ends = square === 0 ? [constant / (2 * half)] : [(half - root) / square, (half + root) / square];
  const estimate = a / b;
  const low = Math.max(...ends.filter((end) => end <= estimate));
  if (Number.isFinite(low)) return { low, high: null, levelPercent };
  return { low: null, high: Math.min(...ends), levelPercent };
}
