import { describe, expect, it } from 'vitest';
import { recompute } from '../../../src-main/climate/procedures/recompute.ts';
import type { LogRegressionProcedure, TrendProcedure } from '../../../src-main/contract/procedure.ts';
import { claimSweep as claimSweepAnswer } from '../../../src-main/contract/result.ts';
import { claimSweep } from '../../../src-main/robustness/claim-sweep.ts';
import { quantile } from '../../../src-main/statistics/quantile.ts';
import { annualSeries, computationOf } from '../../helpers/claim-computation.ts';
import { expectClose } from '../../helpers/close.ts';
import { ar1Noise, inventedCo2, logRegressionClaim } from '../../helpers/log-regression-claim.ts';

const sameFit = { rel: 1e-10, abs: 1e-14, why: 'closed form against a pivoted QR on the same rows' };
const { years, co2Ppm, x } = inventedCo2(36);
const noise = ar1Noise(36, { sd: 0.1, carryOver: 0.3, seed: 53 });
const temperatureK = x.map((value, row) => 2.7 * value + (noise[row] ?? 0));
const window = { start: 1953, end: 1980 };

const logClaim = (procedure: Partial<LogRegressionProcedure>, statement = {}) =>
  logRegressionClaim({ years, co2Ppm, temperatureK, procedure: { window, ...procedure }, statement });
const trendClaim = (procedure: Partial<TrendProcedure>, unit: 'K per decade' | 'K per year', value: string) =>
  computationOf(
    {
      kind: 'trend',
      seriesId: 1,
      minMonths: 12,
      window,
      covariance: { kind: 'classical' },
      per: 'decade',
      ...procedure,
    },
    {
      seriesId: annualSeries(
        'air',
        'temperature',
        '°F',
        years,
        temperatureK.map((kelvin) => 1.8 * kelvin),
      ),
    },
    { quantity: 'trend', unit, value, bound: 'equals' },
  );

describe('claimSweep', () => {
  it.each([
    ['line through the first year', logClaim({}), Math.LN2],
    [
      'line with intercept, from a mean, in °F, Newey–West',
      logClaim(
        {
          intercept: true,
          anchor: { kind: 'mean-of-first', years: 5 },
          covariance: { kind: 'newey-west', lag: 2, smallSample: true },
        },
        { unit: '°F per doubling' },
      ),
      1.8 * Math.LN2,
    ],
    ['slope itself', logClaim({ conversion: 'per-e-folding' }, { unit: 'K per e-folding' }), 1],
    ['trend per decade', trendClaim({}, 'K per decade', '0.1'), 10],
    [
      'trend per year',
      trendClaim({ per: 'year', covariance: { kind: 'newey-west', lag: 3, smallSample: false } }, 'K per year', '0.01'),
      1,
    ],
  ])('%s: each window is the recomputation of that window', (_, claim, factor) => {
    const sweep = claimSweep({ ...claim, minYears: 22 });
    expect(sweep.windows).toHaveLength(120);
    expectClose(sweep.factor, factor, { rel: 1e-15, abs: 0, why: 'one product' });
    for (const { start, end, slope, standardError } of sweep.windows) {
      const own = recompute({
        ...claim,
        procedure: { ...claim.procedure, window: { start, end } } as typeof claim.procedure,
      });
      expectClose(
        { value: slope * factor, standardError: standardError * factor },
        { value: own.value, standardError: own.standardError },
        sameFit,
      );
    }
    expect(sweep.unit).toBe(claim.statement.unit);
    expect(claimSweepAnswer.parse(JSON.parse(JSON.stringify(sweep)))).toEqual(sweep);
  });

  it('tells where the stated window and the stated number stand among the windows', () => {
    const claim = logClaim({});
    const { windows, stated, valueQuantiles, shareAtOrBelowStated } = claimSweep({ ...claim, minYears: 22 });
    const numbers = windows.map(({ slope }) => slope * Math.LN2);
    const own = numbers[windows.findIndex(({ start, end }) => start === 1953 && end === 1980)] ?? NaN;
    expect(stated.window).toEqual(window);
    expectClose(stated.value, own, sameFit);
    expect(stated.percentile).toBe((100 * numbers.filter((number) => number <= own).length) / 120);
    expect(shareAtOrBelowStated).toBe(numbers.filter((number) => number <= 1.9).length / 120);
    expect(shareAtOrBelowStated).toBeGreaterThan(0);
    expect(shareAtOrBelowStated).toBeLessThan(1);
    expect(valueQuantiles.q05).toBe(quantile(numbers, 0.05));
    expect(valueQuantiles.max).toBe(Math.max(...numbers));
  });

  it('places a stated window that is shorter than those swept', () => {
    const short = logClaim({ window: { start: 1953, end: 1962 } });
    const { windows, stated } = claimSweep({ ...short, minYears: 22 });
    const below = windows.filter(({ slope }) => slope * Math.LN2 <= stated.value).length;
    expect(stated.percentile).toBe((100 * below) / 120);
  });

  it('refuses a ratio', () => {
    const part = (value: string) => ({ value, unit: '' });
    const ratio = computationOf(
      { kind: 'ratio', numerator: part('4'), denominator: part('2') },
      {},
      { unit: '1', quantity: 'ratio' },
    );
    expect(() => claimSweep({ ...ratio, minYears: 20 })).toThrow(/no start and end year to sweep/);
  });

  it.each([
    [{}, 37, 'window sweep, shortest window: expected at most the 36 years that all series have, but found 37'],
    [
      { anchor: { kind: 'mean-of-first', years: 9 } },
      8,
      'window sweep, years that the anchor is the mean of: expected no more years than the shortest window has, 8',
    ],
    [
      { covariance: { kind: 'newey-west', lag: 8, smallSample: false } },
      8,
      'window sweep, lag of the Newey–West errors: expected a lag below the years of the shortest window, 8',
    ],
  ] satisfies [Partial<LogRegressionProcedure>, number, string][])(
    'refuses %j in windows of %d years, in words',
    (procedure, minYears, words) => {
      expect(() => claimSweep({ ...logClaim(procedure), minYears })).toThrow(words);
      if (minYears < 36)
        expect(claimSweep({ ...logClaim(procedure), minYears: minYears + 1 }).minYears).toBe(minYears + 1);
    },
  );
});
