import { finiteNumber } from './finite-values.ts';

/**
 * Block length for resampling a series whose errors carry over: longer where neighbours are more alike.
 *
 * Model    the L with L = (n − L + 1)^((2/3)(1 − n_eff/n)), n_eff/n = (1 − r)/(1 + r), rounded; 1 for r ≤ 0
 * Assumes  errors of an AR(1) process
 *
 * @param nObs               number of rows, at least 3
 * @param lagOneCorrelation  r, −1 < r < 1
 * @returns  1 … nObs/2
 * @throws   InputError out-of-range
 *
 * Source   Wilks 1997, J. Climate 10, 65–82, equation 22 (from memory)
 * Checked  test/unit/statistics/wilks-block-length.test.ts (C: the equation holds within rounding; limits)
 */
export function wilksBlockLength(nObs: number, lagOneCorrelation: number): number {
  finiteNumber('wilksBlockLength', 'nObs', nObs, { isWhole: true, atLeast: 3 });
  finiteNumber('wilksBlockLength', 'lagOneCorrelation', lagOneCorrelation, { above: -1, below: 1 });
  const r = Math.max(0, lagOneCorrelation);
  const exponent = (2 / 3) * (1 - (1 - r) / (1 + r));
  // L grows and (n − L + 1)^exponent falls with L, so that they cross once.
  let [low, high] = [1, nObs];
  for (let halving = 0; halving < 60; halving++) {
    const middle = (low + high) / 2;
    if (middle < (nObs - middle + 1) ** exponent) low = middle;
    else high = middle;
  }
  return Math.max(1, Math.min(Math.floor(nObs / 2), Math.round(low)));
}
