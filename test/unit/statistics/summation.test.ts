import { describe, expect, it } from 'vitest';
import { InputError } from '../../../src-main/errors.ts';
import { mean, sum, sumOfProducts } from '../../../src-main/statistics/summation.ts';

describe('sum', () => {
  it('keeps what plain addition loses', () => {
    expect(sum([1, 1e100, 1, -1e100])).toBe(2);
    expect(sum(Array<number>(10).fill(0.1))).toBe(1);
    expect(sum([])).toBe(0);
  });

  it('refuses what is not finite, by name and place', () => {
    expect(() => sum([1, NaN])).toThrow(InputError);
    expect(() => sum([1, Infinity, -Infinity])).toThrow('sum, values[1]');
  });
});

describe('mean', () => {
  it('is the sum over the count', () => {
    expect(mean([1e16, 1, -1e16])).toBe(1 / 3);
    expect(() => mean([])).toThrow('at least 1 values');
  });
});

describe('sumOfProducts', () => {
  it('is exact where plain products cancel', () => {
    // Checked in whole numbers: 2^60 − (2^30 + 1)(2^30 − 1) = 1.
    expect(sumOfProducts([2 ** 30, 2 ** 30 + 1], [2 ** 30, -(2 ** 30 - 1)])).toBe(1);
    const a = [94906267, 94906265, -94906266];
    const b = [94906265, 94906267, 189812532];
    const exact = a.reduce((total, value, i) => total + BigInt(value) * BigInt(b[i]!), 0n);
    expect(sumOfProducts(a, b)).toBe(Number(exact));
    expect(a.reduce((total, value, i) => total + value * b[i]!, 0)).not.toBe(Number(exact));
  });

  it('refuses unequal lengths and what is not finite', () => {
    expect(() => sumOfProducts([1, 2], [1])).toThrow('2 values');
    expect(() => sumOfProducts([1, NaN], [1, 1])).toThrow('sumOfProducts, a[1]');
    expect(() => sumOfProducts([1, 1], [1, -Infinity])).toThrow('sumOfProducts, b[1]');
    expect(() => sumOfProducts([1e200], [1e200])).toThrow('1e+150');
  });
});
