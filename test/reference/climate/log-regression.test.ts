import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { LogRegressionProcedure } from '../../../src-main/contract/procedure.ts';
import { alignForLogRegression } from '../../../src-main/climate/procedures/align-for-log-regression.ts';
import { fitLogRegression } from '../../../src-main/climate/procedures/fit-log-regression.ts';
import { recompute } from '../../../src-main/climate/procedures/recompute.ts';
import {
  annualSeries,
  computationOf,
  logRegressionProcedure,
  realCo2,
  realTemperature,
} from '../../helpers/claim-computation.ts';
import { expectClose } from '../../helpers/close.ts';
import { startR, type RSession } from '../../helpers/r-session.ts';

// Level B: R (as WebAssembly) joins and fits the same two published records; its functions are in log-regression.R.

let r: RSession;
beforeAll(async () => {
  r = await startR(new URL('./log-regression.R', import.meta.url));
});
afterAll(() => r.close());

const co2 = realCo2();
const temperature = realTemperature();
const sameFits = { rel: 1e-10, abs: 0, why: 'two QR fits of well-conditioned data, about 60 rows' };
const sameRows = { rel: 0, abs: 1e-14, why: 'the same means and logarithms, rounded differently in the last place' };

interface Case {
  name: string;
  change: Partial<LogRegressionProcedure>;
  span: [number, number];
  lag: number;
  small: boolean;
}
const cases: Case[] = [
  { name: 'all common years, through the first year', change: {}, span: [1959, 2019], lag: 3, small: false },
  { name: 'with an intercept', change: { intercept: true }, span: [1959, 2019], lag: 3, small: false },
  {
    name: 'a window, anchored to ten years, Newey–West 5 with the small-sample factor',
    change: {
      window: { start: 1970, end: 2010 },
      anchor: { kind: 'mean-of-first', years: 10 },
      covariance: { kind: 'newey-west', lag: 5, smallSample: true },
    },
    span: [1970, 2010],
    lag: 5,
    small: true,
  },
  {
    name: 'incomplete years allowed, with an intercept, anchored to three years',
    change: { minMonths: 4, intercept: true, anchor: { kind: 'mean-of-first', years: 3 } },
    span: [1958, 2020],
    lag: 3,
    small: false,
  },
];

describe('log-regression against R', () => {
  for (const { name, change, span, lag, small } of cases) {
    it(`gives the slope, errors and diagnostics of lm: ${name}`, async () => {
      const procedure: LogRegressionProcedure = { ...logRegressionProcedure, ...change };
      const computation = computationOf(procedure, { co2SeriesId: co2, temperatureSeriesId: temperature });
      const fromR = await r.numbers(
        'log_regression(monthYear, co2, year, temperature, minMonths, start, end, nAnchor, intercept, lag, small)',
        {
          monthYear: co2.values.years,
          co2: co2.values.values as number[],
          year: temperature.values.years,
          temperature: temperature.values.values as number[],
          minMonths: procedure.minMonths,
          start: span[0],
          end: span[1],
          nAnchor: procedure.anchor.kind === 'first-year' ? 1 : procedure.anchor.years,
          intercept: procedure.intercept,
          lag,
          small,
        },
      );
      const { fit, value, standardError, interval } = recompute(computation);
      if (!fit) throw new Error('expected a fit');
      const { x, y, years, ...lineOfR } = fromR;

      expect(fit.years).toEqual(years);
      expect(fit.years.slice(0, 1).concat(fit.years.slice(-1))).toEqual(span);
      expectClose(fit.x, x, sameRows, 'x');
      expectClose(fit.y, y, sameRows, 'y');

      // R lists classical errors first, Newey–West second; the procedure's own come first here.
      const slopes = procedure.covariance.kind === 'classical' ? fit.slopes : [...fit.slopes].reverse();
      const { diagnostics } = fit;
      expectClose(
        {
          slope: [fit.slopes[0]?.value],
          intercept: fit.intercept ? [fit.intercept.value] : [],
          standardErrors: slopes.map((slope) => slope.standardError),
          low: slopes.map((slope) => slope.interval95.low),
          high: slopes.map((slope) => slope.interval95.high),
          rSquaredCentred: [diagnostics.rSquaredCentred],
          rSquaredUncentred: [diagnostics.rSquaredUncentred],
          correlation: [diagnostics.correlation],
          durbinWatson: [diagnostics.durbinWatson],
          lag1: [diagnostics.lag1Autocorrelation],
          sigma: [diagnostics.residualStandardDeviation],
          nObs: [diagnostics.nObs],
        },
        lineOfR,
        sameFits,
      );

      const own = procedure.covariance.kind === 'classical' ? 0 : 1;
      const perDoubling = { rel: 1e-10, abs: 0, why: 'the same slope times ln 2' };
      expectClose(value, lineOfR['slope']![0]! * Math.LN2, perDoubling, 'value');
      expectClose(standardError, lineOfR['standardErrors']![own]! * Math.LN2, perDoubling, 'standard error');
      expectClose(interval?.low, lineOfR['low']![own]! * Math.LN2, perDoubling, 'low');
      expectClose(interval?.high, lineOfR['high']![own]! * Math.LN2, perDoubling, 'high');

      const again = fitLogRegression(alignForLogRegression(computation, procedure), procedure);
      expect(again.slope).toBe(fit.slopes[0]?.value);
      expect(again.slopeStandardError).toBe(fit.slopes[0]?.standardError);
    });
  }
});

// Level A: NIST StRD NoInt1 (eleven points on y = x + 70), certified slope 2.07438016528926 with standard error
// 0.0165289256198347 on 10 degrees of freedom, R² 0.999365492298663 (uncentred). Here as CO2 and temperature: a row at
// the anchor comes first, which adds a degree of freedom and nothing else to a line through zero.
describe('log-regression on NIST NoInt1', () => {
  const x = [0, 60, 61, 62, 63, 64, 65, 66, 67, 68, 69, 70];
  const y = [0, 130, 131, 132, 133, 134, 135, 136, 137, 138, 139, 140];
  const years = x.map((_, row) => 1900 + row);
  const scale = 100;
  const series = {
    co2SeriesId: annualSeries(
      'co2',
      'co2',
      'ppm',
      years,
      x.map((value) => 280 * Math.exp(value / scale)),
    ),
    temperatureSeriesId: annualSeries(
      'temperature',
      'temperature-anomaly',
      'K',
      years,
      y.map((value) => value - 3),
    ),
  };

  it('gives the certified slope, error and uncentred R²; the centred R² is nothing like it', () => {
    const { fit, caveats } = recompute(computationOf(logRegressionProcedure, series));
    const certified = { rel: 1e-12, abs: 0, why: '15 certified digits; x passes through exp and ln' };
    expectClose(fit?.slopes[0]?.value, 2.07438016528926 * scale, certified, 'slope');
    expectClose(
      fit?.slopes[0]?.standardError,
      0.0165289256198347 * scale * Math.sqrt(10 / 11),
      certified,
      'standard error',
    );
    expectClose(fit?.diagnostics.rSquaredUncentred, 0.999365492298663, certified, 'uncentred R²');
    // By hand: RSS = 127.272727… (certified sd² × 10), Σ(y − ȳ)² = Σy² − 12 ȳ² = 200585 − 1485²/12.
    const residualSum = 3.56753034006338 ** 2 * 10;
    expectClose(
      fit?.diagnostics.rSquaredCentred,
      1 - residualSum / (200_585 - 1485 ** 2 / 12),
      certified,
      'centred R²',
    );
    expect(caveats.map(({ code }) => code)).toContain('no-intercept');
  });

  it('finds the line that the points lie on once the first row is left out and an intercept allowed', () => {
    const procedure = { ...logRegressionProcedure, window: { start: 1901, end: 1911 }, intercept: true };
    const { fit } = recompute(computationOf(procedure, series));
    const exact = { rel: 1e-12, abs: 1e-11, why: 'an exact line, x through exp and ln' };
    expectClose(fit?.slopes[0]?.value, scale, exact, 'slope');
    expectClose(fit?.intercept?.value, 0, exact, 'intercept');
  });
});
