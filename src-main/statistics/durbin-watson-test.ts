import { EigenvalueDecomposition, Matrix } from 'ml-matrix';
import type { Caveat } from '../contract/primitives.ts';
import { InputError } from '../errors.ts';
import { durbinWatson } from './durbin-watson.ts';
import { durbinWatsonBounds, type DurbinWatsonBounds } from './durbin-watson-bounds.ts';
import { finiteValues } from './finite-values.ts';
import { multiplyByQ, multiplyByQTransposed, pivotedQr } from './pivoted-qr.ts';
import { quadraticFormBelowZero } from './quadratic-form-below-zero.ts';

export interface DurbinWatsonTest {
  statistic: number;
  /** Probability of a statistic at most as large when errors are independent: small for positive correlation. */
  p: number;
  /** Of the 5 % test, whatever the predictors. */
  bounds5Percent: DurbinWatsonBounds;
  caveats: Caveat[];
}

/** Eigenvalues of a matrix of this size take seconds. */
const MOST_ROWS = 1000;

/**
 * Durbin–Watson test with its exact distribution for the design at hand: are neighbouring errors alike?
 *
 * Model    d = e′Ae/e′e = Σ ν z²/Σ z² with independent normal errors, ν the eigenvalues of Q′AQ, Q a basis of what the
 *          columns leave; p = P(d ≤ observed). One-sided against positive correlation; 1 − p against negative
 * Assumes  rows in order of time, equally spaced, without gaps; normal errors of one variance; predictors that do not
 *          depend on earlier errors
 *
 * @param fit  columns and residuals of an unweighted least-squares fit; at most 1000 rows
 * @param hasIntercept  whether a column of ones is among the columns
 * @returns  caveat no-intercept: the bounds are then Farebrother's, not those of the usual table
 * @throws   InputError too-few-observations, too-many-values; NumericError exact-fit
 *
 * Differs  lmtest::dwtest: the same p for up to 100 rows, a normal approximation beyond
 * Source   Durbin & Watson 1950, Biometrika 37, 409–428; exact p: Imhof 1961, Biometrika 48, 419–426
 * Checked  test/reference/statistics/durbin-watson-test.test.ts (B: Imhof's integral in base R for the same designs)
 */
export function durbinWatsonTest(
  fit: { columns: readonly ArrayLike<number>[]; residuals: ArrayLike<number> },
  hasIntercept: boolean,
): DurbinWatsonTest {
  const residuals = finiteValues('durbinWatsonTest', 'residuals', fit.residuals, { atLeast: 3 });
  const nObs = residuals.length;
  const nCoefficients = fit.columns.length;
  refuseSize(nObs, nCoefficients);
  const statistic = durbinWatson(residuals);
  const eigenvalues = eigenvaluesLeft(fit.columns, nObs);
  return {
    statistic,
    p: quadraticFormBelowZero(eigenvalues.map((value) => value - statistic)),
    bounds5Percent: durbinWatsonBounds({
      nObs,
      nPredictors: nCoefficients - (hasIntercept ? 1 : 0),
      intercept: hasIntercept,
      levelPercent: 5,
    }),
    caveats: hasIntercept
      ? []
      : [
          {
            code: 'no-intercept',
            detail:
              'The usual Durbin–Watson table holds for lines with an intercept only. These bounds are those for lines through the origin, whose lower one is smaller; p is exact for this line.',
          },
        ],
  };
}

/** Eigenvalues of Q′AQ: A's rows and columns turned by the reflectors of X, those of X's own space cut off. */
function eigenvaluesLeft(columns: readonly ArrayLike<number>[], nObs: number): Float64Array {
  const scaled = columns.map((column) => {
    const values = Float64Array.from(column);
    const largest = values.reduce((most, value) => Math.max(most, Math.abs(value)), 0);
    return values.map((value) => value / largest);
  });
  const qr = pivotedQr(scaled);
  const nLeft = nObs - columns.length;
  const left = new Matrix(nLeft, nLeft);
  for (let j = 0; j < nLeft; j++) {
    const direction = new Float64Array(nObs);
    direction[columns.length + j] = 1;
    multiplyByQ(qr, direction);
    const image = direction.map((value, t) => {
      const fromBefore = t === 0 ? 0 : value - direction[t - 1]!;
      const fromAfter = t === nObs - 1 ? 0 : value - direction[t + 1]!;
      return fromBefore + fromAfter;
    });
    multiplyByQTransposed(qr, image);
    for (let i = 0; i < nLeft; i++) left.set(i, j, image[columns.length + i]!);
  }
  for (let i = 0; i < nLeft; i++) for (let j = 0; j < i; j++) left.set(i, j, left.get(j, i));
  return Float64Array.from(new EigenvalueDecomposition(left, { assumeSymmetric: true }).realEigenvalues);
}

function refuseSize(nObs: number, nCoefficients: number): void {
  if (nObs >= nCoefficients + 2 && nObs <= MOST_ROWS) return;
  const isShort = nObs < nCoefficients + 2;
  throw new InputError({
    code: isShort ? 'too-few-observations' : 'too-many-values',
    where: 'durbinWatsonTest',
    expected: isShort
      ? `at least ${nCoefficients + 2} rows for ${nCoefficients} coefficients`
      : `at most ${MOST_ROWS} rows`,
    received: `${nObs}`,
    hint: isShort ? 'Take a longer window or fewer predictors.' : 'Use Breusch–Godfrey, which long series are for.',
  });
}
