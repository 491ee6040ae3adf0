import { describe, expect, it } from 'vitest';
import { movingBlockBootstrap } from '../../../src-main/statistics/moving-block-bootstrap.ts';
import { expectClose } from '../../helpers/close.ts';

const x = Array.from({ length: 30 }, (_, t) => t / 10);
const y = x.map((value, t) => 1 + 2 * value + Math.sin(t * t));
const asked = { x, y, intercept: true, blockLength: 4, draws: 1500, seed: 9 };
const codes = (change: object) => movingBlockBootstrap({ ...asked, ...change }).caveats.map(({ code }) => code);

describe('movingBlockBootstrap', () => {
  it('same seed, same digits; another seed, others', () => {
    expect(movingBlockBootstrap(asked)).toEqual(movingBlockBootstrap(asked));
    expect(movingBlockBootstrap({ ...asked, seed: 10 }).quantiles).not.toEqual(movingBlockBootstrap(asked).quantiles);
  });

  it('says pairs when nothing was asked', () => {
    expect(movingBlockBootstrap(asked)).toEqual(movingBlockBootstrap({ ...asked, resample: 'pairs' }));
    expect(movingBlockBootstrap(asked).resample).toBe('pairs');
  });

  it.each(['pairs', 'residuals'] as const)('%s: follows units and levels', (resample) => {
    const plain = movingBlockBootstrap({ ...asked, resample });
    const moved = movingBlockBootstrap({
      ...asked,
      resample,
      x: x.map((value) => 10 * value - 4),
      y: y.map((value) => 3 * value + 500),
    });
    const rounding = { rel: 1e-9, abs: 0, why: 'rounding' };
    expectClose(moved.standardError, 0.3 * plain.standardError, rounding);
    expectClose(moved.quantiles.q05, 0.3 * plain.quantiles.q05, rounding);
  });

  it('tells how far it is, once for each stream', () => {
    const shares: number[] = [];
    movingBlockBootstrap({ ...asked, draws: 2500 }, (share) => shares.push(share));
    expect(shares).toEqual([0.4, 0.8, 1]);
  });

  it('caveats, each on and off', () => {
    expect(codes({})).toEqual([]);
    expect(codes({ blockLength: 6 })).toEqual([]);
    expect(codes({ blockLength: 7 })).toEqual(['few-blocks']);
    expect(codes({ draws: 999 })).toEqual(['few-draws']);
    expect(codes({ years: x.map((_, t) => 1990 + t) })).toEqual([]);
    expect(codes({ years: x.map((_, t) => 1990 + t + (t > 9 ? 1 : 0)) })).toEqual(['gaps-closed-up']);
    // A predictor that varies in one row only: a new record without it has no slope.
    expect(codes({ x: x.map((_, t) => (t === 15 ? 1 : 0)) })).toEqual(['draws-without-spread']);
  });

  it.each([
    ['an exact fit', { y: x.map((value) => 2 * value) }, 'movingBlockBootstrap: expected residuals'],
    [
      'blocks as long as the record',
      { blockLength: 30 },
      'blockLength: expected a whole number at least 1 and at most 29',
    ],
    ['half a row', { blockLength: 2.5 }, 'movingBlockBootstrap, blockLength'],
    ['no draws', { draws: 0 }, 'movingBlockBootstrap, draws'],
    ['a negative seed', { seed: -1 }, 'randomStream, seed'],
    ['a constant predictor', { x: x.map(() => 3) }, 'a constant predictor'],
    ['a missing value', { y: y.with(3, NaN) }, 'movingBlockBootstrap, y[3]'],
    ['mismatched lengths', { x: x.slice(1) }, 'expected 30 values'],
    ['two rows', { x: [1, 2], y: [1, 3] }, 'at least 3 values'],
    ['years out of order', { years: x.map((_, t) => 2000 - t) }, 'a year after 2000'],
  ])('refuses %s', (_, change, sentence) =>
    expect(() => movingBlockBootstrap({ ...asked, ...change })).toThrow(sentence),
  );

  it('refuses when no new record can have a slope', () => {
    // The predictor varies at one end only, where one start of many reaches.
    const years = Array.from({ length: 400 }, (_, t) => t);
    const request = { ...asked, x: years.map((t) => (t === 399 ? 1 : 0)), y: years.map((t) => Math.sin(t * t)) };
    expect(() => movingBlockBootstrap({ ...request, blockLength: 399, draws: 2, seed: 1 })).toThrow(/varies within/);
  });
});
