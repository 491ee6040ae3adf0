import { describe, expect, it } from 'vitest';
import { sameButForChance, sameNumbers, standardErrors } from '../../bench/comparison.ts';
import { randomStream } from '../../../src-main/statistics/random-stream.ts';

describe('sameNumbers', () => {
  const compare = sameNumbers({ rel: 1e-10, why: 'the same rows' });

  it('agrees within the tolerance and says how far apart the worst are', () => {
    expect(compare([1, -200], [1, -200 - 1e-8])).toEqual({
      agrees: true,
      inWords: 'relative difference 5.0e-11, at most 1.0e-10 (the same rows)',
    });
    expect(compare([0, 3], [0, 3]).agrees).toBe(true);
  });

  it.each([
    ['one value ten tolerances off', [1, 2 + 2e-9], [1, 2]],
    ['a value where the peer has zero', [1e-300, 2], [0, 2]],
    ['a NaN of ours', [NaN, 2], [1, 2]],
    ['a NaN of ours behind a good value', [1, NaN], [1, 2]],
    ['a NaN on both sides', [NaN], [NaN]],
    ['an infinity of ours', [Infinity], [1]],
    ['a value too few', [1], [1, 2]],
    ['a value too many', [1, 2], [1]],
    ['nothing at all', [], []],
  ])('%s differs', (_, own, peer) => {
    expect(compare(own, peer).agrees).toBe(false);
  });
});

describe('sameButForChance', () => {
  const compare = sameButForChance([0.1, 2]);

  it('allows five standard errors of a difference of two draws, 7.07 of one', () => {
    expect(compare([1.7, 10], [1, 10 - 14])).toMatchObject({ agrees: true });
    expect(compare([1.72, 10], [1, 10])).toMatchObject({ agrees: false });
    expect(compare([1, 10], [1, 24.2])).toMatchObject({ agrees: false });
    expect(compare([1.7, 10], [1, 10]).inWords).toContain('standard errors apart 7.0, at most 7.1');
  });

  it('differs where a standard error is wanting or zero and the values are not the same', () => {
    expect(sameButForChance([0.1])([1, 2], [1, 2]).agrees).toBe(false);
    expect(sameButForChance([0])([1], [1.0001]).agrees).toBe(false);
  });
});

describe('standardErrors', () => {
  it('is the standard deviation over runs, place by place', () => {
    expect(standardErrors(3, (seed) => [seed, 2 * seed])).toEqual([1, 2]);
  });

  it('finds the standard error of a mean of 25 normal draws, 0.2, to the accuracy of 400 runs', () => {
    const meanOfDraws = (seed: number) => {
      const { normal } = randomStream(seed, 0);
      return [Array.from({ length: 25 }, normal).reduce((total, value) => total + value, 0) / 25];
    };
    const [error = NaN] = standardErrors(400, meanOfDraws);
    // A standard deviation from m runs scatters by 1/√(2m): five of those.
    expect(Math.abs(error / 0.2 - 1)).toBeLessThan(5 / Math.sqrt(800));
  });
});
