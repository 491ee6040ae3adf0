import { describe, expect, it } from 'vitest';
import { generatorId, mersenneTwister, randomStream } from '../../../src-main/statistics/random-stream.ts';
import { upperTailChiSquared } from '../../../src-main/statistics/upper-tail-chi-squared.ts';
import fromPython from './random-stream.json' with { type: 'json' };

describe('randomStream', () => {
  // Level A: the first and the 1000th outputs printed in mt19937ar.out (Matsumoto & Nishimura 2002).
  it('gives the published outputs of MT19937 initialised by an array', () => {
    const generator = mersenneTwister([0x123, 0x234, 0x345, 0x456]);
    const outputs = Array.from({ length: 1000 }, () => generator.next() >>> 0);
    expect(outputs.slice(0, 5)).toEqual([1067595299, 955945823, 477289528, 4107218783, 4228976476]);
    expect(outputs.at(-1)).toBe(3460025646);
  });

  // Level B: Python's random module; script and numbers beside this file.
  it.each(fromPython)(
    'gives the uniforms of Python for seed $seed, block $block',
    ({ seed, block, first, last, count }) => {
      const { uniform } = randomStream(seed, block);
      const uniforms = Array.from({ length: count }, uniform);
      expect(uniforms.slice(0, 5)).toEqual(first);
      expect(uniforms.slice(-5)).toEqual(last);
    },
  );

  it('gives the same digits again, and others for another seed or block', () => {
    const draw = (seed: number, block: number) => {
      const stream = randomStream(seed, block);
      return [stream.uniform(), stream.normal(), stream.normal()];
    };
    expect(draw(5, 3)).toEqual(draw(5, 3));
    expect(draw(5, 3)).not.toEqual(draw(5, 4));
    expect(draw(5, 3)).not.toEqual(draw(3, 5));
    expect(draw(0, 0)).not.toEqual(draw(0, 1));
  });

  it('draws a normal from one uniform, so that counts stay in step', () => {
    const a = randomStream(9, 0);
    const b = randomStream(9, 0);
    a.normal();
    b.uniform();
    expect(a.uniform()).toBe(b.uniform());
  });

  // Bounds from the number of draws: a chi-squared test at 1e-6, seeds fixed.
  it('fills 64 equal cells of the uniform and of the normal distribution evenly, and consecutive pairs too', () => {
    const nDraws = 200_000;
    const { uniform } = randomStream(12, 1);
    const cells = new Float64Array(64);
    const pairs = new Float64Array(64);
    let previous = uniform();
    for (let i = 0; i < nDraws; i++) {
      const value = uniform();
      cells[Math.floor(value * 64)]! += 1;
      pairs[Math.floor(previous * 8) * 8 + Math.floor(value * 8)]! += 1;
      previous = value;
    }
    for (const counts of [cells, pairs]) {
      const expected = nDraws / 64;
      const statistic = counts.reduce((total, count) => total + (count - expected) ** 2 / expected, 0);
      expect(upperTailChiSquared(statistic, 63)).toBeGreaterThan(1e-6);
    }
  });

  it('has normals whose first four moments agree with the normal distribution within five standard errors', () => {
    const nDraws = 200_000;
    const { normal } = randomStream(12, 2);
    const moments = [0, 0, 0, 0];
    for (let i = 0; i < nDraws; i++) {
      const value = normal();
      for (const power of [1, 2, 3, 4]) moments[power - 1]! += value ** power / nDraws;
    }
    // E z^k and var z^k of the standard normal, k = 1 … 4.
    const expected = [0, 1, 0, 3];
    const variance = [1, 2, 15, 96];
    moments.forEach((moment, k) => {
      expect(Math.abs(moment - expected[k]!)).toBeLessThan(5 * Math.sqrt(variance[k]! / nDraws));
    });
  });

  it('names itself', () => expect(generatorId).toMatch(/^mt19937 /));
});
