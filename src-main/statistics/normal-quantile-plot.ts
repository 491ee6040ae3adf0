import normalQuantile from '@stdlib/stats-base-dists-normal-quantile';
import { quantileOfSorted } from './quantile.ts';
import { varyingValues } from './varying-values.ts';

export interface NormalQuantilePlot {
  /** [nObs] of the standard normal, ascending. */
  normal: number[];
  /** [nObs] the values, ascending. */
  values: number[];
  /** Through the quartiles of both: where the points of a normal sample lie. */
  line: { intercept: number; slope: number };
}

/**
 * Normal quantile plot: values in order of size against what a normal sample of their number would give.
 *
 * Model    z_i = Φ⁻¹((i − a)/(n + 1 − 2a)), a = 3/8 up to ten values, 1/2 beyond; the line through the quartiles (type 7)
 *
 * @param values  [nObs ≥ 3] finite, not all equal
 * @throws   InputError too-few-values, not-finite; NumericError constant
 *
 * Source   Blom 1958 (3/8) and Hazen 1914 (1/2), as R's ppoints chooses between them; Tukey 1977 (line; from memory)
 * Checked  test/reference/statistics/residual-plots.test.ts (B: R's qqnorm and qqline)
 */
export function normalQuantilePlot(values: ArrayLike<number>): NormalQuantilePlot {
  varyingValues('normalQuantilePlot', 'values', values, { atLeast: 3 });
  const sorted = Float64Array.from(values).sort();
  const n = sorted.length;
  const a = n <= 10 ? 3 / 8 : 1 / 2;
  const [low, high] = [quantileOfSorted(sorted, 0.25), quantileOfSorted(sorted, 0.75)];
  const slope = (high - low) / (2 * normalQuantile(0.75, 0, 1));
  return {
    normal: Array.from(sorted, (_, i) => normalQuantile((i + 1 - a) / (n + 1 - 2 * a), 0, 1)),
    values: [...sorted],
    line: { intercept: (low + high) / 2, slope },
  };
}
