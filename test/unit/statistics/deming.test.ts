import { describe, expect, it } from 'vitest';
import { deming } from '../../../src-main/statistics/deming.ts';
import { expectClose } from '../../helpers/close.ts';

const x = [1, 2, 4, 5, 7, 9, 10, 12, 13, 15, 16];
const y = x.map((value, t) => 3 + 0.5 * value + Math.sin(t * t));
const rounding = { rel: 1e-9, abs: 1e-12, why: 'rounding' };

describe('deming', () => {
  it('exchanging x and y, and turning δ over, turns the slope over', () => {
    const fit = deming({ x, y, delta: 2 });
    const turned = deming({ x: y, y: x, delta: 0.5 });
    expectClose(turned.slope, 1 / fit.slope, rounding);
    expectClose(turned.intercept, -fit.intercept / fit.slope, rounding);
  });

  it('follows units and levels when δ does', () => {
    const plain = deming({ x, y, delta: 2 });
    const moved = deming({ x: x.map((v) => 10 * v - 4), y: y.map((v) => 3 * v + 70), delta: 2 * 0.09 });
    expectClose(moved.slope, 0.3 * plain.slope, rounding);
    expectClose(moved.slopeStandardError, 0.3 * plain.slopeStandardError, rounding);
  });

  it('few rows: a caveat', () => {
    const codes = (n: number) =>
      deming({ x: x.slice(0, n), y: y.slice(0, n), delta: 1 }).caveats.map(({ code }) => code);
    expect(codes(9)).toEqual(['few-rows']);
    expect(codes(10)).toEqual([]);
  });

  it.each([
    ['δ of zero', { delta: 0 }, 'deming, delta'],
    ['a constant x', { x: x.map(() => 2) }, 'deming, x'],
    ['a constant y', { y: x.map(() => 2) }, 'deming, y'],
    ['x and y of a square', { x: [0, 0, 1, 1], y: [0, 1, 0, 1] }, 'found two that do not'],
    ['x that only one row varies', { x: x.map((_, t) => (t === 4 ? 1 : 0)) }, 'row 4, without which x does not vary'],
    ['a missing value', { y: y.with(2, NaN) }, 'deming, y[2]'],
    ['mismatched lengths', { y: y.slice(1) }, 'expected 11 values'],
    ['two rows', { x: [1, 2], y: [1, 3] }, 'at least 3 values'],
  ])('refuses %s', (_, change, sentence) => expect(() => deming({ x, y, delta: 1, ...change })).toThrow(sentence));
});
