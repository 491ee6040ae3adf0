import { describe, expect, it } from 'vitest';
import { InputError, NumericError } from '../../../src-main/errors.ts';
import { leastSquares } from '../../../src-main/statistics/least-squares.ts';
import { expectClose } from '../../helpers/close.ts';

const rounding = { rel: 1e-14, abs: 1e-15, why: 'a short exact calculation in doubles' };

describe('leastSquares', () => {
  // x = 1, 2, 4; y = 1, 2, 6: means 7/3 and 3; Sxx = 14/3, Sxy = 8; slope 12/7, intercept −1.
  const line = {
    columns: [
      [1, 1, 1],
      [1, 2, 4],
    ],
    y: [1, 2, 6],
  };

  it('solves a line by hand', () => {
    const fit = leastSquares(line);
    expectClose(fit.coefficients, [-1, 12 / 7], rounding);
    expectClose(fit.residuals, [2 / 7, -3 / 7, 1 / 7], rounding);
    expectClose(fit.fitted, [5 / 7, 17 / 7, 41 / 7], rounding);
    expectClose(fit.residualSumOfSquares, 2 / 7, rounding);
    // (X′X)⁻¹ = [[21, −7], [−7, 3]]/14; h = 1/3 + (x − 7/3)²·3/14.
    expectClose(fit.unscaledCovariance, [1.5, -0.5, -0.5, 3 / 14], rounding);
    expectClose(fit.logDeterminant, Math.log(14), rounding);
    expectClose(fit.leverage, [5 / 7, 5 / 14, 13 / 14], rounding);
    expect(fit).toMatchObject({ nObs: 3, nCoefficients: 2, weights: null });
  });

  it('says how each y enters each coefficient', () => {
    const fit = leastSquares(line);
    const fromInfluence = fit.observationInfluence.map((row) => row.reduce((total, a, i) => total + a * line.y[i]!, 0));
    expectClose(fromInfluence, fit.coefficients, rounding);
  });

  it('a weight of 2 is the row twice', () => {
    const weighted = leastSquares({ ...line, weights: [1, 2, 3] });
    const repeated = leastSquares({
      columns: [
        [1, 1, 1, 1, 1, 1],
        [1, 2, 2, 4, 4, 4],
      ],
      y: [1, 2, 2, 6, 6, 6],
    });
    expectClose(weighted.coefficients, repeated.coefficients, rounding);
    expectClose(weighted.residualSumOfSquares, repeated.residualSumOfSquares, rounding);
    expectClose(weighted.unscaledCovariance, repeated.unscaledCovariance, rounding);
    expectClose(
      weighted.residuals,
      [0, 1, 3].map((row) => repeated.residuals[row]),
      rounding,
    );
    expectClose(weighted.leverage[2], 3 * repeated.leverage[3]!, rounding);
  });

  it('finds an exact line exactly, whatever the offset of x', () => {
    const years = [2001, 2002, 2003, 2004];
    const fit = leastSquares({ columns: [years.map(() => 1), years], y: years.map((year) => 0.25 * year - 480) });
    expect([...fit.coefficients]).toEqual([-480, 0.25]);
    expect([...fit.residuals]).toEqual([0, 0, 0, 0]);
    expect(fit.residualSumOfSquares).toBe(0);
  });

  it('finds a coefficient of zero', () => {
    const alternating = Array.from({ length: 40 }, (_, t) => (-1) ** t);
    expect([...leastSquares({ columns: [alternating.map(() => 1)], y: alternating }).coefficients]).toEqual([0]);
    const slope = leastSquares({
      columns: [alternating.map(() => 1), [...alternating.keys()].map((t) => (t % 4) - 1.5)],
      y: alternating.map((value) => 0.1 * value),
    });
    expectClose(slope.coefficients, [0, -0.04], rounding);
  });

  it('finds nothing more to explain in its own residuals', () => {
    const x = Array.from({ length: 50 }, (_, i) => Math.sin(i * i) + i / 7);
    const columns = [x.map(() => 1), x, x.map((value) => value ** 2)];
    for (let i = 0; i < 20; i++) {
      const first = leastSquares({ columns, y: x.map((_, t) => Math.cos(t * (i + 1)) + t) });
      const second = leastSquares({ columns, y: first.residuals });
      expectClose(second.coefficients, [0, 0, 0], { rel: 0, abs: 1e-13, why: 'the residuals are rounded to doubles' });
    }
  });

  it('fits zeros, and as many rows as columns', () => {
    expect([...leastSquares({ columns: [[1, 2, 3]], y: [0, 0, 0] }).coefficients]).toEqual([0]);
    expect([
      ...leastSquares({
        columns: [
          [1, 1],
          [0, 2],
        ],
        y: [3, 7],
      }).coefficients,
    ]).toEqual([3, 2]);
  });

  it.each([1e-140, 1e-30, 1, 1e30, 1e140])('tiny, ordinary and huge: x in units of %d', (unit) => {
    const x = [1, 2, 4].map((value) => value * unit);
    const fit = leastSquares({ columns: [[1, 1, 1], x], y: line.y });
    expectClose(fit.coefficients[1]! * unit, 12 / 7, rounding);
    expectClose(fit.logDeterminant, Math.log(14) + 2 * Math.log(unit), { ...rounding, abs: 1e-12 });
    const y = line.y.map((value) => value * unit);
    expectClose(leastSquares({ columns: line.columns, y }).coefficients[1]! / unit, 12 / 7, rounding);
  });

  it('refuses dependent columns whatever their units, and names the one that adds nothing', () => {
    const a = [1, 2, 3, 4.5, 5];
    const b = [0.3, 0.1, 0.7, 0.2, 0.9];
    for (const unit of [1e-9, 1, 1e9]) {
      const sum = a.map((value, i) => unit * (value + 0.1 * b[i]!));
      expect(() => leastSquares({ columns: [a, b, sum], y: b })).toThrow(NumericError);
    }
    expect(() =>
      leastSquares({
        columns: [
          [1, 1, 1],
          [5, 5, 5],
        ],
        y: [1, 2, 3],
        caller: 'trend',
      }),
    ).toThrow(/^trend: expected columns of which none is a combination .* column [12] of 2/);
    expect(() =>
      leastSquares({
        columns: [
          [1, 2, 3],
          [0, 0, 0],
        ],
        y: [1, 2, 3],
      }),
    ).toThrow('column 2 of 2');
  });

  it('still answers when the columns differ in the tenth digit', () => {
    const a = [1, 2, 3, 4.5, 5];
    const nearly = a.map((value, i) => value + 1e-9 * [1, -1, 0.5, 0, -0.5][i]!);
    const fit = leastSquares({ columns: [a, nearly], y: a.map((value, i) => value + 3 * nearly[i]!) });
    expectClose(fit.coefficients, [1, 3], { rel: 1e-6, abs: 0, why: 'y is rounded at 1e-16 of columns 1e-9 apart' });
    expect(fit.pivotRatio).toBeLessThan(1e-8);
  });

  it.each([
    ['not-finite', { columns: [[1, 2, NaN]], y: [1, 2, 3] }],
    ['not-finite', { columns: [[1, 2, 3]], y: [1, Infinity, 3] }],
    ['wrong-length', { columns: [[1, 2]], y: [1, 2, 3] }],
    ['wrong-length', { columns: [[1, 2, 3]], y: [1, 2, 3], weights: [1] }],
    ['not-positive', { columns: [[1, 2, 3]], y: [1, 2, 3], weights: [1, 0, 1] }],
    ['too-few-observations', { columns: [[1], [2]], y: [1] }],
    ['too-few-observations', { columns: [], y: [1] }],
    ['out-of-scale', { columns: [[1e-160, 2e-160]], y: [1, 2] }],
    ['too-large', { columns: [[1, 2]], y: [1, 1e160] }],
  ])('%s', (code, input) => {
    let fields: unknown;
    try {
      leastSquares(input);
    } catch (error) {
      if (error instanceof InputError) fields = error.fields;
    }
    expect(fields).toMatchObject({ code });
  });
});
