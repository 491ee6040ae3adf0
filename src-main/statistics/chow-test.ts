import { designColumns } from './design-columns.ts';
import { finiteNumber, finiteValues } from './finite-values.ts';
import { leastSquares } from './least-squares.ts';
import { nestedF, type FTest } from './nested-f.ts';
import { sumOfProducts } from './summation.ts';

export interface ChowRequest {
  x: ArrayLike<number> | readonly ArrayLike<number>[];
  y: ArrayLike<number>;
  intercept: boolean;
  /** The first row, counted from 0, of the second part. */
  breakRow: number;
}

export interface ChowTest extends FTest {
  /** Of each part by itself, intercept first when there is one. */
  before: number[];
  after: number[];
}

/**
 * Chow test: is one line enough, or do the rows before and after a break stated in advance follow different ones?
 *
 * Model    F = [(RSS − RSS₁ − RSS₂)/k]/[(RSS₁ + RSS₂)/(n − 2k)], RSS of all rows, RSS₁ and RSS₂ of each part alone
 * Assumes  independent normal errors of one variance in both parts; a break that was not chosen by looking at the data
 *          (the highest F of many breaks has another distribution: Andrews 1993, Econometrica 61, 821–856)
 *
 * @param x, y  [nObs] in the order of which the break is a part
 * @param breakRow  leaves more rows than coefficients in each part
 * @throws   InputError as `leastSquares`, out-of-range; NumericError exact-fit, rank-deficient when a predictor does not
 *           vary within a part
 *
 * Differs  with fewer rows than coefficients in a part Chow has a second, predictive test, which is not this one
 * Source   Chow 1960, Econometrica 28, 591–605
 * Checked  test/reference/statistics/specification-tests.test.ts (B: R's anova)
 */
export function chowTest({ x, y: givenY, intercept, breakRow }: ChowRequest): ChowTest {
  const caller = 'chowTest';
  const y = finiteValues(caller, 'y', givenY);
  const columns = designColumns(caller, x, y.length, intercept);
  const k = columns.length;
  finiteNumber(caller, 'breakRow', breakRow, {
    isWhole: true,
    atLeast: k + 1,
    atMost: y.length - k - 1,
    hint: 'Each part needs more rows than coefficients: put the break elsewhere, or take a longer window.',
  });
  const fitOf = (from: number, to: number) =>
    leastSquares({ columns: columns.map((column) => column.subarray(from, to)), y: y.subarray(from, to), caller });
  const [all, before, after] = [fitOf(0, y.length), fitOf(0, breakRow), fitOf(breakRow, y.length)];
  const apart = {
    residualSumOfSquares: before.residualSumOfSquares + after.residualSumOfSquares,
    nCoefficients: 2 * k,
  };
  return {
    ...nestedF(caller, all, apart, { nObs: y.length, sumOfSquares: sumOfProducts(y, y) }),
    before: [...before.coefficients],
    after: [...after.coefficients],
  };
}
