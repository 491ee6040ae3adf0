import { describe, expect, it } from 'vitest';
import { praisWinsten } from '../../../src-main/statistics/prais-winsten.ts';

describe('praisWinsten', () => {
  it('refuses an exact fit', () => {
    expect(() => praisWinsten({ x: [0, 1, 2, 3], y: [1, 3, 5, 7], intercept: true })).toThrow(/an exact fit/);
  });

  it('refuses residuals that drift away', () => {
    // Only the first row bears on the slope; the residuals of the others double from row to row.
    const x = [100, 0, 0, 0, 0];
    expect(() => praisWinsten({ x, y: [0, 1, 2, 4, 8], intercept: false })).toThrow(/carry-over between −1 and 1/);
  });

  it('refuses three rows for a line and ρ', () => {
    expect(() => praisWinsten({ x: [0, 1, 3], y: [1, 3, 2], intercept: true })).toThrow(
      'praisWinsten: expected more than 3 rows for 2 coefficients and ρ, but found 3',
    );
  });

  it('refuses a missing value, naming the place', () => {
    expect(() => praisWinsten({ x: [0, 1, 2, NaN], y: [1, 3, 5, 7], intercept: true })).toThrow(/x\[3\]/);
  });
});
