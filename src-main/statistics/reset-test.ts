import { InputError } from '../errors.ts';
import { designColumns } from './design-columns.ts';
import { refuseExactFit } from './exact-fit.ts';
import { finiteNumber } from './finite-values.ts';
import { leastSquares } from './least-squares.ts';
import { nestedF, type FTest } from './nested-f.ts';
import { mean, sumOfProducts } from './summation.ts';

export interface ResetRequest {
  x: ArrayLike<number> | readonly ArrayLike<number>[];
  y: ArrayLike<number>;
  intercept: boolean;
  /** Powers of the fitted values that are tried, such as 2 and 3; each 2 … 5. */
  powers: readonly number[];
}

/**
 * RESET, regression equation specification error test: is the relation straight, or do powers of the fitted values explain
 * some of what the line leaves?
 *
 * Model    y = Xb + Σ_p c_p ŷ^p + e, ŷ the fitted values of y = Xb + e; F test of all c_p = 0. With an intercept ŷ may
 *          be measured from any level without changing F; it is measured from its mean, so that no digits are lost
 * Assumes  independent normal errors of one variance: with positively correlated errors it rejects too often
 *
 * @param powers  different whole numbers from 2 to 5
 * @throws   InputError as `leastSquares`, no-power, out-of-range, too-few-observations; NumericError exact-fit,
 *           rank-deficient when the powers are combinations of the columns (a predictor with few different values)
 *
 * Differs  lmtest::resettest: the same with type "fitted"; its default powers are 2 and 3
 * Source   Ramsey 1969, J. R. Stat. Soc. B 31, 350–371; in this form Thursby & Schmidt 1977, J. Am. Stat. Assoc. 72, 635–641
 * Checked  test/reference/statistics/specification-tests.test.ts (B: R's anova)
 */
export function resetTest({ x, y, intercept, powers }: ResetRequest): FTest {
  const caller = 'resetTest';
  const columns = designColumns(caller, x, y.length, intercept);
  const different = [...new Set(powers)];
  different.forEach((power, i) =>
    finiteNumber(caller, `powers[${i}]`, power, { isWhole: true, atLeast: 2, atMost: 5 }),
  );
  if (different.length === 0) {
    throw new InputError({
      code: 'no-power',
      where: `${caller}, powers`,
      expected: 'at least one power of the fitted values',
      received: 'none',
      hint: 'Common practice is 2 and 3.',
    });
  }
  const nLarger = columns.length + different.length;
  if (y.length <= nLarger) {
    throw new InputError({
      code: 'too-few-observations',
      where: caller,
      expected: `more than ${nLarger} rows for ${columns.length} coefficients and ${different.length} powers`,
      received: `${y.length}`,
      hint: 'Take a longer window or fewer powers.',
    });
  }
  const line = leastSquares({ columns, y, caller });
  const sumOfSquares = sumOfProducts(line.y, line.y);
  refuseExactFit(caller, line.residualSumOfSquares, sumOfSquares);
  const level = intercept ? mean(line.fitted) : 0;
  const largest = line.fitted.reduce((most, value) => Math.max(most, Math.abs(value - level)), 0);
  const curved = different.map((power) => line.fitted.map((value) => ((value - level) / largest) ** power));
  const larger = leastSquares({ columns: [...columns, ...curved], y, caller });
  return nestedF(caller, line, larger, { nObs: line.nObs, sumOfSquares });
}
