import { describe, expect, it } from 'vitest';
import { NumericError } from '../../../src-main/errors.ts';
import { varyingValues } from '../../../src-main/statistics/varying-values.ts';

describe('varyingValues', () => {
  it('lets values through of which one differs', () => {
    expect(varyingValues('f', 'x', [1, 1, 2], {})).toEqual(Float64Array.of(1, 1, 2));
  });

  it('refuses a constant, and one value alone', () => {
    expect(() => varyingValues('f', 'x', [4, 4], {})).toThrow(NumericError);
    expect(() => varyingValues('f', 'x', [4, 4], {})).toThrow(
      'f, x: expected values that are not all equal, but found 2 times 4. A constant neither',
    );
    expect(() => varyingValues('f', 'x', [4], {})).toThrow('1 times 4');
  });

  it('passes on the caller’s requirement', () => {
    expect(() => varyingValues('f', 'x', [1, 2], { atLeast: 3 })).toThrow('f, x: expected at least 3 values');
    expect(() => varyingValues('f', 'x', [1, NaN], {})).toThrow('f, x[1]');
  });
});
