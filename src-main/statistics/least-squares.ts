import { InputError, NumericError } from '../errors.ts';
import { finiteValues } from './finite-values.ts';
import { multiplyByQ, pivotedQr, solveUpper, solveUpperTransposed, type PivotedQr } from './pivoted-qr.ts';
import { refinedSolution } from './refined-solution.ts';
import { sumOfProducts } from './summation.ts';

export interface LeastSquaresInput {
  /** Every column of the design; the intercept, if any, is one of them. */
  columns: readonly ArrayLike<number>[];
  y: ArrayLike<number>;
  /** Inverse error variances up to a common factor. */
  weights?: ArrayLike<number> | undefined;
  /** Who asks, for error messages. */
  caller?: string;
}

export interface LeastSquaresFit {
  columns: readonly Float64Array[];
  y: Float64Array;
  weights: Float64Array | null;
  nObs: number;
  nCoefficients: number;
  coefficients: Float64Array;
  /** y − fitted, unweighted. */
  residuals: Float64Array;
  fitted: Float64Array;
  /** Σ w·residual². */
  residualSumOfSquares: number;
  /** (X′WX)⁻¹, [nCoefficients × nCoefficients] row by row: the bread of every covariance. */
  unscaledCovariance: Float64Array;
  /** log |X′WX|. */
  logDeterminant: number;
  /** nCoefficients × [nObs]: how each y enters each coefficient, b_j = Σ_t observationInfluence[j][t]·y_t. */
  observationInfluence: readonly Float64Array[];
  /** Diagonal of the hat matrix. */
  leverage: Float64Array;
  /** Nearness to dependent columns: smallest over largest pivot of R, columns scaled to length about 1. */
  pivotRatio: number;
}

/** From here on a row's leverage is 1 but for rounding: the fit goes through it whatever its value. */
export const LEVERAGE_OF_ONE = 1 - 1e-10;

/** Data are doubles, rounded at 1e-16 of their size: below this ratio fewer than four digits of a coefficient are theirs. */
const SMALLEST_PIVOT_RATIO = 1e-12;

/**
 * Weighted linear least squares: the coefficients that make Σ w·(y − Xb)² smallest.
 *
 * Columns are scaled by powers of two (no rounding), so the unit of a predictor decides nothing. X is decomposed, never
 * X′X; the solution is then refined with residuals in doubled precision until it stands still, so that an exact fit
 * comes out exact and the coefficients carry nearly all digits that the columns allow.
 *
 * @param columns  nCoefficients × [nObs] finite
 * @param y        [nObs] finite
 * @param weights  [nObs] above 0
 * @returns  arrays in the order of the columns
 * @throws   InputError wrong-length, not-finite, not-positive, too-few-observations, out-of-scale;
 *           NumericError rank-deficient when a column is a combination of others to working precision;
 *           NumericError ill-conditioned when refinement does not settle
 *
 * Differs  common routines leave a dependent column out without an error, or share its coefficient out
 * Source   Björck 1967, BIT 7, 257–278 (refinement of the augmented system); Golub & Van Loan 2013, §5.3.8, §5.5
 * Checked  test/reference/statistics/nist-regression.test.ts (A), lm-live.test.ts (B)
 */
export function leastSquares(input: LeastSquaresInput): LeastSquaresFit {
  const { caller = 'leastSquares' } = input;
  const nCoefficients = input.columns.length;
  const y = finiteValues(caller, 'y', input.y);
  const nObs = y.length;
  const columns = input.columns.map((column, j) => finiteValues(caller, `column ${j + 1}`, column, { length: nObs }));
  const weights = input.weights
    ? finiteValues(caller, 'weights', input.weights, { length: nObs, sign: 'positive' })
    : null;
  if (nObs < nCoefficients || nCoefficients === 0) {
    throw new InputError({
      code: 'too-few-observations',
      where: caller,
      expected:
        nCoefficients === 0
          ? 'at least one column'
          : `at least ${nCoefficients} rows for ${nCoefficients} coefficients`,
      received: nCoefficients === 0 ? 'none' : `${nObs}`,
      hint: 'Take a longer window or fewer predictors.',
    });
  }

  const rootWeights = weights?.map(Math.sqrt) ?? null;
  const scales = columns.map((column, j) => powerOfTwoScale(caller, `column ${j + 1}`, column, rootWeights));
  const yScale = powerOfTwoScale(caller, 'y', y, rootWeights);
  const design = columns.map((column, j) => scaled(column, scales[j]!, rootWeights));
  const qr = pivotedQr(design.map((column) => column.slice()));
  refuseDependentColumns(caller, qr);
  const { solution, remainder } = refinedSolution(caller, design, scaled(y, yScale, rootWeights), qr);

  const coefficients = solution.map((value, j) => (value * scales[j]!) / yScale);
  const residuals = remainder.map((value, i) => value / yScale / (rootWeights?.[i] ?? 1));
  return {
    columns,
    y,
    weights,
    nObs,
    nCoefficients,
    coefficients,
    residuals,
    fitted: y.map((value, i) => value - residuals[i]!),
    residualSumOfSquares: sumOfProducts(remainder, remainder) / yScale / yScale,
    unscaledCovariance: inverseCrossProduct(qr, scales),
    logDeterminant:
      2 * scales.reduce((total, scale, j) => total + Math.log(Math.abs(qr.diagonal[j]!)) - Math.log(scale), 0),
    observationInfluence: pseudoInverse(qr, scales, rootWeights, nObs),
    leverage: hatDiagonal(qr, nObs),
    pivotRatio: qr.pivotRatio,
  };
}

/** The power of two that brings a column's length to between 1/2 and 1; 1 for a column of zeros. */
function powerOfTwoScale(caller: string, name: string, column: Float64Array, rootWeights: Float64Array | null): number {
  let largest = 0;
  for (const value of column) largest = Math.max(largest, Math.abs(value));
  if (largest === 0) return 1;
  if (largest < 1e-150) {
    throw new InputError({
      code: 'out-of-scale',
      where: `${caller}, ${name}`,
      expected: 'values of at least 1e-150 in magnitude, or all zero',
      received: String(largest),
      hint: 'Give the values in a smaller unit.',
    });
  }
  let squares = 0;
  for (let i = 0; i < column.length; i++) squares += ((column[i]! / largest) * (rootWeights?.[i] ?? 1)) ** 2;
  return 2 ** -Math.ceil(Math.log2(largest * Math.sqrt(squares)));
}

function scaled(column: Float64Array, scale: number, rootWeights: Float64Array | null): Float64Array {
  const product = new Float64Array(column.length);
  for (let i = 0; i < column.length; i++) product[i] = column[i]! * scale * (rootWeights?.[i] ?? 1);
  return product;
}

function refuseDependentColumns(caller: string, { pivotRatio, pivot }: PivotedQr): void {
  if (pivotRatio > SMALLEST_PIVOT_RATIO) return;
  throw new NumericError({
    code: 'rank-deficient',
    where: caller,
    expected: 'columns of which none is a combination of the others (a constant predictor doubles the intercept)',
    received: `column ${pivot.at(-1)! + 1} of ${pivot.length}, which the others give to working precision`,
    hint: 'Leave a column out, or centre and scale the predictors if they are powers of one variable.',
  });
}

/** (X′WX)⁻¹ = S P R⁻¹ R⁻ᵀ P′ S with the column scales S. */
function inverseCrossProduct(qr: PivotedQr, scales: readonly number[]): Float64Array {
  const n = scales.length;
  const inverse = new Float64Array(n * n);
  for (let j = 0; j < n; j++) {
    const unit = new Float64Array(n);
    unit[j] = 1;
    const column = solveUpper(qr, solveUpperTransposed(qr, unit));
    for (let i = 0; i < n; i++) {
      inverse[qr.pivot[i]! * n + qr.pivot[j]!] = column[i]! * scales[qr.pivot[i]!]! * scales[qr.pivot[j]!]!;
    }
  }
  for (let i = 0; i < n; i++) for (let j = 0; j < i; j++) inverse[i * n + j] = inverse[j * n + i]!;
  return inverse;
}

/** Rows of (X′WX)⁻¹X′W = S P R⁻¹ Q′ √W. */
function pseudoInverse(
  qr: PivotedQr,
  scales: readonly number[],
  rootWeights: Float64Array | null,
  nObs: number,
): Float64Array[] {
  const rows: Float64Array[] = [];
  for (let j = 0; j < scales.length; j++) {
    const unit = new Float64Array(scales.length);
    unit[j] = 1;
    const row = new Float64Array(nObs);
    row.set(solveUpperTransposed(qr, unit));
    multiplyByQ(qr, row);
    rows[qr.pivot[j]!] = scaled(row, scales[qr.pivot[j]!]!, rootWeights);
  }
  return rows;
}

/** h_i = Σ_j Q_ij² over the first nCoefficients columns of Q. */
function hatDiagonal(qr: PivotedQr, nObs: number): Float64Array {
  const leverage = new Float64Array(nObs);
  for (let j = 0; j < qr.columns.length; j++) {
    const direction = new Float64Array(nObs);
    direction[j] = 1;
    multiplyByQ(qr, direction);
    for (let i = 0; i < nObs; i++) leverage[i] = Math.min(1, leverage[i]! + direction[i]! ** 2);
  }
  return leverage;
}
