import { describe, expect, it } from 'vitest';
import { cochraneOrcutt } from '../../../src-main/statistics/cochrane-orcutt.ts';
import { praisWinsten } from '../../../src-main/statistics/prais-winsten.ts';
import { randomStream } from '../../../src-main/statistics/random-stream.ts';
import { expectClose } from '../../helpers/close.ts';

/** A line with AR(1) errors, invented. */
const stream = randomStream(7, 0);
let error = 0;
const x = Array.from({ length: 60 }, (_, t) => t / 10);
const y = x.map((value) => 1 + 2 * value + (error = 0.6 * error + stream.normal()));

describe('cochraneOrcutt', () => {
  it('follows units and level, and agrees with Prais–Winsten but for the first row', () => {
    const rounding = { rel: 1e-8, abs: 1e-10, why: 'rho stands still to 1e-12' };
    const plain = cochraneOrcutt({ x, y, intercept: true });
    const moved = cochraneOrcutt({ x: x.map((v) => 100 * v), y: y.map((v) => 3 * v - 8), intercept: true });
    expectClose(moved.rho, plain.rho, rounding);
    expectClose(moved.coefficients[1], (3 / 100) * (plain.coefficients[1] ?? NaN), rounding);
    expectClose(moved.coefficients[0], 3 * (plain.coefficients[0] ?? NaN) - 8, rounding);
    expectClose(moved.standardErrors[1], (3 / 100) * (plain.standardErrors[1] ?? NaN), rounding);
    const kept = praisWinsten({ x, y, intercept: true });
    expect(plain.degreesOfFreedom).toBe(kept.degreesOfFreedom - 1);
    expect(plain.rho).not.toBe(kept.rho);
    expectClose(plain.coefficients[1], kept.coefficients[1], { rel: 0.09, abs: 0, why: 'one row of sixty' });
  });

  it('says when another ρ has a smaller sum of squares', () => {
    const [x, y] = [
      [8, 5, -3, 14, 10, 10, 2],
      [1, 11, 7, 1, 24, 19, 20],
    ];
    const sumAt = (rho: number) => {
      const freed = (values: number[]) => values.slice(1).map((value, t) => value - rho * (values[t] ?? NaN));
      const [u, v] = [freed(x), freed(y)];
      const product = (a: number[], b: number[]) => a.reduce((total, value, t) => total + value * (b[t] ?? NaN), 0);
      return product(v, v) - product(u, v) ** 2 / product(u, u);
    };
    const fit = cochraneOrcutt({ x, y, intercept: false });
    expect(fit.rho).toBeLessThan(0);
    expectClose(fit.residualStandardDeviation ** 2 * 5, sumAt(fit.rho), { rel: 1e-10, abs: 0, why: 'rounding' });
    expect(sumAt(0.94)).toBeLessThan(0.8 * sumAt(fit.rho));
    expect(fit.caveats).toMatchObject([{ code: 'not-the-lowest-sum' }]);
    expect(fit.caveats[0]?.detail).toContain('near ρ = 0.94 the sum of squares is 25 % smaller');
  });

  it.each([
    ['an exact fit', { x: [0, 1, 2, 3], y: [1, 3, 5, 7], intercept: true }, 'cochraneOrcutt: expected residuals'],
    ['three rows for a line', { x: [0, 1, 2], y: [1, 3, 4], intercept: true }, 'more than 2 freed rows'],
    ['a constant predictor', { x: [2, 2, 2, 2, 2], y: [1, 3, 4, 2, 5], intercept: true }, 'a constant predictor'],
    ['a missing value', { x: [0, 1, NaN, 3, 4], y: [1, 3, 4, 2, 5], intercept: true }, 'cochraneOrcutt, x[2]'],
    ['mismatched lengths', { x: [0, 1, 2], y: [1, 3, 4, 2], intercept: true }, 'expected 4 values'],
    ['residuals that drift', { x: [0, 100, 0, 0, 0, 0], y: [0, 0, 1, 2, 4, 8], intercept: false }, 'between −1 and 1'],
  ])('refuses %s', (_, request, sentence) => expect(() => cochraneOrcutt(request)).toThrow(sentence));
});
