import { refuseExactFit } from './exact-fit.ts';
import { finiteValues } from './finite-values.ts';
import { sumOfProducts } from './summation.ts';

/**
 * Durbin–Watson statistic: about 2 for residuals that know nothing of their neighbours, towards 0 when neighbours are
 * alike, towards 4 when they alternate; about 2(1 − r) with r their lag-one correlation.
 *
 * Model    Σ_{t≥2} (e_t − e_{t−1})² / Σ e_t²
 * Assumes  rows in order of time, equally spaced. The published bounds hold for designs with an intercept only
 *
 * @param residuals  [nObs ≥ 2] finite, not all zero
 * @throws   InputError too-few-values, not-finite; NumericError exact-fit when all are zero
 *
 * Source   Durbin & Watson 1950, Biometrika 37, 409–428
 * Checked  test/reference/statistics/nist-regression.test.ts (C: computed in exact rational arithmetic), lm-live.test.ts (B)
 */
export function durbinWatson(residuals: ArrayLike<number>): number {
  const e = finiteValues('durbinWatson', 'residuals', residuals, { atLeast: 2 });
  const squares = sumOfProducts(e, e);
  refuseExactFit('durbinWatson', squares);
  const steps = e.subarray(1).map((value, t) => value - e[t]!);
  return sumOfProducts(steps, steps) / squares;
}
