import { describe, expect, it } from 'vitest';
import { simplexMaximum } from '../../../src-main/statistics/simplex-maximum.ts';
import { expectClose } from '../../helpers/close.ts';

// Level C: functions whose top is known. A height that is level to 1e-11 fixes the place to about its root.
const place = { rel: 0, abs: 2e-5, why: 'the top is flat: its place is known to the root of the level' };

describe('simplexMaximum', () => {
  it('one variable', () => {
    const { at, height } = simplexMaximum(([x = NaN]) => 7 - (x - 2) ** 2, [30], [1]);
    expectClose({ at, height }, { at: [2], height: 7 }, place);
  });

  it('a bent valley in two variables (Rosenbrock 1960), from both sides', () => {
    const valley = ([x = NaN, y = NaN]: readonly number[]) => -((1 - x) ** 2) - 100 * (y - x * x) ** 2;
    for (const start of [
      [-1.2, 1],
      [3, -4],
    ]) {
      expectClose(simplexMaximum(valley, start, [0.3, 0.3]).at, [1, 1], place);
    }
  });

  it('four variables of very different width (Wood, as in Colville 1968)', () => {
    const wood = ([a = NaN, b = NaN, c = NaN, d = NaN]: readonly number[]) =>
      -(
        100 * (b - a * a) ** 2 +
        (1 - a) ** 2 +
        90 * (d - c * c) ** 2 +
        (1 - c) ** 2 +
        10.1 * ((b - 1) ** 2 + (d - 1) ** 2) +
        19.8 * (b - 1) * (d - 1)
      );
    expectClose(simplexMaximum(wood, [-3, -1, -3, -1], [0.5, 0.5, 0.5, 0.5]).at, [1, 1, 1, 1], place);
  });

  it('stays where the function is defined', () => {
    const half = ([x = NaN, y = NaN]: readonly number[]) => (x < 0.5 ? -Infinity : -x * x - (y - 1) ** 2);
    const { at } = simplexMaximum(half, [4, 4], [1, 1]);
    expectClose(at, [0.5, 1], { rel: 0, abs: 1e-4, why: 'an edge is approached by halves' });
  });

  it('gives the same digits again', () => {
    const hill = ([x = NaN, y = NaN]: readonly number[]) => Math.cos(x) * Math.exp(-y * y);
    expect(simplexMaximum(hill, [1, 1], [0.2, 0.2])).toEqual(simplexMaximum(hill, [1, 1], [0.2, 0.2]));
  });
});
