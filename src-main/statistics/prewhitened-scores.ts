import { EigenvalueDecomposition, inverse, Matrix } from 'ml-matrix';
import { InputError, NumericError } from '../errors.ts';
import { leastSquares } from './least-squares.ts';

export interface PrewhitenedScores {
  /** u_t = s_t − A s_{t−1}: nScores × [nObs − 1]. */
  innovations: Float64Array[];
  /** (I − A)⁻¹, row by row: takes the long-run variance of the innovations back to that of the scores. */
  recolouring: number[][];
}

/**
 * Prewhitening by a first-order vector autoregression: takes from each row of scores what the row before foretells, so
 * that the few lags of a Newey–West sum have less left to catch.
 *
 * Model    s_t = A s_{t−1} + u_t, A by least squares, without a constant
 * Assumes  rows in order of time, equally spaced, without gaps
 *
 * @param scores  nScores × [nObs], finite
 * @throws   InputError too-few-observations; NumericError rank-deficient, not-stationary
 *
 * Differs  Andrews & Monahan hold the singular values of A to at most 0.97. Those change with the units of the
 *          predictors, A's eigenvalues do not: here A stays as it is, so that the result does not depend on units, and
 *          an A with an eigenvalue of 1 or more in modulus is refused. R's sandwich has no limit either
 * Source   Andrews & Monahan 1992, Econometrica 60, 953–966 (the limit: from memory)
 * Checked  test/reference/statistics/newey-west.test.ts (B: base R)
 */
export function prewhitenedScores(scores: readonly Float64Array[]): PrewhitenedScores {
  const nScores = scores.length;
  const nObs = scores[0]?.length ?? 0;
  if (nObs - 1 <= nScores) {
    throw new InputError({
      code: 'too-few-observations',
      where: 'prewhitenedScores',
      expected: `more than ${nScores + 1} rows for an autoregression of ${nScores} scores`,
      received: String(nObs),
      hint: 'Take a longer window, or leave prewhitening out.',
    });
  }
  const before = scores.map((score) => score.subarray(0, -1));
  const fits = scores.map((score) =>
    leastSquares({ columns: before, y: score.subarray(1), caller: 'prewhitenedScores' }),
  );
  const carryOver = new Matrix(fits.map(({ coefficients }) => [...coefficients]));
  refuseGrowth(carryOver);
  return {
    innovations: fits.map(({ residuals }) => residuals),
    recolouring: inverse(Matrix.sub(Matrix.eye(nScores), carryOver)).to2DArray(),
  };
}

function refuseGrowth(carryOver: Matrix): void {
  const { realEigenvalues, imaginaryEigenvalues } = new EigenvalueDecomposition(carryOver);
  const largest = Math.max(...realEigenvalues.map((real, at) => Math.hypot(real, imaginaryEigenvalues[at]!)));
  if (largest < 1) return;
  throw new NumericError({
    code: 'not-stationary',
    where: 'prewhitenedScores',
    expected: 'scores that forget their past (eigenvalues below 1 in modulus)',
    received: `an eigenvalue of ${largest.toPrecision(3)}`,
    hint: 'Leave prewhitening out, or estimate the line with AR(1) errors.',
  });
}
