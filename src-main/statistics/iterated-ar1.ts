import { InputError, NumericError } from '../errors.ts';
import { designColumns } from './design-columns.ts';
import { refuseExactFit } from './exact-fit.ts';
import { leastSquares } from './least-squares.ts';
import { sumOfProducts } from './summation.ts';

export interface Ar1LineRequest {
  /** [nObs], or columns. */
  x: readonly number[] | readonly (readonly number[])[];
  y: readonly number[];
  intercept: boolean;
}

export interface IteratedAr1Fit {
  /** Intercept first when there is one. */
  coefficients: number[];
  standardErrors: number[];
  /** Lag-one coefficient of the errors. */
  rho: number;
  /** Of the innovations. */
  residualStandardDeviation: number;
  /** Freed rows less coefficients. */
  degreesOfFreedom: number;
  nIterations: number;
}

/** Change of rho at which the iteration stands still: far below what any standard error can notice. */
const STANDSTILL = 1e-12;
const MOST_ITERATIONS = 500;

/**
 * Line with AR(1) errors in two steps that take turns: least squares on rows freed from ρ, then ρ from the residuals of
 * the rows as they are, until ρ changes by at most 1e-12 between two turns. What the first row contributes is the
 * caller's choice, and the whole difference between Prais–Winsten and Cochrane–Orcutt.
 *
 * Model    y = Xb + e, e_t = ρ e_{t−1} + u_t; ρ = Σ e_t e_{t−1} / Σ e²_{t−1} over t = 2 … n, starting from ρ = 0
 *
 * @param caller  who asks, for error messages
 * @param freed   a column freed from ρ: y_t − ρ y_{t−1}, with the first row in some form or without it
 * @throws   InputError as `leastSquares`, too-few-observations; NumericError exact-fit, not-stationary when |ρ| reaches
 *           1, not-converged
 *
 * Checked  through `praisWinsten` and `cochraneOrcutt`, test/unit/statistics/iterated-ar1.test.ts (C)
 */
export function iteratedAr1(
  caller: string,
  request: Ar1LineRequest,
  freed: (column: Float64Array, rho: number) => Float64Array,
): IteratedAr1Fit {
  const y = Float64Array.from(request.y);
  const columns = designColumns(caller, request.x, y.length, request.intercept);
  refuseTooFew(caller, y.length, freed(y, 0).length, columns.length);
  let rho = 0;
  for (let nIterations = 1; nIterations <= MOST_ITERATIONS; nIterations++) {
    const fit = leastSquares({ columns: columns.map((c) => freed(c, rho)), y: freed(y, rho), caller });
    const next = lagOneShare(caller, y, columns, fit.coefficients);
    if (Math.abs(next - rho) <= STANDSTILL) {
      const degreesOfFreedom = fit.nObs - fit.nCoefficients;
      const variance = fit.residualSumOfSquares / degreesOfFreedom;
      return {
        coefficients: [...fit.coefficients],
        standardErrors: Array.from(fit.coefficients, (_, j) =>
          Math.sqrt(variance * fit.unscaledCovariance[j * (fit.nCoefficients + 1)]!),
        ),
        rho,
        residualStandardDeviation: Math.sqrt(variance),
        degreesOfFreedom,
        nIterations,
      };
    }
    if (Math.abs(next) >= 1) {
      throw new NumericError({
        code: 'not-stationary',
        where: `${caller}, rho`,
        expected: 'a carry-over between −1 and 1',
        received: next.toPrecision(4),
        hint: 'The residuals drift away: the line leaves a trend or a step unexplained.',
      });
    }
    rho = next;
  }
  throw new NumericError({
    code: 'not-converged',
    where: `${caller}, rho`,
    expected: `a value that stands still within ${MOST_ITERATIONS} iterations`,
    received: `one that still moves near ${rho.toPrecision(4)}`,
    hint: 'Use Newey–West errors instead.',
  });
}

/** ρ takes a degree of freedom of its own. */
function refuseTooFew(caller: string, nObs: number, nFreed: number, nCoefficients: number): void {
  const refuse = (expected: string, received: number) =>
    new InputError({
      code: 'too-few-observations',
      where: caller,
      expected,
      received: String(received),
      hint: 'Take a longer window or fewer predictors.',
    });
  if (nFreed <= nCoefficients) {
    throw refuse(`more than ${nCoefficients} freed rows for ${nCoefficients} coefficients`, nFreed);
  }
  if (nObs <= nCoefficients + 1) {
    throw refuse(`more than ${nCoefficients + 1} rows for ${nCoefficients} coefficients and ρ`, nObs);
  }
}

function lagOneShare(
  caller: string,
  y: Float64Array,
  columns: readonly Float64Array[],
  coefficients: Float64Array,
): number {
  const residuals = y.map((value, t) => value - coefficients.reduce((fitted, b, j) => fitted + b * columns[j]![t]!, 0));
  const before = residuals.subarray(0, -1);
  const squares = sumOfProducts(before, before);
  refuseExactFit(caller, squares, sumOfProducts(y, y));
  return sumOfProducts(residuals.subarray(1), before) / squares;
}
