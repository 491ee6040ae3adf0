import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { york } from '../../../src-main/statistics/york.ts';
import { regression } from '../../../src-main/statistics/regression.ts';
import { expectClose } from '../../helpers/close.ts';
import { startR, type RSession } from '../../helpers/r-session.ts';

let r: RSession;
beforeAll(async () => {
  r = await startR(new URL('./york.R', import.meta.url));
});
afterAll(() => r.close());

// Pearson 1901, Phil. Mag. 2, 559–572, with the weights of York 1966, Can. J. Phys. 44, 1079–1086 (weights are 1/σ²).
const pearson = {
  x: [0, 0.9, 1.8, 2.6, 3.3, 4.4, 5.2, 6.1, 6.5, 7.4],
  y: [5.9, 5.4, 4.4, 4.6, 3.5, 3.7, 2.8, 2.8, 2.4, 1.5],
  sx: [1000, 1000, 500, 800, 200, 80, 60, 20, 1.8, 1].map((weight) => 1 / Math.sqrt(weight)),
  sy: [1, 1.8, 4, 8, 20, 20, 70, 70, 100, 500].map((weight) => 1 / Math.sqrt(weight)),
};

describe('york', () => {
  // Level A: the digits of York et al. 2004, table II.
  it('Pearson’s data with York’s weights: published line and standard errors', () => {
    const fit = york(pearson);
    const printed = (digits: number) => ({
      rel: 0,
      abs: 0.5 * 10 ** -digits,
      why: 'half a unit of the last printed digit',
    });
    expectClose(fit.intercept, 5.47991022, printed(8));
    expectClose(fit.slope, -0.480533407, printed(9));
    expectClose(fit.interceptStandardError, 0.294970735, printed(9));
    expectClose(fit.slopeStandardError, 0.057985009, printed(10));
    expectClose(fit.goodness, 1.483294149, printed(9));
  });

  // More digits, and the second convention: computed independently of this project in doubles.
  it('the same to twelve digits, and the standard errors scaled by √(S/(n − 2))', () => {
    const fit = york(pearson);
    const digits = { rel: 1e-10, abs: 0, why: 'twelve digits, of an iteration that stands still' };
    expectClose([fit.intercept, fit.slope], [5.479910224033, -0.480533407446], digits);
    expectClose([fit.interceptStandardError, fit.slopeStandardError], [0.294970735493, 0.057985009001], digits);
    expectClose(fit.chiSquare, 11.8663531941, digits);
    expectClose(
      [fit.scaledInterceptStandardError, fit.scaledSlopeStandardError],
      [0.359246522551, 0.070620269529],
      digits,
    );
  });

  // Level B: what it minimises, minimised in base R; with correlated errors of either sign.
  it.each([0, 0.4, -0.7])('in R, with errors correlated by %d and by row', async (correlation) => {
    const each = pearson.x.map((_, i) => correlation * (i % 2 === 0 ? 1 : 0.5));
    for (const errors of [each, pearson.x.map(() => correlation)]) {
      const fromR = await r.numbers('york_line(x, y, sx, sy, r)', { ...pearson, r: errors });
      const { slope, intercept, slopeStandardError, interceptStandardError, covariance, chiSquare } = york({
        ...pearson,
        r: errors,
      });
      const near = { rel: 1e-7, abs: 0, why: 'R finds the minimum by differences' };
      expectClose(
        { slope, intercept, slopeStandardError, interceptStandardError, covariance, chiSquare },
        Object.fromEntries(Object.entries(fromR).map(([name, [value]]) => [name, value])),
        near,
      );
    }
    expectClose(
      york({ ...pearson, r: correlation }).slope,
      york({ ...pearson, r: each.map(() => correlation) }).slope,
      {
        rel: 0,
        abs: 0,
        why: 'the same request',
      },
    );
  });

  // Level C: limits with a closed form.
  it('is Deming’s line for errors that are the same in every row', () => {
    // Major axis of Pearson’s data: his own answer, −0.546 and 5.784.
    const fit = york({ x: pearson.x, y: pearson.y, sx: 0.3, sy: 0.3 });
    const digits = { rel: 1e-10, abs: 0, why: 'ten digits of the closed form' };
    expectClose([fit.slope, fit.intercept], [-0.5455611975, 5.7840437745], digits);
    expectClose(york({ x: pearson.x, y: pearson.y, sx: 0.2, sy: 0.4 }).slope, -0.5413679776, digits);
    expectClose(york({ x: pearson.x, y: pearson.y, sx: 0.4, sy: 0.2 }).slope, -0.5539045558, digits);
  });

  it('is the weighted regression of y on x when x is exact', () => {
    const fit = york({ ...pearson, sx: 0 });
    const weights = pearson.sy.map((s) => 1 / s ** 2);
    const line = regression({
      x: pearson.x,
      y: pearson.y,
      weights,
      intercept: true,
      covariance: { kind: 'classical' },
    });
    const near = { rel: 1e-12, abs: 0, why: 'the same line' };
    expectClose([fit.intercept, fit.slope], line.coefficients, near);
    expectClose([fit.scaledInterceptStandardError, fit.scaledSlopeStandardError], line.standardErrors, near);
    expectClose([fit.intercept, fit.slope], [6.10010932, -0.61081296], { rel: 1e-8, abs: 0, why: 'as printed' });
  });

  it('swapping the axes inverts the line', () => {
    const fit = york({ ...pearson, r: 0.3 });
    const swapped = york({ x: pearson.y, y: pearson.x, sx: pearson.sy, sy: pearson.sx, r: 0.3 });
    const near = { rel: 1e-10, abs: 0, why: 'two iterations to a standstill' };
    expectClose(swapped.slope, 1 / fit.slope, near);
    expectClose(swapped.chiSquare, fit.chiSquare, near);
  });

  it.each([
    ['a negative error', { ...pearson, sx: -1 }, 'york, sx[0]'],
    ['a row without error', { ...pearson, sx: 0, sy: pearson.sy.with(2, 0) }, 'york, row 2'],
    ['a correlation of one', { ...pearson, r: 1 }, 'york, r[0]'],
    ['unequal lengths', { ...pearson, sy: [1, 2] }, 'york, sy: expected 10 values'],
    ['a constant x', { ...pearson, x: pearson.x.map(() => 3) }, 'york'],
    ['two points', { x: [1, 2], y: [1, 2], sx: 1, sy: 1 }, 'at least 3'],
    ['a missing value', { ...pearson, y: pearson.y.with(3, NaN) }, 'york, y[3]'],
  ])('refuses %s', (_, request, sentence) => expect(() => york(request)).toThrow(sentence));
});
