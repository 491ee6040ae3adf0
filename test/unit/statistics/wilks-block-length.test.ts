import { describe, expect, it } from 'vitest';
import { wilksBlockLength } from '../../../src-main/statistics/wilks-block-length.ts';

// Level C.
describe('wilksBlockLength', () => {
  it('solves its equation within half a row', () => {
    for (const n of [30, 70, 170]) {
      for (const r of [0.3, 0.6, 0.85]) {
        const length = wilksBlockLength(n, r);
        const gap = (at: number) => at - (n - at + 1) ** ((2 / 3) * (1 - (1 - r) / (1 + r)));
        expect(gap(length - 0.5)).toBeLessThanOrEqual(0);
        expect(gap(length + 0.5)).toBeGreaterThanOrEqual(0);
      }
    }
  });

  // 1 − (1 − 0.6)/(1 + 0.6) = 0.75, so L² = 100 − L + 1: L = 9.56.
  it('is 10 for 100 rows and r = 0.6, by hand', () => expect(wilksBlockLength(100, 0.6)).toBe(10));

  it('is one row where neighbours are unrelated or alternate, and grows with n and r', () => {
    expect([wilksBlockLength(80, 0), wilksBlockLength(80, -0.5)]).toEqual([1, 1]);
    expect(wilksBlockLength(80, 0.7)).toBeGreaterThan(wilksBlockLength(80, 0.4));
    expect(wilksBlockLength(160, 0.4)).toBeGreaterThan(wilksBlockLength(40, 0.4));
  });

  it('leaves at least two blocks, and refuses a random walk', () => {
    expect(wilksBlockLength(4, 0.99)).toBe(2);
    expect(() => wilksBlockLength(50, 1)).toThrow('wilksBlockLength, lagOneCorrelation');
    expect(() => wilksBlockLength(2, 0.5)).toThrow('wilksBlockLength, nObs');
  });
});
