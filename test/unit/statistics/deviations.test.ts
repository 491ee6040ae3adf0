import { describe, expect, it } from 'vitest';
import { NumericError } from '../../../src-main/errors.ts';
import { deviations } from '../../../src-main/statistics/deviations.ts';

describe('deviations', () => {
  it('are taken from the mean', () => {
    expect(deviations('f', 'x', [1, 2, 6], {})).toEqual(Float64Array.of(-2, -1, 3));
  });

  it('do not exist for a constant, even one whose mean is rounded', () => {
    expect(() => deviations('correlation', 'y', [0.1, 0.1, 0.1], {})).toThrow(NumericError);
    expect(() => deviations('correlation', 'y', [0.1, 0.1, 0.1], {})).toThrow(
      'correlation, y: expected values that are not all equal, but found 3 times 0.1.',
    );
  });

  it('pass on the caller’s requirement', () => {
    expect(() => deviations('f', 'x', [1, 2], { atLeast: 3 })).toThrow('f, x: expected at least 3 values');
    expect(() => deviations('f', 'x', [1, NaN], {})).toThrow('f, x[1]');
  });
});
