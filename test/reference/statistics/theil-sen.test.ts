import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { theilSen } from '../../../src-main/statistics/theil-sen.ts';
import { expectClose } from '../../helpers/close.ts';
import { startR, type RSession } from '../../helpers/r-session.ts';
import { co2AndTemperature } from '../../helpers/real-series.ts';

let r: RSession;
beforeAll(async () => {
  r = await startR(new URL('./theil-sen.R', import.meta.url));
});
afterAll(() => r.close());

// Sen 1968, as in Hollander & Wolfe, Nonparametric Statistical Methods.
const sen = { x: [1, 2, 3, 4, 10, 12, 18], y: [9, 15, 19, 20, 45, 55, 78] };

describe('theilSen', () => {
  // Level A: published slope and interval (3.71–4.38 at 93 %); the intercept by hand: median y 20 − 4 · median x 4.
  it('Sen’s example', () => {
    const { slope, intercept, confidence, caveats } = theilSen({ ...sen, levelPercent: 93 });
    expect([slope, intercept]).toEqual([4, 4]);
    expectClose(confidence, [26 / 7, 4.375], { rel: 1e-14, abs: 0, why: 'two of the pair slopes' });
    expectClose(confidence, [3.71, 4.38], { rel: 0, abs: 0.005, why: 'as printed' });
    expect(caveats.map(({ code }) => code)).toEqual(['tied']); // four of 21 pairs have slope 4
  });

  // Level B.
  it.each([0.8, 0.95])('base R at level %d, with ties in y and in x', async (level) => {
    const { years, temperatureK } = co2AndTemperature();
    const decades = years.map((year) => Math.floor(year / 10) * 10);
    for (const x of [years, decades]) {
      const { confidence, slope, intercept } = theilSen({ x, y: temperatureK, levelPercent: 100 * level });
      const fromR = await r.numbers('theil_sen(x, y, level)', { x, y: temperatureK, level });
      const near = { rel: 1e-12, abs: 0, why: 'medians of the same quotients' };
      expectClose({ slope: [slope], intercept: [intercept], confidence }, fromR, near);
    }
  });

  it('is not moved by a wild value', () => {
    const y = Array.from({ length: 11 }, (_, i) => 2 * i + [0.1, -0.1, 0.2, 0, -0.2][i % 5]!);
    const { slope } = theilSen({ x: y.map((_, i) => i), y: y.with(9, 1e6) });
    expect(Math.abs(slope - 2)).toBeLessThan(0.05);
  });

  it('gives no interval where the series is too short for one, and says so', () => {
    const { confidence, caveats } = theilSen({ x: [1, 2, 3, 4], y: [1, 3, 2, 5] });
    expect(confidence).toBeNull();
    expect(caveats.map(({ code }) => code)).toEqual(['no-interval']);
  });

  it('does not call a short series tied whose pair slopes all differ, though one of few is the median', () => {
    for (const y of [
      [1, 3, 2],
      [1, 3, 2, 7.3],
      [1, 3, 2, 7.3, 4.6],
    ]) {
      const slopes = y.flatMap((later, j) => y.slice(0, j).map((earlier, i) => (later - earlier) / (j - i)));
      expect(new Set(slopes).size).toBe(slopes.length);
      expect(theilSen({ x: y.map((_, i) => i), y }).caveats.map(({ code }) => code)).not.toContain('tied');
    }
  });

  it('calls a short series tied from the second equal pair slope on, beyond a tenth of them', () => {
    const codes = (y: number[]) => theilSen({ x: y.map((_, i) => i), y }).caveats.map(({ code }) => code);
    expect(codes([1, 2, 3])).toContain('tied');
    // 21 pairs: two of them, then three have the median’s slope, 2.
    expect(codes([0, 3, 7, 9, 5, 12, 12])).not.toContain('tied');
    expect(codes([-2, 3, 7, 9, 11, 7, 11])).toContain('tied');
  });

  it.each([
    ['a constant x', { x: [3, 3, 3], y: [1, 2, 4] }, 'theilSen, x: expected values that are not all equal'],
    ['nothing but ties in y', { x: [1, 2, 3], y: [2, 2, 2] }, 'theilSen, y: expected values that are not all equal'],
    ['two points', { x: [1, 2], y: [1, 2] }, 'at least 3'],
    ['unequal lengths', { x: [1, 2, 3], y: [1, 2] }, 'theilSen, y: expected 3 values'],
    ['a level of 100 %', { ...sen, levelPercent: 100 }, 'levelPercent'],
    ['a missing value', { ...sen, y: sen.y.with(1, NaN) }, 'theilSen, y[1]'],
    [
      'too many rows',
      { x: Array.from({ length: 5001 }, (_, i) => i), y: Array.from({ length: 5001 }, (_, i) => i % 7) },
      'at most 5000',
    ],
  ])('refuses %s', (_, request, sentence) => expect(() => theilSen(request)).toThrow(sentence));
});
