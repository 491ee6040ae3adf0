import { readFileSync } from 'node:fs';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { compareEstimators } from '../../../src-main/climate/estimators/compare-estimators.ts';
import type { ClaimDraft } from '../../../src-main/contract/claim.ts';
import type { EstimatorComparison, EstimatorId } from '../../../src-main/contract/estimator-comparison.ts';
import { computationOf, logRegressionProcedure, realCo2, realTemperature } from '../../helpers/claim-computation.ts';
import { expectClose } from '../../helpers/close.ts';
import { startR, type RNumbers, type RSession } from '../../helpers/r-session.ts';
import { testCore, type TestCore } from '../../helpers/test-core.ts';

// Level B: base R on the same rows of the real record, beside this file and beside the tests of the single estimators.

let r: RSession;
let test: TestCore;
beforeAll(async () => {
  const beside = (name: string) => new URL(name, import.meta.url);
  const statistics = [
    'gls-ar1.R',
    'prais-winsten.R',
    'cochrane-orcutt.R',
    'gls-arma11.R',
    'huber.R',
    'theil-sen.R',
    'newey-west.R',
  ];
  r = await startR(beside('compare-estimators.R'), ...statistics.map((name) => beside(`../statistics/${name}`)));
  test = await testCore();
  await test.ask('project.create', { title: 'Real record' });
  for (const fileName of ['co2-concentration.csv', 'global-temp.csv']) {
    const file = new URL(`../../../node_modules/vega-datasets/data/${fileName}`, import.meta.url);
    const bytes = readFileSync(file).toString('base64');
    const preview = await test.ask('data.preview', { fileName, bytes, options: {} });
    const choices = preview.series.filter(({ isMain }) => isMain).map(({ key }) => ({ key }));
    await test.ask('data.import', { fileName, bytes, options: {}, choices, leaveOutBadRows: false });
  }
});
afterAll(async () => {
  r.close();
  await test.end();
});

const near = { rel: 1e-6, abs: 1e-9, why: 'R finds ρ by the height of the likelihood, which is flat at its top' };

/** Those that `estimators_in_r` gives at once. The block bootstrap is held against R beside its own function. */
const inOneCall: EstimatorId[] = [
  'ols-classical',
  'ols-hc3',
  'ols-newey-west',
  'ols-newey-west-1994',
  'ols-free-intercept',
  'gls-ar1-ml',
  'gls-ar1-reml',
  'prais-winsten',
  'cochrane-orcutt',
  'theil-sen',
  'huber',
];

/** Each estimate as R lists it: number, error, interval, first parameter; in the unit of the slope. */
function figures({ estimates }: EstimatorComparison, factor: number, ids = inOneCall): RNumbers {
  return Object.fromEntries(
    estimates
      .filter(({ id }) => ids.includes(id))
      .map(({ id, value, standardError, interval95, parameters }) => [
        id,
        [
          ...[value, standardError, interval95?.low, interval95?.high]
            .filter((figure) => figure !== null && figure !== undefined)
            .map((figure) => figure / factor),
          ...parameters.slice(0, 1).map((parameter) => parameter.value),
        ],
      ]),
  );
}

async function compared(draft: Partial<ClaimDraft['statement']>, procedure: NonNullable<ClaimDraft['procedure']>) {
  const statement = { words: 'for the test', quantity: 'apparent-sensitivity', value: '1.9', unit: 'K per doubling' };
  const { claim } = await test.ask('claim.create', {
    title: 'for the test',
    statement: { ...statement, ...draft } as ClaimDraft['statement'],
    procedure,
  });
  const { recomputation } = await test.ask('claim.recompute', { claimId: claim.id });
  const { estimators } = await test.ask('claim.compareEstimators', { claimId: claim.id });
  if (!estimators || !recomputation?.answer.fit) throw new Error('nothing was computed');
  return { comparison: estimators.answer, fit: recomputation.answer.fit };
}

describe('the number under every estimator, against R', () => {
  it.each([
    { intercept: false, lag: 3, small: false },
    { intercept: true, lag: 6, small: true },
  ])('log-regression, intercept $intercept, lag $lag', async ({ intercept, lag, small }) => {
    const { series } = await test.ask('project.view', {});
    const { comparison, fit } = await compared(
      {},
      {
        kind: 'log-regression',
        temperatureSeriesId: series.find(({ quantity }) => quantity === 'temperature-anomaly')?.id ?? 0,
        co2SeriesId: series.find(({ quantity }) => quantity === 'co2')?.id ?? 0,
        window: { start: 1959, end: 2016 },
        intercept,
        covariance: { kind: 'newey-west', lag, smallSample: small },
      },
    );
    const reference = await r.numbers('estimators_in_r(x, y, intercept, lag, small, times)', {
      x: fit.x,
      y: fit.y,
      intercept,
      lag,
      small,
      times: fit.years,
    });
    if (intercept) delete reference['ols-free-intercept'];
    expectClose(figures(comparison, Math.LN2), reference, near);
    await expectArma11(comparison, fit, intercept);
    expect(comparison.estimates.filter(({ isOwn }) => isOwn).map(({ id }) => id)).toEqual(['ols-newey-west']);
    expect(comparison.notComputed.map(({ ids }) => ids)).toEqual([['york', 'york-scaled']]);
  });

  it('trend per decade, lag by the rule of thumb', async () => {
    const { series } = await test.ask('project.view', {});
    const { comparison, fit } = await compared(
      { quantity: 'trend', unit: 'K per decade', value: '0.17' },
      {
        kind: 'trend',
        seriesId: series.find(({ quantity }) => quantity === 'temperature-anomaly')?.id ?? 0,
        window: { start: 1970, end: 2016 },
      },
    );
    // floor(4 (47/100)^(2/9)) = 3
    const variables = { x: fit.x, y: fit.y, intercept: true, lag: 3, small: false, times: fit.years };
    const reference = await r.numbers('estimators_in_r(x, y, intercept, lag, small, times)', variables);
    delete reference['ols-free-intercept'];
    expectClose(figures(comparison, 10), reference, near);
  });

  it('York, with the real temperatures and invented limits', async () => {
    const temperature = realTemperature();
    const halfWidths = temperature.values.years.map((_, row) => 0.05 + 0.02 * Math.sin(row));
    const limits = (sign: number) =>
      temperature.values.values.map((value, row) => (value ?? NaN) + sign * (halfWidths[row] ?? NaN));
    for (const [levelPercent, perSd] of [
      [95, 1.959964],
      [90, 1.644854],
    ] as const) {
      const values = { ...temperature.values, lower: limits(-1), upper: limits(1), boundsLevelPercent: levelPercent };
      const comparison = compareEstimators(
        computationOf(
          { ...logRegressionProcedure, window: { start: 1960, end: 2010 }, intercept: true },
          { temperatureSeriesId: { ...temperature, values }, co2SeriesId: realCo2() },
        ),
      );
      const { years, x, y } = rowsOf(comparison.window);
      const sy = years.map((year) => (halfWidths[values.years.indexOf(year)] ?? NaN) / perSd);
      const reference = await r.numbers('york_in_r(x, y, sy)', { x, y, sy });
      const { york = [], 'york-scaled': scaled = [] } = figures(comparison, Math.LN2, ['york', 'york-scaled']);
      expectClose({ york, 'york-scaled': scaled }, reference, { ...near, why: 'z to seven digits' });
    }
  });
});

/** ARMA(1,1) by R's dense covariance matrix at the same φ and θ; that they are the best is tested beside `glsArma11`. */
async function expectArma11(
  comparison: EstimatorComparison,
  { x, y, years }: { x: number[]; y: number[]; years: number[] },
  intercept: boolean,
): Promise<void> {
  const found = comparison.estimates.find(({ id }) => id === 'gls-arma11');
  const [phi = NaN, theta = NaN, sigma = NaN] = found?.parameters.map(({ value }) => value) ?? [];
  const reference = await r.numbers(
    `fit <- gls_arma11_at(x, y, intercept, phi, theta, times)
     place <- if (intercept) 2 else 1
     list(slope = slope_of(fit$coefficients[place], fit$standardErrors[place], length(y) - place), sigma = fit$sigma)`,
    { x, y, intercept, phi, theta, times: years },
  );
  const slope = [found?.value, found?.standardError, found?.interval95?.low, found?.interval95?.high];
  expectClose({ slope: slope.map((figure) => (figure ?? NaN) / Math.LN2), sigma: [sigma] }, reference, {
    ...near,
    why: 'two programs at the same φ and θ',
  });
}

/** x and y of the real record in its complete years, put together by hand. */
function rowsOf({ start, end }: { start: number; end: number }) {
  const co2 = realCo2().values;
  const temperature = realTemperature().values;
  const rows = Array.from({ length: end - start + 1 }, (_, row) => start + row)
    .map((year) => ({
      year,
      months: co2.values.filter((_, row) => co2.years[row] === year),
      anomaly: temperature.values[temperature.years.indexOf(year)] ?? NaN,
    }))
    .filter(({ months }) => months.length === 12);
  const annual = rows.map(({ months }) => months.reduce<number>((total, value) => total + (value ?? NaN), 0) / 12);
  return {
    years: rows.map(({ year }) => year),
    x: annual.map((value) => Math.log(value / (annual[0] ?? NaN))),
    y: rows.map(({ anomaly }) => anomaly - (rows[0]?.anomaly ?? NaN)),
  };
}
