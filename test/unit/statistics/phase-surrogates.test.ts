import { describe, expect, it } from 'vitest';
import { phaseSurrogates } from '../../../src-main/statistics/phase-surrogates.ts';
import { expectClose } from '../../helpers/close.ts';

const values = Array.from({ length: 31 }, (_, t) => 3 + Math.sin(t * t) + 0.5 * Math.cos(t / 3));
const rounding = { rel: 1e-10, abs: 1e-11, why: 'rounding of sums of 31 terms' };
const moment = (series: ArrayLike<number>, lag: number) => {
  const list = Array.from(series);
  const mean = list.reduce((sum, value) => sum + value, 0) / list.length;
  return list.reduce((sum, value, t) => sum + (value - mean) * (list[(t + lag) % list.length]! - mean), mean);
};

describe('phaseSurrogates', () => {
  it('keeps mean, variance and the autocorrelations about the circle', () => {
    for (const surrogate of phaseSurrogates({ values, draws: 4, seed: 2 })) {
      const lags = [0, 1, 2, 7, 15];
      expectClose(
        lags.map((lag) => moment(surrogate, lag)),
        lags.map((lag) => moment(values, lag)),
        rounding,
      );
    }
  });

  it('surrogate d depends on the seed and d alone, follows unit and level, and tells how far it is', () => {
    const shares: number[] = [];
    const four = phaseSurrogates({ values, draws: 4, seed: 2 }, (share) => shares.push(share));
    expect(shares).toEqual([0.25, 0.5, 0.75, 1]);
    expect(phaseSurrogates({ values, draws: 2, seed: 2 })).toEqual(four.slice(0, 2));
    expect(phaseSurrogates({ values, draws: 1, seed: 3 })[0]).not.toEqual(four[0]);
    const moved = phaseSurrogates({ values: values.map((value) => 4 * value - 90), draws: 1, seed: 2 });
    expectClose(
      moved[0]?.map((value) => (value + 90) / 4),
      four[0],
      rounding,
    );
  });

  it.each([
    ['a constant', { values: [2, 2, 2, 2, 2] }, 'phaseSurrogates, values'],
    ['three values', { values: [1, 2, 4] }, 'at least 4 values'],
    ['a missing value', { values: [1, NaN, 2, 3] }, 'phaseSurrogates, values[1]'],
    ['no draws', { draws: 0 }, 'phaseSurrogates, draws'],
    ['more than can be waited for', { draws: 1e9 }, 'at most'],
    ['half a seed', { seed: 0.5 }, 'randomStream, seed'],
  ])('refuses %s', (_, change, sentence) =>
    expect(() => phaseSurrogates({ values, draws: 2, seed: 1, ...change })).toThrow(sentence),
  );
});
