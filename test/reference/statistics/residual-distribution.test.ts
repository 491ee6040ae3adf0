import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { breuschPagan } from '../../../src-main/statistics/breusch-pagan.ts';
import { designColumns } from '../../../src-main/statistics/design-columns.ts';
import { jarqueBera } from '../../../src-main/statistics/jarque-bera.ts';
import { leastSquares } from '../../../src-main/statistics/least-squares.ts';
import { expectClose } from '../../helpers/close.ts';
import { startR, type RSession } from '../../helpers/r-session.ts';
import { co2AndTemperature } from '../../helpers/real-series.ts';

// Level B: base R, beside this file, on residuals of the real record and on R's own series.

let r: RSession;
beforeAll(async () => {
  r = await startR(new URL('./residual-distribution.R', import.meta.url));
});
afterAll(() => r.close());

const near = { rel: 1e-9, abs: 1e-15, why: 'two double-precision programs' };
const lists = (record: object) => Object.fromEntries(Object.entries(record).map(([name, value]) => [name, [value]]));
const { co2Ppm, temperatureK: y, years } = co2AndTemperature();
const logRatio = co2Ppm.map((value) => Math.log(value / 300));

describe('jarqueBera', () => {
  it('base R: skewed counts, lake levels, residuals', async () => {
    const { skewed = [], lake = [] } = await r.numbers('list(skewed = sunspot.year, lake = LakeHuron)');
    const { residuals } = leastSquares({ columns: designColumns('test', logRatio, y.length, false), y });
    for (const values of [skewed, lake, [...residuals]]) {
      expectClose(lists(jarqueBera(values)), await r.numbers('jarque_bera(e)', { e: values }), near);
    }
  });

  it('knows neither unit nor level, even a very small one', () => {
    const values = [1, 4, 2, 8, 5, 7, 1, 3];
    for (const unit of [1e-80, 1e30]) {
      expectClose(jarqueBera(values.map((value) => unit * value)), jarqueBera(values), { ...near, rel: 1e-11 });
    }
  });

  it.each([
    ['a constant', [2, 2, 2, 2, 2], 'jarqueBera, values'],
    ['three values', [1, 2, 4], 'at least 4 values'],
    ['a missing value', [1, 2, NaN, 4], 'jarqueBera, values[2]'],
  ])('refuses %s', (_, values, sentence) => expect(() => jarqueBera(values)).toThrow(sentence));
});

describe('breuschPagan', () => {
  it('base R: studentised and original, with and without an intercept, one and two predictors', async () => {
    for (const x of [[logRatio], [logRatio, years.map((year) => Math.sin(year / 3))]]) {
      for (const intercept of [true, false]) {
        const fit = leastSquares({ columns: designColumns('test', x, y.length, intercept), y });
        for (const kind of ['studentised', 'original'] as const) {
          const fromR = await r.numbers('breusch_pagan(x, y, intercept, kind)', { x: x.flat(), y, intercept, kind });
          expectClose(lists(breuschPagan(fit, intercept, kind)), fromR, near);
        }
      }
    }
  });

  it('a constant among the predictors serves as the intercept; alone it leaves nothing to follow', () => {
    const wiggle = years.map((year) => Math.sin(year / 3));
    const asIntercept = leastSquares({ columns: designColumns('test', wiggle, y.length, true), y });
    const asPredictor = leastSquares({
      columns: designColumns('test', [years.map(() => 5), wiggle], y.length, false),
      y,
    });
    expectClose(breuschPagan(asPredictor, false, 'original'), breuschPagan(asIntercept, true, 'original'), near);
    const level = leastSquares({
      columns: designColumns(
        'test',
        years.map(() => 5),
        y.length,
        false,
      ),
      y,
    });
    expect(breuschPagan(level, false, 'studentised')).toEqual({ statistic: 0, df: 0, p: 1 });
  });

  it('residuals all of one size: nothing changes along x', () => {
    const fit = {
      columns: [
        [1, 1, 1, 1],
        [0, 1, 2, 3],
      ],
      residuals: [0.1, -0.1, -0.1, 0.1],
    };
    for (const kind of ['studentised', 'original'] as const) {
      expect(breuschPagan(fit, true, kind)).toMatchObject({ statistic: expect.closeTo(0, 20) as number, df: 1, p: 1 });
    }
  });

  it.each([
    ['residuals that are all zero', [0, 0, 0, 0], 'breuschPagan: expected residuals'],
    ['a missing value', [1, NaN, 0, 2], 'breuschPagan, residuals[1]'],
    ['mismatched lengths', [1, 2, 0], 'expected 3 values'],
  ])('refuses %s', (_, residuals, sentence) =>
    expect(() =>
      breuschPagan(
        {
          columns: [
            [1, 1, 1, 1],
            [0, 1, 2, 3],
          ],
          residuals,
        },
        true,
        'original',
      ),
    ).toThrow(sentence),
  );
});
