import { describe, expect, it } from 'vitest';
import { designColumns } from '../../../src-main/statistics/design-columns.ts';

describe('designColumns', () => {
  it('takes one predictor or several, ones first when there is an intercept', () => {
    expect(designColumns('f', [1, 2], 2, false)).toEqual([Float64Array.of(1, 2)]);
    expect(designColumns('f', Float64Array.of(1, 2), 2, true)).toEqual([Float64Array.of(1, 1), Float64Array.of(1, 2)]);
    expect(
      designColumns(
        'f',
        [
          [1, 2, 5],
          [3, 4, 6],
        ],
        3,
        true,
      ),
    ).toEqual([Float64Array.of(1, 1, 1), Float64Array.of(1, 2, 5), Float64Array.of(3, 4, 6)]);
    expect(designColumns('f', [Float64Array.of(7, 8)], 2, false)).toEqual([Float64Array.of(7, 8)]);
  });

  it('names the predictor that is wrong', () => {
    expect(() => designColumns('regression', [[1, 2], [1]], 2, true)).toThrow(
      'regression, x[1]: expected 2 values, but found 1',
    );
    expect(() => designColumns('regression', [1, NaN], 2, true)).toThrow('regression, x[1]: expected a finite number');
    expect(() =>
      designColumns(
        'regression',
        [
          [1, 2],
          [1, Infinity],
        ],
        2,
        true,
      ),
    ).toThrow('regression, x[1][1]');
    expect(() => designColumns('regression', [], 2, true)).toThrow();
  });
});
