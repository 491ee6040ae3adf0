import { describe, expect, it } from 'vitest';
import { isExactFit, refuseExactFit } from '../../../src-main/statistics/exact-fit.ts';

describe('isExactFit', () => {
  it('draws the line at eight roundings of y’s size', () => {
    const y = 1e6;
    const rounding = 2 ** -52 * Math.sqrt(y);
    expect(isExactFit((8 * rounding) ** 2, y)).toBe(true);
    expect(isExactFit((8.1 * rounding) ** 2, y)).toBe(false);
    expect(isExactFit(0, 0)).toBe(true);
  });
});

describe('refuseExactFit', () => {
  it('refuses rounding, and zeros where y is not known', () => {
    expect(() => refuseExactFit('glsAr1', 1e-32, 1)).toThrow('glsAr1: expected residuals that are more than rounding');
    expect(() => refuseExactFit('durbinWatson', 0)).toThrow('durbinWatson');
    expect(() => refuseExactFit('durbinWatson', 1e-200)).not.toThrow();
  });
});
