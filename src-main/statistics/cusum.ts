import normalCdf from '@stdlib/stats-base-dists-normal-cdf';
import { InputError } from '../errors.ts';
import { designColumns } from './design-columns.ts';
import { refuseExactFit } from './exact-fit.ts';
import { finiteValues } from './finite-values.ts';
import { leastSquares } from './least-squares.ts';
import { recursiveFit } from './recursive-fit.ts';
import { sumOfProducts } from './summation.ts';

export interface CusumRequest {
  x: ArrayLike<number> | readonly ArrayLike<number>[];
  y: ArrayLike<number>;
  intercept: boolean;
  levelPercent: 1 | 5 | 10;
}

export interface CusumTest {
  /** Row, counted from 0, of each point below. */
  rows: number[];
  recursiveResiduals: number[];
  cusum: number[];
  /** The boundary is this far above and below zero. */
  bound: number[];
  /** First row at which the cumulated sum is outside; null when it never is. */
  firstOutside: number | null;
  /** Largest |cusum| in units of the boundary's shape, comparable with 0.948 at 5 %. */
  statistic: number;
  p: number;
  /** Coefficient of the last predictor from the rows up to and with each. */
  recursiveSlopes: number[];
}

/** Brown, Durbin & Evans 1975, p. 154 (page from memory). */
const SCALE_OF_BOUND = { 1: 1.143, 5: 0.948, 10: 0.85 } as const;

/**
 * CUSUM test: does a line that was right for the first years stay right, or do later years miss the prediction from those
 * before them more and more to one side?
 *
 * Model    W_t = Σ w/σ̂ over the recursive residuals w up to row t, σ̂² = Σw²/m, m of them; boundary
 *          ±a(√m + 2j/√m) at the j-th, a = 1.143, 0.948, 0.850 at 1, 5 and 10 %; statistic max |W_t|/(√m + 2j/√m);
 *          p = 2[1 − Φ(3s) + e^(−4s²)(Φ(s) + Φ(5s) − 1) − e^(−16s²)(1 − Φ(s))] from s = 0.3, and straight to 1 at s = 0
 * Assumes  rows in order of time; independent normal errors of one variance: positively correlated errors cross too often
 *
 * @param x, y  [nObs]; at least three recursive residuals
 * @throws   InputError as `leastSquares`, too-few-observations; NumericError rank-deficient, exact-fit
 *
 * Differs  strucchange's "Rec-CUSUM" takes σ̂ about the mean of w with m − 1
 * Source   Brown, Durbin & Evans 1975, J. R. Stat. Soc. B 37, 149–192; the form of p as in strucchange (from memory)
 * Checked  test/reference/statistics/specification-tests.test.ts (B: R's lm on each row's past; A: the published a have
 *          the p they stand for)
 */
export function cusum({ x, y: givenY, intercept, levelPercent }: CusumRequest): CusumTest {
  const caller = 'cusum';
  const y = finiteValues(caller, 'y', givenY);
  const columns = designColumns(caller, x, y.length, intercept);
  const whole = leastSquares({ columns, y, caller });
  refuseExactFit(caller, whole.residualSumOfSquares, sumOfProducts(y, y));
  const { rows, residuals, coefficients } = recursiveFit(caller, columns, y);
  const m = rows.length;
  if (m < 3) {
    throw new InputError({
      code: 'too-few-observations',
      where: caller,
      expected: `at least ${columns.length + 3} rows for ${columns.length} coefficients`,
      received: `${y.length}`,
      hint: 'Take a longer window.',
    });
  }
  const squares = sumOfProducts(residuals, residuals);
  refuseExactFit(caller, squares, sumOfProducts(y, y));
  const deviation = Math.sqrt(squares / m);
  let total = 0;
  const path = Array.from(residuals, (w) => (total += w / deviation));
  const shape = path.map((_, j) => Math.sqrt(m) + (2 * (j + 1)) / Math.sqrt(m));
  const bound = shape.map((value) => SCALE_OF_BOUND[levelPercent] * value);
  const statistic = path.reduce((most, value, j) => Math.max(most, Math.abs(value) / shape[j]!), 0);
  const outside = path.findIndex((value, j) => Math.abs(value) > bound[j]!);
  return {
    rows,
    recursiveResiduals: [...residuals],
    cusum: path,
    bound,
    firstOutside: rows[outside] ?? null,
    statistic,
    p: crossingProbability(statistic),
    recursiveSlopes: coefficients.map((b) => b.at(-1)!),
  };
}

/** Probability that the cumulated sum crosses ±s(√m + 2j/√m) somewhere. */
export function crossingProbability(s: number): number {
  if (s < 0.3) return 1 - ((1 - crossingProbability(0.3)) * s) / 0.3;
  const below = (value: number) => normalCdf(value, 0, 1);
  const one = below(-3 * s);
  const two = Math.exp(-4 * s ** 2) * (below(s) - below(-5 * s));
  const three = Math.exp(-16 * s ** 2) * below(-s);
  return 2 * (one + two - three);
}
