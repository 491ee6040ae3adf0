import { describe, expect, it } from 'vitest';
import { errorInfluence, laggedCrossProduct } from '../../../src-main/statistics/error-influence.ts';
import { leastSquares } from '../../../src-main/statistics/least-squares.ts';
import { sum } from '../../../src-main/statistics/summation.ts';
import { expectClose } from '../../helpers/close.ts';

const rounding = { rel: 1e-14, abs: 1e-15, why: 'a short exact calculation in doubles' };

describe('errorInfluence', () => {
  // x = 1, 2, 4 with an intercept: slope influence (x − 7/3)·3/14, residuals 2/7, −3/7, 1/7.
  const fit = leastSquares({
    columns: [
      [1, 1, 1],
      [1, 2, 4],
    ],
    y: [1, 2, 6],
  });

  it('is each residual times its part in the coefficient, by hand', () => {
    expectClose(errorInfluence(fit)[1], [(-4 / 14) * (2 / 7), (-1 / 14) * (-3 / 7), (5 / 14) * (1 / 7)], rounding);
    expectClose(errorInfluence(fit, Float64Array.of(1, 2, 0))[1], [-8 / 98, 6 / 98, 0], rounding);
  });

  it('sums to zero, weights or not', () => {
    const weighted = leastSquares({
      columns: [
        [1, 1, 1],
        [1, 2, 4],
      ],
      y: [1, 2, 6],
      weights: [1, 2, 0.5],
    });
    for (const column of [...errorInfluence(fit), ...errorInfluence(weighted)]) {
      expectClose(sum(column), 0, rounding);
    }
  });
});

describe('laggedCrossProduct', () => {
  it('is Σ s_t s_{t−lag}′, by hand', () => {
    const columns = [Float64Array.of(1, 2, 3), Float64Array.of(4, 5, 6)];
    expect([...laggedCrossProduct(columns, 0)]).toEqual([14, 32, 32, 77]);
    expect([...laggedCrossProduct(columns, 1)]).toEqual([8, 23, 17, 50]);
    expect([...laggedCrossProduct(columns, 2)]).toEqual([3, 12, 6, 24]);
  });
});
