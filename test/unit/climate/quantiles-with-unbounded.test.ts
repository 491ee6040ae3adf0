import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { quantilesWithUnbounded } from '../../../src-main/climate/quantiles-with-unbounded.ts';
import { quantile } from '../../../src-main/statistics/quantile.ts';

describe('quantilesWithUnbounded', () => {
  it('ranks unbounded values above the finite ones: 1, 2, 3, 4, ∞ by hand', () => {
    const values = Float64Array.of(3, 1, 4, 2);
    expect(quantilesWithUnbounded(values, 5, [0, 0.25, 0.5, 0.6, 0.75, 0.76, 1])).toEqual([
      1,
      2,
      3,
      3.4,
      4,
      null,
      null,
    ]);
  });

  it('has no finite quantile when every value is unbounded', () => {
    expect(quantilesWithUnbounded(new Float64Array(0), 3, [0, 0.5, 1])).toEqual([null, null, null]);
  });

  it('is the plain quantile when nothing is unbounded', () => {
    fc.assert(
      fc.property(
        fc.array(fc.double({ min: -1e6, max: 1e6, noNaN: true }), { minLength: 1, maxLength: 100 }),
        fc.array(fc.double({ min: 0, max: 1, noNaN: true }), { minLength: 1, maxLength: 5 }),
        (values, unordered) => {
          const probabilities = unordered.sort((a, b) => a - b);
          const expected = probabilities.map((p) => quantile(values, p));
          expect(quantilesWithUnbounded(Float64Array.from(values), values.length, probabilities)).toEqual(expected);
        },
      ),
    );
  });
});
