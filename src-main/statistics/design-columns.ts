import { InputError } from '../errors.ts';
import { finiteValues } from './finite-values.ts';

/**
 * Columns of a regression's design: the predictors as given, after a column of ones when there is an intercept.
 *
 * @param x  [nObs], or nPredictors × [nObs] (columns, not rows); finite
 * @throws   InputError wrong-length, not-finite, no-predictor
 *
 * Checked  test/unit/statistics/design-columns.test.ts, level C
 */
export function designColumns(
  caller: string,
  x: ArrayLike<number> | readonly ArrayLike<number>[],
  nObs: number,
  hasIntercept: boolean,
): Float64Array[] {
  const predictors = isColumnList(x) ? x : [x];
  if (predictors.length === 0) {
    throw new InputError({
      code: 'no-predictor',
      where: `${caller}, x`,
      expected: 'at least one column',
      received: 'none',
      hint: 'Give one column as numbers, or several as a list of columns.',
    });
  }
  const names = predictors.length === 1 ? ['x'] : predictors.map((_, j) => `x[${j}]`);
  const columns = predictors.map((column, j) => finiteValues(caller, names[j]!, column, { length: nObs }));
  return hasIntercept ? [new Float64Array(nObs).fill(1), ...columns] : columns;
}

function isColumnList(x: ArrayLike<number> | readonly ArrayLike<number>[]): x is readonly ArrayLike<number>[] {
  return Array.isArray(x) && typeof x[0] !== 'number';
}
