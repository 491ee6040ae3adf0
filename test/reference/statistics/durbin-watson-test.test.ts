import { readFileSync } from 'node:fs';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { designColumns } from '../../../src-main/statistics/design-columns.ts';
import { durbinWatsonBounds } from '../../../src-main/statistics/durbin-watson-bounds.ts';
import { durbinWatsonTest } from '../../../src-main/statistics/durbin-watson-test.ts';
import { leastSquares } from '../../../src-main/statistics/least-squares.ts';
import { quadraticFormBelowZero } from '../../../src-main/statistics/quadratic-form-below-zero.ts';
import { expectClose } from '../../helpers/close.ts';
import { startR, type RSession } from '../../helpers/r-session.ts';
import { co2AndTemperature } from '../../helpers/real-series.ts';

let r: RSession;
beforeAll(async () => {
  r = await startR(new URL('./durbin-watson-test.R', import.meta.url));
});
afterAll(() => r.close());

const digits = { rel: 1e-11, abs: 0, why: 'the rule is stopped at a relative 1e-12' };
const integral = { rel: 1e-7, abs: 1e-10, why: 'R’s integrate works to an absolute error' };

describe('quadraticFormBelowZero', () => {
  // Level C: a z₁² < b z₂² has probability 2/π arctan √(b/a).
  it('two weights: an arctangent', () => {
    for (const [a, b] of [
      [1, 1],
      [1, 3],
      [1, 0.01],
      [1, 1e-8],
      [250, 3],
    ] as const) {
      expectClose(quadraticFormBelowZero([a, -b]), (2 / Math.PI) * Math.atan(Math.sqrt(b / a)), digits);
    }
  });

  // Level B: 2m equal weights make an F distribution, here down to 1e-113.
  it('R’s pf, far into the tail', async () => {
    for (const m of [2, 7, 40, 300]) {
      for (const ratio of [0.05, 0.4, 0.95, 1.8]) {
        const weights = [...Array<number>(m).fill(1), ...Array<number>(m + 3).fill(-ratio)];
        const { p } = await r.numbers('list(p = pf(ratio * (m + 3) / m, m, m + 3))', { ratio, m });
        expectClose([quadraticFormBelowZero(weights)], p, { ...digits, rel: 2e-11 });
      }
    }
  });

  it('R’s integrate, with weights of all sizes', async () => {
    for (const weights of [
      [3, 1, 0.2, -0.5, -1],
      [0.9, -2, 0.1, -0.3],
      [5, -4, 3, -2, 1, -0.5, 0.25],
    ]) {
      const { p } = await r.numbers('list(p = imhof(w))', { w: weights });
      expectClose([quadraticFormBelowZero(weights)], p, integral);
    }
  });

  it('no weight on one side, weights of zero, and units', () => {
    expect(quadraticFormBelowZero([1, 2, 0])).toBe(0);
    expect(quadraticFormBelowZero([-1, 0])).toBe(1);
    expectClose(quadraticFormBelowZero([3e8, -1e8, 0]), quadraticFormBelowZero([3, -1]), digits);
    expect(() => quadraticFormBelowZero([1, NaN])).toThrow('quadraticFormBelowZero, weights[1]');
  });
});

describe('durbinWatsonBounds', () => {
  // Level A: Savin & White 1977, from memory.
  it.each([
    [15, 1, 5, 1.077, 1.361],
    [6, 1, 5, 0.61, 1.4],
    [100, 1, 5, 1.654, 1.694],
  ])('%d rows, %d predictor, %d %: the printed bounds', (nObs, nPredictors, levelPercent, lower, upper) => {
    expectClose(
      durbinWatsonBounds({ nObs, nPredictors, intercept: true, levelPercent }),
      { lower, upper },
      {
        rel: 0,
        abs: 0.0005,
        why: 'half a unit of the last printed digit',
      },
    );
  });

  // Level B: a whole table, beside this file, by another integral.
  it('the computed table: 6 to 200 rows, up to 5 predictors, 5 % and 1 %', () => {
    const rows = readFileSync(new URL('./durbin-watson-bounds.csv', import.meta.url), 'utf8')
      .trim()
      .split('\n')
      .filter((line) => /^\d/.test(line))
      .map((line) => line.split(',').map(Number));
    expect(rows).toHaveLength(478);
    for (const [nObs = NaN, nPredictors = NaN, levelPercent = NaN, lower, upper] of rows) {
      const bounds = durbinWatsonBounds({ nObs, nPredictors, intercept: true, levelPercent });
      expectClose(
        bounds,
        { lower, upper },
        { rel: 0, abs: 0.6e-4, why: 'printed to four decimals' },
        `${nObs}, ${nPredictors}`,
      );
    }
  });

  it('without an intercept the lower bound drops, and the upper stays that of one more predictor', async () => {
    const through = durbinWatsonBounds({ nObs: 20, nPredictors: 2, intercept: false, levelPercent: 5 });
    const withIntercept = durbinWatsonBounds({ nObs: 20, nPredictors: 1, intercept: true, levelPercent: 5 });
    expect(through.lower).toBeLessThan(withIntercept.lower - 0.05);
    expectClose(
      through.upper,
      durbinWatsonBounds({ nObs: 20, nPredictors: 1, intercept: true, levelPercent: 5 }).upper,
      digits,
    );
    // Imhof's integral at the bound is the level.
    const lambda = Array.from({ length: 18 }, (_, j) => 2 * (1 - Math.cos((Math.PI * j) / 20)) - through.lower);
    const { p } = await r.numbers('list(p = imhof(w))', { w: lambda });
    expectClose(p, [0.05], integral);
  });

  it.each([
    ['too few rows', { nObs: 3 }, 'at least 4 rows for 2 coefficients'],
    ['a level of none', { levelPercent: 0 }, 'durbinWatsonBounds, levelPercent'],
    ['no column at all', { intercept: false, nPredictors: 0 }, 'durbinWatsonBounds, nPredictors'],
    ['half a row', { nObs: 20.5 }, 'durbinWatsonBounds, nObs'],
  ])('refuses %s', (_, change, sentence) =>
    expect(() => durbinWatsonBounds({ nObs: 20, nPredictors: 1, intercept: true, levelPercent: 5, ...change })).toThrow(
      sentence,
    ),
  );
});

describe('durbinWatsonTest', () => {
  const { co2Ppm, temperatureK, years } = co2AndTemperature();
  const logRatio = co2Ppm.map((value) => Math.log(value / 300));
  const testOf = (x: number[] | number[][], y: number[], intercept: boolean) => {
    const columns = designColumns('test', x, y.length, intercept);
    return durbinWatsonTest(leastSquares({ columns, y }), intercept);
  };

  // Level B: Imhof's integral for the same design, by R's eigenvalues of the dense matrix.
  it('exact p in R: with and without intercept, one and two predictors, correlated and not', async () => {
    const wiggle = years.map((year) => Math.sin(year * year));
    const cases = [
      { x: [logRatio], y: temperatureK },
      { x: [logRatio, wiggle], y: temperatureK },
      { x: [years.map((year) => year - 1990)], y: wiggle },
      { x: [logRatio.slice(0, 12)], y: temperatureK.slice(0, 12) },
    ];
    for (const { x, y } of cases) {
      for (const intercept of [true, false]) {
        const { statistic, p, caveats } = testOf(x, y, intercept);
        const fromR = await r.numbers('dw_test(x, y, intercept)', { x: x.flat(), y, intercept });
        expectClose([statistic], fromR['statistic'], { ...digits, rel: 1e-9 });
        expectClose([p], fromR['p'], integral);
        expect(caveats.map(({ code }) => code)).toEqual(intercept ? [] : ['no-intercept']);
      }
    }
  });

  it('the bounds enclose: below the lower one p is below 5 %, above the upper one above', () => {
    const stretched = Array.from({ length: 40 }, (_, i) => {
      const y = years.map((year, t) => (1 - i / 40) * Math.cos(t / 3) + (i / 40) * Math.sin(year * year));
      return testOf(logRatio, y, true);
    });
    const below = stretched.filter(({ statistic, bounds5Percent }) => statistic < bounds5Percent.lower);
    const above = stretched.filter(({ statistic, bounds5Percent }) => statistic > bounds5Percent.upper);
    expect(below.length).toBeGreaterThan(3);
    expect(above.length).toBeGreaterThan(3);
    expect(Math.max(...below.map(({ p }) => p))).toBeLessThan(0.05);
    expect(Math.min(...above.map(({ p }) => p))).toBeGreaterThan(0.05);
  });

  it('refuses what has no distribution', () => {
    expect(() => testOf([1, 2, 4], [1, 3, 2], true)).toThrow('at least 4 rows for 2 coefficients');
    expect(() => durbinWatsonTest({ columns: [[1, 1, 1, 1]], residuals: [0, 0, 0, 0] }, true)).toThrow('exact fit');
    const long = new Float64Array(1001).map((_, t) => Math.sin(t));
    expect(() => durbinWatsonTest({ columns: [long], residuals: long }, false)).toThrow('at most 1000 rows');
  });
});
