import { describe, expect, it } from 'vitest';
import { neweyWestLag } from '../../../src-main/statistics/newey-west-lag.ts';

describe('neweyWestLag', () => {
  it('is floor(4 (n/100)^(2/9)), by hand', () => {
    // 2.02^(2/9) = e^(0.7031·2/9) = 1.169; 0.5^(2/9) = 0.857; 10^(2/9) = 1.668; 3.5^(2/9) = 1.321
    expect([100, 202, 50, 1000, 350].map(neweyWestLag)).toEqual([4, 4, 3, 6, 5]);
  });

  it('never reaches the length of the series', () => expect(neweyWestLag(2)).toBe(1));

  it('refuses a length that is none', () => {
    expect(() => neweyWestLag(1)).toThrow('neweyWestLag, nObs');
    expect(() => neweyWestLag(10.5)).toThrow('a whole number');
  });
});
