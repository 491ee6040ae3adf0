import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { growingLine } from '../../../src-main/statistics/growing-line.ts';
import { leastSquares } from '../../../src-main/statistics/least-squares.ts';
import { mean } from '../../../src-main/statistics/summation.ts';
import { expectClose } from '../../helpers/close.ts';

// Level C: a fit by pivoted QR with refinement on the rows of each window.

const slopes = { rel: 1e-11, abs: 1e-13, why: 'three digits may be lost of those that the sums of a window carry' };
const squared = { ...slopes, rel: 1e-9 };

function expectWindows(x: Float64Array, y: Float64Array, intercept: boolean, shortest: number): void {
  const from = growingLine(x, y);
  for (let first = 0; first + shortest <= x.length; first += 3) {
    const anchor = { x0: x[first]!, y0: y[first]! };
    const lineTo = from(first, anchor, intercept);
    for (let last = first + shortest - 1; last < x.length; last++) {
      const dx = x.subarray(first, last + 1).map((value) => value - anchor.x0);
      const dy = y.subarray(first, last + 1).map((value) => value - anchor.y0);
      const columns = intercept ? [dx.map(() => 1), dx] : [dx];
      const fit = leastSquares({ columns, y: dy });
      const line = lineTo(last);
      const scale = Math.max(...dy.map(Math.abs)) / Math.max(...dx.map(Math.abs));
      expectClose(line.slope, fit.coefficients.at(-1), { ...slopes, abs: 1e-12 * scale });
      expectClose(line.squares, fit.residualSumOfSquares, { ...squared, abs: 1e-22 * scale ** 2 });
      const centre = intercept ? [mean(dx), mean(dy)] : [0, 0];
      const level = 4 * Number.EPSILON * Math.max(Math.abs(anchor.x0), Math.abs(anchor.y0));
      const places = { ...slopes, rel: 1e-9, abs: 1e-12 + level };
      expectClose([line.xCentre - anchor.x0, line.yCentre - anchor.y0], centre, places);
    }
  }
}

const years = Float64Array.from({ length: 40 }, (_, t) => 1980 + t);
const noise = years.map((_, t) => Math.sin(t * t));

describe('growingLine', () => {
  it.each([
    ['a trend with noise', noise.map((value, t) => 0.02 * t + 0.1 * value)],
    ['a close fit', noise.map((value, t) => 0.02 * t + 1e-7 * value)],
    ['a close fit about a bend', noise.map((value, t) => 0.02 * Math.max(0, t - 20) + 1e-6 * value)],
    ['a far level', noise.map((value, t) => 1e6 + 0.02 * t + 0.1 * value)],
    ['a step', noise.map((value, t) => (t < 15 ? 0 : 50) + 0.1 * value)],
  ])('%s', (_, y) => {
    for (const intercept of [true, false]) expectWindows(years, y, intercept, 5);
  });

  it('whatever the data', () => {
    const row = fc.record({ a: fc.integer({ min: -999, max: 999 }), b: fc.integer({ min: -999, max: 999 }) });
    fc.assert(
      fc.property(fc.array(row, { minLength: 8, maxLength: 20 }), fc.boolean(), (rows, intercept) => {
        const x = Float64Array.from(rows, ({ a }, t) => t + a / 5000);
        const y = Float64Array.from(rows, ({ b }, t) => 2 * t + b / 100);
        expectWindows(x, y, intercept, 4);
      }),
      { seed: 20_260_101, numRuns: 40 },
    );
  });

  it('an exact line leaves next to nothing; a constant x has no slope', () => {
    const exact = growingLine(
      years,
      years.map((year) => 3 * year - 2),
    )(
      0,
      { x0: 1980, y0: 5938 },
      true,
    )(39);
    expectClose(exact.slope, 3, slopes);
    expect(exact.squares).toBeLessThan(1e-20);
    const flat = growingLine(
      years.map(() => 7),
      noise,
    )(
      0,
      { x0: 7, y0: 0 },
      true,
    )(39);
    expect(flat).toMatchObject({ spread: 0, slope: NaN });
  });
});
