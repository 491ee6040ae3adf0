import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { leastSquares } from '../../../src-main/statistics/least-squares.ts';
import { straightLine } from '../../../src-main/statistics/straight-line.ts';
import { expectClose } from '../../helpers/close.ts';
import exact from './nist-exact.json' with { type: 'json' };
import sets from './nist-strd.json' with { type: 'json' };

describe('straightLine', () => {
  it('level A: NIST Norris, certified, and exact in rational arithmetic', () => {
    const { x, y, certified } = sets.Norris;
    const line = straightLine(x, y);
    const tolerance = { rel: 1e-12, abs: 0, why: 'one pass over 36 rows; the intercept is 1e-4 of its terms' };
    for (const coefficients of [certified.coefficients, exact.Norris.coefficients]) {
      const [intercept, slope] = coefficients.map(Number);
      expectClose(line, { intercept, slope }, tolerance);
    }
  });

  it('level C: as a pivoted QR with refinement, whatever the rows', () => {
    const row = fc.record({ a: fc.integer({ min: -9999, max: 9999 }), b: fc.integer({ min: -9999, max: 9999 }) });
    fc.assert(
      fc.property(fc.array(row, { minLength: 3, maxLength: 40 }), (rows) => {
        const x = rows.map(({ a }, t) => t + a / 10_000);
        const y = rows.map(({ b }, t) => 300 + 2 * t + b / 100);
        const [intercept, slope] = leastSquares({ columns: [x.map(() => 1), x], y }).coefficients;
        expectClose(straightLine(x, y), { intercept, slope }, { rel: 1e-10, abs: 1e-10, why: 'rounding of 40 rows' });
      }),
      { seed: 20_261, numRuns: 200 },
    );
  });

  it('level C: a first row far from all others costs no more digits than the rows have', () => {
    const x = Float64Array.from({ length: 100 }, (_, t) => (t === 0 ? 1e6 : t));
    const y = x.map((value, t) => 3 * value + Math.sin(t * t));
    const [intercept, slope] = leastSquares({ columns: [x.map(() => 1), x], y }).coefficients;
    expectClose(
      straightLine(x, y),
      { intercept, slope },
      { rel: 1e-14, abs: 3e-8, why: 'two of the sixteen digits of 3e6' },
    );
  });

  it('gives no line where x does not vary', () => {
    expect(straightLine([0, 0, 0], [1, 2, 3])).toBeNull();
    expect(straightLine([0.1, 0.1, 0.1 + 2e-17], [1, 2, 3])).toBeNull();
    expect(straightLine([1e9, 1e9 + 2 ** -23, 1e9], [1, 2, 3])).toBeNull();
    expect(straightLine([5, 6], [1, 3])).toEqual({ intercept: -9, slope: 2 });
  });

  it.each([
    ['too-few-values', 'straightLine, x', [1], [1]],
    ['wrong-length', 'straightLine, y', [1, 2], [1]],
    ['not-finite', 'straightLine, x[0]', [NaN, 2, 3], [1, 2, 3]],
    ['not-finite', 'straightLine, y[0]', [1, 2, 3], [Infinity, 2, 3]],
    ['not-finite', 'straightLine, y[1]', [1, 1, 3], [1, NaN, 3]],
    ['too-large', 'straightLine, x[2]', [1, 2, 1e200], [1, 2, 3]],
  ])('refuses %s at %s', (code, where, x, y) => {
    expect(() => straightLine(x, y)).toThrow(
      expect.objectContaining({ fields: expect.objectContaining({ code, where }) as unknown }),
    );
  });
});
