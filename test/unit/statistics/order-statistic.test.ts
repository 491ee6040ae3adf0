import fc from 'fast-check';
import { expect, it } from 'vitest';
import { orderStatistic } from '../../../src-main/statistics/order-statistic.ts';
import { randomStream } from '../../../src-main/statistics/random-stream.ts';

it('orderStatistic finds what a full sort would put in each place, one after the other', () => {
  fc.assert(
    fc.property(
      // Few distinct values on purpose: ties are what partitioning gets wrong.
      fc.array(fc.integer({ min: -5, max: 5 }), { minLength: 1, maxLength: 200 }),
      fc.array(fc.nat({ max: 199 }), { maxLength: 6 }),
      (numbers, wanted) => {
        const values = Float64Array.from(numbers);
        const sorted = Float64Array.from(numbers).sort();
        let settled = 0;
        for (const place of wanted.map((index) => index % numbers.length).sort((a, b) => a - b)) {
          expect(orderStatistic(values, place, settled)).toBe(sorted[place]);
          settled = place;
        }
        expect(values.sort()).toEqual(sorted);
      },
    ),
  );
});

it('orderStatistic copes with sorted, reversed and constant values', () => {
  const n = 10_000;
  for (const valueAt of [(i: number) => i, (i: number) => -i, () => 7]) {
    const values = Float64Array.from({ length: n }, (_, i) => valueAt(i));
    const sorted = values.slice().sort();
    expect(orderStatistic(values, 1234)).toBe(sorted[1234]);
    expect(orderStatistic(values, n - 1, 1234)).toBe(sorted[n - 1]);
  }
});

it('orderStatistic finds its place by samples in a long range, with ties and without', () => {
  for (const nDistinct of [3, 1000, 2 ** 31]) {
    const { uniform } = randomStream(20_261, nDistinct);
    const numbers = Float64Array.from({ length: 20_000 }, () => Math.floor(uniform() * nDistinct));
    const sorted = numbers.slice().sort();
    for (const place of [0, 1, 999, 7000, 10_000, 19_998, 19_999]) {
      const values = numbers.slice();
      expect(orderStatistic(values, place)).toBe(sorted[place]);
      expect(Math.max(...values.subarray(0, place + 1))).toBe(sorted[place]);
      expect(Math.min(...values.subarray(place))).toBe(sorted[place]);
      expect(values.sort()).toEqual(sorted);
    }
  }
});
