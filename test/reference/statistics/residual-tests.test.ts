import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { residualTests } from '../../../src-main/statistics/residual-tests.ts';
import { expectClose } from '../../helpers/close.ts';
import { startR, type RSession } from '../../helpers/r-session.ts';
import { co2AndTemperature } from '../../helpers/real-series.ts';

// Level B: base R on the real record; the tests one by one are in serial-correlation.test.ts.

let r: RSession;
beforeAll(async () => {
  const files = ['serial-correlation.R', 'durbin-watson-test.R', 'residual-distribution.R'];
  r = await startR(...files.map((name) => new URL(name, import.meta.url)));
});
afterAll(() => r.close());

const near = { rel: 1e-9, abs: 0, why: 'two double-precision programs, p-values in the tail' };
const { co2Ppm, temperatureK, years } = co2AndTemperature();
const x = co2Ppm.map((value) => Math.log(value / (co2Ppm[0] ?? NaN)));
const y = temperatureK.map((value) => value - (temperatureK[0] ?? NaN));

describe('residualTests', () => {
  it('are those of R on lm’s residuals: two numbers of lags, with and without intercept and fitted coefficients', async () => {
    for (const [intercept, lags, fitdf, kind] of [
      [true, 3, undefined, undefined],
      [true, 5, 1, 'original'],
      [false, 4, 2, 'studentised'],
    ] as const) {
      const found = residualTests({
        x,
        y,
        intercept,
        lags,
        ...(fitdf === undefined ? {} : { fitdf }),
        ...(kind === undefined ? {} : { breuschPaganKind: kind }),
      });
      const reference = await r.numbers(
        `fit <- if (intercept) lm(y ~ x) else lm(y ~ x - 1)
         e <- residuals(fit)
         lb <- box(e, lags, fitdf)
         bg <- breusch_godfrey(fit, lags)
         r1 <- lag_one(e)
         list(lag1 = r1, nEff = length(e) * (1 - r1) / (1 + r1), durbinWatson = sum(diff(e)^2) / sum(e^2),
              lb = unlist(lb), bg = unlist(bg), jb = unlist(jarque_bera(e)),
              bp = unlist(breusch_pagan(x, y, intercept, kind)))`,
        { x, y, intercept, lags, fitdf: fitdf ?? 0, kind: kind ?? 'studentised' },
      );
      const { jarqueBera: jb, breuschPagan: bp } = found;
      expect(bp.kind).toBe(kind ?? 'studentised');
      expectClose(
        {
          lag1: [found.lag1],
          nEff: [found.nEff],
          durbinWatson: [found.durbinWatson],
          lb: [found.ljungBox.statistic, found.ljungBox.df, found.ljungBox.p],
          bg: [found.breuschGodfrey.statistic, found.breuschGodfrey.df, found.breuschGodfrey.p],
          jb: [jb.statistic, jb.df, jb.p, jb.skewness, jb.kurtosis],
          bp: [bp.statistic, bp.df, bp.p],
        },
        reference,
        near,
      );
      const exact = await r.numbers('dw_test(x, y, intercept)', { x, y, intercept });
      const { p = NaN } = found.durbinWatsonTest ?? {};
      expectClose([p], exact['p'], { rel: 1e-7, abs: 1e-10, why: 'R’s integrate works to an absolute error' });
    }
  });

  it('has no exact Durbin–Watson p beyond 400 rows, and says so', () => {
    const long = Array.from({ length: 401 }, (_, t) => t);
    const wild = long.map((t) => Math.sin(t * t));
    const at = (n: number) => residualTests({ x: long.slice(0, n), y: wild.slice(0, n), intercept: true, lags: 2 });
    expect(at(401).durbinWatsonTest).toBeNull();
    expect(at(401).caveats.map(({ code }) => code)).toEqual(['no-exact-p']);
    expect(at(400).durbinWatsonTest?.bounds5Percent.lower).toBeGreaterThan(1.8);
  });

  it('takes several predictors', () => {
    const two = [x, years.map((year) => (year - 1985) ** 2)];
    expect(residualTests({ x: two, y, intercept: true, lags: 2 }).durbinWatson).toBeGreaterThan(
      residualTests({ x, y, intercept: true, lags: 2 }).durbinWatson,
    );
  });

  it('says what bears on the figures', () => {
    const codes = (intercept: boolean, lags: number) =>
      residualTests({ x, y, intercept, lags }).caveats.map(({ code }) => code);
    expect(codes(true, 4)).toEqual([]);
    expect(codes(false, 20)).toEqual(['no-intercept', 'lags-against-length']);
  });

  it('closes gaps up, and says so', () => {
    const codes = (given: number[]) =>
      residualTests({ x, y, intercept: true, lags: 4, years: given }).caveats.map(({ code }) => code);
    expect(codes(years.map((_, t) => 1900 + t))).toEqual([]);
    expect(codes(years)).toEqual(['gaps-closed-up']);
  });

  it('refuses an exact fit', () => {
    expect(() => residualTests({ x, y: x.map((value) => 3 * value), intercept: false, lags: 1 })).toThrow(
      'an exact fit',
    );
  });
});
