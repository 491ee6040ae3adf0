import { NumericError } from '../errors.ts';
import { ar1Rows } from './ar1-rows.ts';
import { designColumns } from './design-columns.ts';
import { refuseExactFit } from './exact-fit.ts';
import { leastSquares } from './least-squares.ts';
import { sumOfProducts } from './summation.ts';

export interface PraisWinstenFit {
  /** Intercept first when there is one. */
  coefficients: number[];
  standardErrors: number[];
  /** Lag-one coefficient of the errors. */
  rho: number;
  /** Of the innovations. */
  residualStandardDeviation: number;
  degreesOfFreedom: number;
  nIterations: number;
}

/** Change of rho at which the iteration stands still: far below what any standard error can notice. */
const STANDSTILL = 1e-12;
const MOST_ITERATIONS = 500;

/**
 * Iterated Prais–Winsten estimator: the line, and its standard error, when each error carries over a share ρ of the
 * one before.
 *
 * Model    y = Xb + e, e_t = ρ e_{t−1} + u_t. Least squares on rows freed from ρ: y_t − ρ y_{t−1}, and the first row
 *          times √(1 − ρ²), which Cochrane–Orcutt leaves out; ρ = Σ e_t e_{t−1} / Σ e²_{t−1} of the residuals of the
 *          rows as they are; both in turn until ρ stands still. Errors classical on the freed rows, n − k degrees of freedom
 * Assumes  rows in order of time, equally spaced, without gaps
 *
 * @param x  [nObs], or columns; y [nObs]; finite
 * @throws   InputError as `leastSquares`; NumericError exact-fit, not-stationary when |ρ| reaches 1, not-converged
 *
 * Differs  other estimators of ρ (demeaned, or half the Durbin–Watson statistic) change the third digit or so.
 *          Standard errors take ρ for known: too small in short series
 * Source   Prais & Winsten 1954, Cowles Commission Discussion Paper 383
 * Checked  test/reference/statistics/prais-winsten.test.ts (B: the same steps in base R, LakeHuron and a real record)
 */
export function praisWinsten(request: { x: number[] | number[][]; y: number[]; intercept: boolean }): PraisWinstenFit {
  const { x, intercept } = request;
  const y = Float64Array.from(request.y);
  const columns = designColumns('praisWinsten', x, y.length, intercept);
  let rho = 0;
  for (let nIterations = 1; nIterations <= MOST_ITERATIONS; nIterations++) {
    const fit = leastSquares({
      columns: columns.map((c) => ar1Rows(c, rho)),
      y: ar1Rows(y, rho),
      caller: 'praisWinsten',
    });
    const next = lagOneShare(y, columns, fit.coefficients);
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
        where: 'praisWinsten, rho',
        expected: 'a carry-over between −1 and 1',
        received: next.toPrecision(4),
        hint: 'The residuals drift away: the line leaves a trend or a step unexplained.',
      });
    }
    rho = next;
  }
  throw new NumericError({
    code: 'not-converged',
    where: 'praisWinsten, rho',
    expected: `a value that stands still within ${MOST_ITERATIONS} iterations`,
    received: `one that still moves near ${rho.toPrecision(4)}`,
    hint: 'Use Newey–West errors instead.',
  });
}

function lagOneShare(y: Float64Array, columns: readonly Float64Array[], coefficients: Float64Array): number {
  const residuals = y.map((value, t) => value - coefficients.reduce((fitted, b, j) => fitted + b * columns[j]![t]!, 0));
  const before = residuals.subarray(0, -1);
  const squares = sumOfProducts(before, before);
  refuseExactFit('praisWinsten', squares, sumOfProducts(y, y));
  return sumOfProducts(residuals.subarray(1), before) / squares;
}
