import { InputError } from '../errors.ts';
import { finiteNumber } from './finite-values.ts';
import { quadraticFormBelowZero } from './quadratic-form-below-zero.ts';

export interface DurbinWatsonBoundsRequest {
  nObs: number;
  /** Without the intercept. */
  nPredictors: number;
  intercept: boolean;
  /** Of a one-sided test against positive correlation: 5 for 5 %. */
  levelPercent: number;
}

export interface DurbinWatsonBounds {
  /** Below it errors are correlated, whatever the predictors. */
  lower: number;
  /** Above it they are not shown to be, whatever the predictors; between the two only the exact p decides. */
  upper: number;
}

/**
 * Durbin–Watson bounds: between which values the critical value of the statistic lies, whatever the predictors are.
 *
 * Model    d = e′Ae/e′e; over all designs its distribution lies between those of Σ λ_j z_j²/Σ z_j² over the n − k smallest
 *          and the n − k largest eigenvalues λ_j = 2(1 − cos πj/n) of A, j = 1 … n − 1 with an intercept; without one,
 *          j = 0 … n − 1, so that the lower bound drops: the table with intercept does not hold for a line through the origin
 *
 * @param request  nObs above the number of coefficients by 1 at least
 * @returns  quantiles of the two distributions, to about 1e-10
 * @throws   InputError out-of-range, too-few-observations
 *
 * Source   Durbin & Watson 1950, Biometrika 37, 409–428; table: Savin & White 1977, Econometrica 45, 1989–1996; without
 *          intercept: Farebrother 1980, Econometrica 48, 1553–1563
 * Checked  test/reference/statistics/durbin-watson-test.test.ts (A: printed values; B: a table computed elsewhere by
 *          Imhof's integral)
 */
export function durbinWatsonBounds({
  nObs,
  nPredictors,
  intercept,
  levelPercent,
}: DurbinWatsonBoundsRequest): DurbinWatsonBounds {
  const caller = 'durbinWatsonBounds';
  finiteNumber(caller, 'nObs', nObs, { isWhole: true, atLeast: 2, atMost: 10_000 });
  finiteNumber(caller, 'nPredictors', nPredictors, { isWhole: true, atLeast: intercept ? 0 : 1 });
  finiteNumber(caller, 'levelPercent', levelPercent, { above: 0, below: 50 });
  const first = intercept ? 1 : 0;
  const eigenvalues = Float64Array.from({ length: nObs - first }, (_, j) => {
    // 2(1 − cos u) without its cancellation.
    return 4 * Math.sin((Math.PI * (j + first)) / (2 * nObs)) ** 2;
  });
  const nFree = eigenvalues.length - nPredictors;
  if (nFree < 2) {
    throw new InputError({
      code: 'too-few-observations',
      where: caller,
      expected: `at least ${nPredictors + first + 2} rows for ${nPredictors + first} coefficients`,
      received: `${nObs}`,
      hint: 'Take a longer window or fewer predictors.',
    });
  }
  const probability = levelPercent / 100;
  return {
    lower: quantileOf(eigenvalues.subarray(0, nFree), probability),
    upper: quantileOf(eigenvalues.subarray(nPredictors), probability),
  };
}

/** d with P(Σ λ z²/Σ z² < d) = p, by regula falsi on log p (the Illinois variant, which does not stall at one end). */
function quantileOf(eigenvalues: Float64Array, probability: number): number {
  const target = Math.log(probability);
  const excess = (d: number) => Math.log(quadraticFormBelowZero(eigenvalues.map((value) => value - d))) - target;
  // At the mean of the eigenvalues about half of the probability lies below.
  let high = eigenvalues.reduce((total, value) => total + value, 0) / eigenvalues.length;
  let highExcess = excess(high);
  let low = (eigenvalues[0]! + high) / 2;
  let lowExcess = excess(low);
  while (lowExcess > 0) {
    [high, highExcess] = [low, lowExcess];
    low = (eigenvalues[0]! + low) / 2;
    lowExcess = excess(low);
  }
  let lastSide = 0;
  for (;;) {
    const middle = low - (lowExcess * (high - low)) / (highExcess - lowExcess);
    const found = excess(middle);
    if (Math.abs(found) <= 1e-11 || high - low <= 1e-14) return middle;
    const side = Math.sign(found);
    if (side < 0) {
      [low, lowExcess] = [middle, found];
      if (lastSide === side) highExcess /= 2;
    } else {
      [high, highExcess] = [middle, found];
      if (lastSide === side) lowExcess /= 2;
    }
    lastSide = side;
  }
}
