import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { chowTest } from '../../../src-main/statistics/chow-test.ts';
import { crossingProbability, cusum } from '../../../src-main/statistics/cusum.ts';
import { designColumns } from '../../../src-main/statistics/design-columns.ts';
import { leastSquares } from '../../../src-main/statistics/least-squares.ts';
import { nestedF } from '../../../src-main/statistics/nested-f.ts';
import { recursiveFit } from '../../../src-main/statistics/recursive-fit.ts';
import { resetTest } from '../../../src-main/statistics/reset-test.ts';
import { expectClose } from '../../helpers/close.ts';
import { startR, type RSession } from '../../helpers/r-session.ts';
import { co2AndTemperature } from '../../helpers/real-series.ts';

// Level B: base R, beside this file, on the real record.

let r: RSession;
beforeAll(async () => {
  r = await startR(new URL('./specification-tests.R', import.meta.url));
});
afterAll(() => r.close());

const near = { rel: 1e-9, abs: 0, why: 'two double-precision programs' };
const nearTail = { rel: 1e-7, abs: 0, why: 'a tail magnifies the difference of the statistic' };
const lists = (record: object) =>
  Object.fromEntries(Object.entries(record).map(([name, value]) => [name, [value].flat()]));

const { co2Ppm, temperatureK: y, years } = co2AndTemperature();
const logRatio = co2Ppm.map((value) => Math.log(value / co2Ppm[0]!));
const wiggle = years.map((year) => Math.sin(year / 3));

describe('resetTest', () => {
  it('R’s anova: powers 2; 2 and 3; 2 to 4, with and without an intercept, one and two predictors', async () => {
    for (const x of [[logRatio], [logRatio, wiggle]]) {
      for (const intercept of [true, false]) {
        for (const powers of [[2], [2, 3], [2, 3, 4]]) {
          const { p, ...test } = resetTest({ x, y, intercept, powers });
          const { p: tail, ...fromR } = await r.numbers('reset_test(x, y, intercept, powers)', {
            x: x.flat(),
            y,
            intercept,
            powers,
          });
          expectClose(lists(test), fromR, near);
          expectClose([p], tail, nearTail);
        }
      }
    }
  });

  it('with an intercept, does not know the level of y', () => {
    const raised = y.map((value) => value + 1e5);
    expectClose(
      resetTest({ x: logRatio, y: raised, intercept: true, powers: [2, 3] }),
      resetTest({ x: logRatio, y, intercept: true, powers: [2, 3] }),
      { rel: 1e-5, abs: 0, why: 'a level of 1e5 costs y six digits' },
    );
  });
});

describe('chowTest', () => {
  it('R’s anova: breaks in the middle and near the end, with and without an intercept', async () => {
    for (const x of [[logRatio], [logRatio, wiggle]]) {
      for (const intercept of [true, false]) {
        for (const breakRow of [30, 52]) {
          const { p, ...test } = chowTest({ x, y, intercept, breakRow });
          const { p: tail, ...fromR } = await r.numbers('chow_test(x, y, intercept, breakRow)', {
            x: x.flat(),
            y,
            intercept,
            breakRow,
          });
          expectClose(lists(test), fromR, near);
          expectClose([p], tail, nearTail);
        }
      }
    }
  });
});

describe('cusum', () => {
  it('R’s lm on each row’s past: recursive residuals, slopes and sums', async () => {
    for (const x of [[logRatio.map((value) => value + 0.01)], [logRatio.map((value) => value + 0.01), wiggle]]) {
      for (const intercept of [true, false]) {
        const { recursiveResiduals, recursiveSlopes, cusum: path, rows } = cusum({ x, y, intercept, levelPercent: 5 });
        const fromR = await r.numbers('recursive_fit(x, y, intercept)', { x: x.flat(), y, intercept });
        const early = { rel: 1e-7, abs: 1e-9, why: 'the first rows hardly tell the coefficients apart' };
        expectClose({ recursiveResiduals, recursiveSlopes, cusum: path }, fromR, early);
        expect(rows).toEqual(years.map((_, t) => t).slice(x.length + (intercept ? 1 : 0)));
      }
    }
  });

  // Level C: the recursive residuals of all rows have the fit's own sum of squares; the last coefficients are the fit's.
  it('ends at the fit of all rows', () => {
    const columns = designColumns('test', [logRatio, wiggle], y.length, true);
    const fit = leastSquares({ columns, y });
    const { residuals, coefficients } = recursiveFit('test', columns, y);
    expectClose(
      residuals.reduce((sum, w) => sum + w ** 2, 0),
      fit.residualSumOfSquares,
      { ...near, rel: 1e-11 },
    );
    expectClose(coefficients.at(-1), fit.coefficients, { ...near, rel: 1e-10 });
  });

  it('rows that repeat each other at the start wait until the coefficients are determined', () => {
    const { rows, recursiveSlopes } = cusum({
      x: [0, 0, 0, 1, 2, 3, 4],
      y: [1, 2, 0, 3, 5, 4, 6],
      intercept: true,
      levelPercent: 5,
    });
    expect(rows).toEqual([4, 5, 6]);
    // By hand: through the mean 1 of the first three rows, then (1, 3) and (2, 5): slope 2 of four rows is 2.
    expectClose(recursiveSlopes[0], 2, { rel: 1e-12, abs: 0, why: 'rounding' });
  });

  // Level A: Brown, Durbin & Evans 1975 give 0.948, 1.143 and 0.850 for 5, 1 and 10 %.
  it('the published boundaries have the p that they stand for', () => {
    const printed = { rel: 0.005, abs: 0, why: 'a in three digits' };
    expectClose([0.948, 1.143, 0.85].map(crossingProbability), [0.05, 0.01, 0.1], printed);
    expectClose(crossingProbability(0.3 - 1e-9), crossingProbability(0.3 + 1e-9), { ...printed, rel: 1e-6 });
    expect(crossingProbability(0)).toBe(1);
    const steps = Array.from({ length: 200 }, (_, i) => crossingProbability(i / 50));
    expect(steps.every((value, i) => i === 0 || value < steps[i - 1]!)).toBe(true);
  });

  it('a slope that changes crosses the boundary, at each level where p says so', () => {
    const bent = years.map((_, t) => 0.1 * Math.sin(t * t) + (t < 30 ? 0 : 0.02 * (t - 30)));
    const levels = ([1, 5, 10] as const).map((levelPercent) =>
      cusum({ x: years.map((_, t) => t), y: bent, intercept: true, levelPercent }),
    );
    for (const { p, statistic, firstOutside, cusum: path, bound, rows } of levels) {
      expect(p).toBeLessThan(0.01);
      const crossing = path.findIndex((value, j) => Math.abs(value) > bound[j]!);
      expect(firstOutside).toBe(rows[crossing]);
      expect(statistic).toBeGreaterThan(1.143);
    }
    expect(levels.map(({ bound }) => bound[9]! / levels[1]!.bound[9]!)).toEqual(
      [1.143 / 0.948, 1, 0.85 / 0.948].map((value) => expect.closeTo(value, 12) as number),
    );
    const straight = cusum({ x: years.map((_, t) => t), y: wiggle, intercept: true, levelPercent: 5 });
    expect(straight.firstOutside).toBeNull();
    expect(straight.p).toBeGreaterThan(0.05);
  });
});

describe('specification tests refuse', () => {
  const t = [0, 1, 2, 3, 4, 5, 6, 7, 8, 9];
  const rough = t.map((value) => Math.sin(value * value));
  const asked = { x: t, y: rough, intercept: true };
  it.each([
    ['reset: no power', () => resetTest({ ...asked, powers: [] }), 'at least one power'],
    ['reset: power one', () => resetTest({ ...asked, powers: [1] }), 'resetTest, powers[0]'],
    ['reset: an exact line', () => resetTest({ ...asked, y: t, powers: [2] }), 'resetTest: expected residuals'],
    [
      'reset: too few rows',
      () => resetTest({ x: [1, 2, 3, 4], y: [1, 3, 2, 5], intercept: true, powers: [2, 3] }),
      'more than 4 rows',
    ],
    [
      'reset: two values of x',
      () => resetTest({ ...asked, x: t.map((v) => v % 2), powers: [2] }),
      'none is a combination',
    ],
    ['reset: a missing value', () => resetTest({ ...asked, y: rough.with(1, NaN), powers: [2] }), 'resetTest, y[1]'],
    ['chow: a break at the edge', () => chowTest({ ...asked, breakRow: 2 }), 'at least 3 and at most 7'],
    ['chow: half a row', () => chowTest({ ...asked, breakRow: 4.5 }), 'chowTest, breakRow'],
    [
      'chow: constant in a part',
      () => chowTest({ ...asked, x: t.map((v) => Math.max(0, v - 5)), breakRow: 5 }),
      'chowTest: expected columns',
    ],
    [
      'chow: a bent exact line',
      () => chowTest({ ...asked, y: t.map((v) => Math.abs(v - 5)), breakRow: 5 }),
      'chowTest: expected residuals',
    ],
    ['chow: mismatched lengths', () => chowTest({ ...asked, x: t.slice(1), breakRow: 5 }), 'expected 10 values'],
    [
      'cusum: too few rows',
      () => cusum({ x: [1, 2, 3, 4], y: [1, 3, 2, 5], intercept: true, levelPercent: 5 }),
      'at least 5 rows',
    ],
    ['cusum: an exact line', () => cusum({ ...asked, y: t, levelPercent: 5 }), 'cusum: expected residuals'],
    [
      'cusum: a constant predictor',
      () => cusum({ ...asked, x: t.map(() => 2), levelPercent: 5 }),
      'a constant predictor',
    ],
    ['cusum: a missing value', () => cusum({ ...asked, x: t.with(3, NaN), levelPercent: 5 }), 'cusum, x[3]'],
    [
      'recursive fit: mismatched lengths',
      () => recursiveFit('test', [Float64Array.of(1, 2)], [1]),
      'test, y: expected 2 values',
    ],
    [
      'nested F: an exact fit',
      () =>
        nestedF(
          'test',
          { residualSumOfSquares: 1, nCoefficients: 1 },
          { residualSumOfSquares: 0, nCoefficients: 2 },
          { nObs: 9, sumOfSquares: 4 },
        ),
      'test: expected residuals',
    ],
  ])('%s', (_, run, sentence) => expect(run).toThrow(sentence));
});
