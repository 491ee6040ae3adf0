import { describe, it } from 'vitest';
import { leastSquares } from '../../../src-main/statistics/least-squares.ts';
import { varianceInflation } from '../../../src-main/statistics/variance-inflation.ts';
import { expectClose } from '../../helpers/close.ts';

const rounding = { rel: 1e-13, abs: 0, why: 'a short exact calculation in doubles' };

// Σx² = 9, Σz² = 6, Σxz = 6: cos² = 36/54 = 2/3, so both factors about zero are 1/(1 − 2/3) = 3.
const x = [1, 2, 2];
const z = [2, 1, 1];
const y = [1, 3, 2];

describe('varianceInflation', () => {
  it('is taken about zero without an intercept, by hand', () => {
    expectClose(varianceInflation(leastSquares({ columns: [x, z], y }), false), [3, 3], rounding);
  });

  it('is 1 for a lone predictor, with and without intercept', () => {
    expectClose(varianceInflation(leastSquares({ columns: [x], y }), false), [1], rounding);
    expectClose(varianceInflation(leastSquares({ columns: [[1, 1, 1], x], y }), true), [1], rounding);
  });

  it('takes a weight of 2 as the row twice', () => {
    const ones = [1, 1, 1, 1, 1];
    const columns = [ones, [1, 2, 2.5, 4, 7], [3, 1, 2, 2, 6]];
    const twice = columns.map((column) => [...column, column[1]!, column[4]!]);
    const weighted = leastSquares({ columns, y: [1, 2, 4, 3, 5], weights: [1, 2, 1, 1, 2] });
    const repeated = leastSquares({ columns: twice, y: [1, 2, 4, 3, 5, 2, 5] });
    expectClose(varianceInflation(weighted, true), varianceInflation(repeated, true), rounding);
  });
});
