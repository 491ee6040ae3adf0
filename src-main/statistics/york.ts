import { InputError, NumericError } from '../errors.ts';
import { finiteNumber, finiteValues } from './finite-values.ts';
import { leastSquares } from './least-squares.ts';
import { sum, sumOfProducts } from './summation.ts';
import { varyingValues } from './varying-values.ts';

type OneOrEach = number | ArrayLike<number>;

export interface YorkRequest {
  x: ArrayLike<number>;
  y: ArrayLike<number>;
  /** Standard deviations of the errors of x and y, for all rows or for each. */
  sx: OneOrEach;
  sy: OneOrEach;
  /** Correlation of a row's two errors; 0 unless given. */
  r?: OneOrEach;
}

export interface YorkFit {
  slope: number;
  intercept: number;
  /** From the stated errors alone. */
  slopeStandardError: number;
  interceptStandardError: number;
  /** Of slope and intercept, from the stated errors alone. */
  covariance: number;
  /** S = Σ W (y − a − bx)²: chi-squared with n − 2 degrees of freedom when line and stated errors are right. */
  chiSquare: number;
  /** S/(n − 2): about 1 when line and stated errors are right. */
  goodness: number;
  /** The standard errors times √goodness: for errors known only up to a common factor. */
  scaledSlopeStandardError: number;
  scaledInterceptStandardError: number;
}

const MOST_ITERATIONS = 1000;

/**
 * York's line: the best line when both variables have stated errors, which may be correlated within a row. Ordinary
 * least squares, which takes x for exact, gives too flat a line there.
 *
 * Model    y_i = a + b x_i between true values; the observed x_i and y_i are off by normal errors with standard
 *          deviations sx_i, sy_i and correlation r_i; a and b minimise S = Σ W_i (y_i − a − b x_i)² with
 *          1/W_i = sy_i² + b² sx_i² − 2 b r_i sx_i sy_i
 * Assumes  rows independent of each other
 *
 * @param x, y   [nObs ≥ 3] finite
 * @param sx, sy at least 0, not both 0 in a row; in the units of x and y
 * @param r      −1 < r < 1
 * @throws   InputError wrong-length, not-finite, negative, no-error, out-of-range; NumericError rank-deficient for a
 *           constant x, constant for tied y, not-converged
 *
 * Differs  several standard errors are published for this line. slopeStandardError is that of York et al. 2004,
 *          equation 13, at the adjusted points (also the maximum-likelihood one); the scaled one is the same times
 *          √goodness; York 1969 evaluated it at the observed points
 * Source   York, Evensen, López Martínez & De Basabe Delgado 2004, Am. J. Phys. 72, 367–375, doi:10.1119/1.1632486
 * Checked  test/reference/statistics/york.test.ts (A: Pearson's data with York's weights; B: base R with correlated errors)
 */
export function york(request: YorkRequest): YorkFit {
  const x = finiteValues('york', 'x', request.x, { atLeast: 3 });
  const n = x.length;
  // The errors scaled to the scatter of tied y would claim to know the slope exactly.
  const y = varyingValues('york', 'y', request.y, { length: n });
  const sx = forEachRow('sx', request.sx, n, true);
  const sy = forEachRow('sy', request.sy, n, true);
  const r = forEachRow('r', request.r ?? 0, n, false);
  refuseRows(sx, sy, r);

  let slope = leastSquares({ columns: [new Float64Array(n).fill(1), x], y, caller: 'york' }).coefficients[1]!;
  for (let iteration = 0; iteration < MOST_ITERATIONS; iteration++) {
    const { u, v, weights, adjusted } = step(slope);
    const weighted = adjusted.map((value, i) => value * weights[i]!);
    const next = sumOfProducts(weighted, v) / sumOfProducts(weighted, u);
    const isStill = Math.abs(next - slope) <= 4 * Number.EPSILON * Math.abs(next);
    slope = next;
    if (isStill) return fitAt(slope);
    if (!Number.isFinite(slope)) break;
  }
  throw new NumericError({
    code: 'not-converged',
    where: 'york, slope',
    expected: `a slope that stands still within ${MOST_ITERATIONS} iterations`,
    received: `one that still moves near ${slope.toPrecision(6)}`,
    hint: 'The errors are as large as the spread of the data: no line can be told from them.',
  });

  /** Weights, deviations from their centre, and the points on the line (about the centre) that S adjusts the rows to. */
  function step(b: number) {
    const weights = x.map((_, i) => 1 / (sy[i]! ** 2 + (b * sx[i]!) ** 2 - 2 * b * r[i]! * sx[i]! * sy[i]!));
    const total = sum(weights);
    const centreX = sumOfProducts(weights, x) / total;
    const centreY = sumOfProducts(weights, y) / total;
    const u = x.map((value) => value - centreX);
    const v = y.map((value) => value - centreY);
    const adjusted = weights.map((weight, i) => {
      const both = r[i]! * sx[i]! * sy[i]!;
      return weight * (u[i]! * sy[i]! ** 2 + b * v[i]! * sx[i]! ** 2 - (b * u[i]! + v[i]!) * both);
    });
    return { weights, total, centreX, centreY, u, v, adjusted };
  }

  function fitAt(b: number): YorkFit {
    const { weights, total, centreX, centreY, u, v, adjusted } = step(b);
    const centreAdjusted = sumOfProducts(weights, adjusted) / total;
    const slopeVariance = 1 / sum(adjusted.map((value, i) => weights[i]! * (value - centreAdjusted) ** 2));
    const meanAdjusted = centreX + centreAdjusted;
    const interceptVariance = 1 / total + meanAdjusted ** 2 * slopeVariance;
    const chiSquare = sum(v.map((value, i) => weights[i]! * (value - b * u[i]!) ** 2));
    const goodness = chiSquare / (n - 2);
    return {
      slope: b,
      intercept: centreY - b * centreX,
      slopeStandardError: Math.sqrt(slopeVariance),
      interceptStandardError: Math.sqrt(interceptVariance),
      covariance: -meanAdjusted * slopeVariance,
      chiSquare,
      goodness,
      scaledSlopeStandardError: Math.sqrt(slopeVariance * goodness),
      scaledInterceptStandardError: Math.sqrt(interceptVariance * goodness),
    };
  }
}

function forEachRow(name: string, given: OneOrEach, n: number, isDeviation: boolean): Float64Array {
  const values = typeof given === 'number' ? new Float64Array(n).fill(given) : given;
  return finiteValues('york', name, values, { length: n, ...(isDeviation ? { sign: 'non-negative' } : {}) });
}

function refuseRows(sx: Float64Array, sy: Float64Array, r: Float64Array): void {
  for (let i = 0; i < sx.length; i++) {
    finiteNumber('york', `r[${i}]`, r[i]!, { above: -1, below: 1 });
    if (sx[i] === 0 && sy[i] === 0) {
      throw new InputError({
        code: 'no-error',
        where: `york, row ${i}`,
        expected: 'an error above 0 in x or in y',
        received: 'sx = 0 and sy = 0',
        hint: 'An exact point would carry all the weight; give it the error that its printed digits leave.',
      });
    }
  }
}
