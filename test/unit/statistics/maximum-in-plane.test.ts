import { describe, expect, it } from 'vitest';
import { maximumInPlane, type PlanePoint } from '../../../src-main/statistics/maximum-in-plane.ts';
import { expectClose } from '../../helpers/close.ts';

// Level C: surfaces whose tops are known.

type Surface = (at: readonly [number, number]) => PlanePoint;
const place = { rel: 1e-9, abs: 1e-9, why: 'a step of 1e-10 counts as standing still' };
const anywhere = [Infinity, Infinity] as const;

const hill: Surface = ([a, b]) => ({
  at: [a, b],
  height: 5 - (a - 1) ** 2 - 3 * (b + 2) ** 2 - (a - 1) * (b + 2) - (a - 1) ** 4,
  slope: [-2 * (a - 1) - (b + 2) - 4 * (a - 1) ** 3, -6 * (b + 2) - (a - 1)],
});
/** A curved ridge (Rosenbrock 1960), upside down: its top is at (1, 1). */
const ridge: Surface = ([a, b]) => ({
  at: [a, b],
  height: -((1 - a) ** 2) - 100 * (b - a ** 2) ** 2,
  slope: [2 * (1 - a) + 400 * a * (b - a ** 2), -200 * (b - a ** 2)],
});
/** Two tops at a = ±1, b = 0, with a saddle between them. */
const saddle: Surface = ([a, b]) => ({
  at: [a, b],
  height: 2 * a ** 2 - a ** 4 - b ** 2,
  slope: [4 * a - 4 * a ** 3, -2 * b],
});
const endless: Surface = ([a, b]) => ({
  at: [a, b],
  height: -Math.exp(-2 * a) - b ** 2,
  slope: [2 * Math.exp(-2 * a), -2 * b],
});

describe('maximumInPlane', () => {
  it.each([
    ['a hill', hill, [-3, 4], [1, -2], 5],
    ['a curved ridge', ridge, [-1.2, 1], [1, 1], 0],
    ['beside a saddle, to the nearer side', saddle, [-0.05, 2], [-1, 0], 1],
  ] as const)('%s', (_, surface, from, top, height) => {
    const found = maximumInPlane(surface, surface(from), anywhere);
    expect(found.end).toBe('top');
    expectClose(found.top.at, top, place);
    expectClose(found.top.height, height, place);
  });

  it('ends at a bound where the surface still rises, at the highest place along it', () => {
    const { top, end } = maximumInPlane(endless, endless([0, 1]), [4, 4]);
    expect(end).toBe('edge');
    expectClose(top.at, [4, 0], place);
    const held = maximumInPlane(hill, hill([0, 0]), [0.5, 4]);
    expect(held.end).toBe('edge');
    // Along a = 1/2 the height is −3(b + 2)² + (b + 2)/2 and a constant: highest at b = −2 + 1/12.
    expectClose(held.top.at, [0.5, -2 + 1 / 12], place);
  });

  it('says so when it finds no end', () => {
    const unending: typeof hill = ([a, b]) => ({
      at: [a, b],
      height: Math.log(1 + a ** 2),
      slope: [(2 * a) / (1 + a ** 2), 0],
    });
    expect(maximumInPlane(unending, unending([1, 0]), anywhere).end).toBe('unsettled');
  });
});
