import { describe, expect, it } from 'vitest';
import { anchorRows } from '../../../../src-main/climate/procedures/anchor-rows.ts';
import { fitLogRegression } from '../../../../src-main/climate/procedures/fit-log-regression.ts';
import { logRegression } from '../../../../src-main/climate/procedures/log-regression.ts';
import { recompute } from '../../../../src-main/climate/procedures/recompute.ts';
import { slopeConversion } from '../../../../src-main/climate/procedures/slope-conversion.ts';
import { covarianceWords, slopeEstimates } from '../../../../src-main/climate/procedures/slope-estimates.ts';
import { unitCaveats } from '../../../../src-main/climate/procedures/unit-caveats.ts';
import type { Statement } from '../../../../src-main/contract/claim.ts';
import type { LogRegressionProcedure } from '../../../../src-main/contract/procedure.ts';
import { recomputation } from '../../../../src-main/contract/result.ts';
import { annualSeries, computationOf, logRegressionProcedure } from '../../../helpers/claim-computation.ts';

// Invented: CO2 rising by 0.6 % a year, warming 2.5 K per e-folding with a slow swing around it.
const years = Array.from({ length: 60 }, (_, row) => 1960 + row);
const co2Ppm = years.map((_, row) => 317 * 1.006 ** row);
const swing = years.map((_, row) => 0.1 * Math.sin(row / 4));
const temperatureK = co2Ppm.map((value, row) => 2.5 * Math.log(value / 317) - 0.3 + swing[row]!);
const series = {
  co2SeriesId: annualSeries('co2', 'co2', 'ppm', years, co2Ppm),
  temperatureSeriesId: annualSeries('temperature', 'temperature-anomaly', '°C', years, temperatureK),
};
const run = (change: Partial<LogRegressionProcedure> = {}, statement: Partial<Statement> = {}, given = series) =>
  recompute(computationOf({ ...logRegressionProcedure, ...change }, given, statement));
const codes = (answer: ReturnType<typeof run>): string[] => answer.caveats.map(({ code }) => code);

describe('logRegression', () => {
  it('answers by the contract', () => {
    for (const intercept of [true, false]) expect(recomputation.parse(run({ intercept }))).toEqual(run({ intercept }));
    expect(run()).toEqual(logRegression(computationOf(logRegressionProcedure, series), logRegressionProcedure));
  });

  it('finds the slope of an exact law and turns it into K per doubling: 3 K from T = 3 log2(C/C0)', () => {
    const exact = annualSeries(
      't',
      'temperature-anomaly',
      'K',
      years,
      co2Ppm.map((value) => 3 * Math.log2(value / 280)),
    );
    for (const intercept of [true, false]) {
      const { value, unit, quantity, fit } = run(
        { intercept },
        { value: '3.0' },
        { ...series, temperatureSeriesId: exact },
      );
      expect(value).toBeCloseTo(3, 12);
      expect([unit, quantity]).toEqual(['K per doubling', 'apparent-sensitivity']);
      expect(fit?.diagnostics.rSquaredCentred).toBeCloseTo(1, 12);
    }
  });

  it('has no diagnostics of residuals where the fit is exact', () => {
    const flat = annualSeries(
      't',
      'temperature-anomaly',
      'K',
      years,
      years.map(() => 0.25),
    );
    const { fit, value } = run({}, {}, { ...series, temperatureSeriesId: flat });
    expect(value).toBe(0);
    expect(fit?.diagnostics).toMatchObject({
      rSquaredCentred: null,
      correlation: null,
      durbinWatson: null,
      lag1Autocorrelation: null,
      effectiveSampleSize: null,
    });
  });

  it('does not depend on the baseline of the temperature, nor on the unit of CO2', () => {
    const { value } = run();
    const shifted = annualSeries(
      't',
      'temperature-anomaly',
      'K',
      years,
      temperatureK.map((t) => t + 14),
    );
    const ppb = annualSeries(
      'c',
      'co2',
      'ppb',
      years,
      co2Ppm.map((c) => c * 1000),
    );
    expect(run({}, {}, { co2SeriesId: ppb, temperatureSeriesId: shifted }).value).toBeCloseTo(value, 12);
  });

  it('converts as the procedure says: per e-folding the slope itself, in °F 1.8 times as much', () => {
    const perDoubling = run().value;
    const perEFolding = run({ conversion: 'per-e-folding' }, { unit: 'K per e-folding' });
    expect(perEFolding.value * Math.LN2).toBeCloseTo(perDoubling, 14);
    expect(perEFolding.unit).toBe('K per e-folding');
    expect(codes(perEFolding)).not.toContain('unit-differs');
    const fahrenheit = run({}, { unit: '°F per doubling' });
    expect(fahrenheit.value).toBeCloseTo(1.8 * perDoubling, 14);
    expect(fahrenheit.interval?.high).toBeCloseTo(1.8 * (run().interval?.high ?? NaN), 14);
    expect(fahrenheit.conversion).toMatch(/K × ln 2 × 1\.8 = .* °F per doubling/);
  });

  it('says when the procedure gives another unit than the statement names', () => {
    const forgotten = run({ conversion: 'per-e-folding' });
    expect(forgotten.unit).toBe('K per e-folding');
    expect(codes(forgotten)).toContain('unit-differs');
  });

  it('refuses a statement in the unit of something else', () => {
    expect(() => run({}, { unit: 'K per decade' })).toThrow(/a statement in K per doubling, K per e-folding or °F/);
    expect(() => run({}, { unit: '1' })).toThrow(/a plain number/);
  });

  it('holds the number against the digits as stated', () => {
    const { value } = run();
    expect(run({}, { value: value.toFixed(2) }).agreement).toMatchObject({ isReproduced: true });
    expect(run({}, { value: (value + 0.3).toFixed(2), bound: 'at most' }).agreement.sentence).toMatch(
      /^Not reproduced.*stays within “at most/,
    );
  });

  it('counts from the anchor, and says from which', () => {
    const { fit } = run({ anchor: { kind: 'mean-of-first', years: 10 } });
    expect(fit?.anchorValues?.years).toEqual({ start: 1960, end: 1969 });
    expect(fit?.anchorValues?.co2Ppm).toBeCloseTo(co2Ppm.slice(0, 10).reduce((a, b) => a + b) / 10, 12);
    expect(run().fit?.anchorValues).toEqual({
      co2Ppm: 317,
      temperatureK: temperatureK[0],
      years: { start: 1960, end: 1960 },
    });
    expect(() => run({ window: { start: 2010, end: 2015 }, anchor: { kind: 'mean-of-first', years: 10 } })).toThrow(
      /anchor: expected at least 10 years to take the anchor from, but found 6/,
    );
  });

  it('carries its doubts: a forced line, its own anchor row, alike neighbours', () => {
    expect(codes(run())).toEqual(expect.arrayContaining(['no-intercept', 'anchor-row', 'autocorrelated-residuals']));
    expect(codes(run({ intercept: true }))).not.toContain('anchor-row');
    const neweyWest = run({ covariance: { kind: 'newey-west', lag: 3, smallSample: false } });
    expect(codes(neweyWest)).not.toContain('autocorrelated-residuals');
  });

  it('needs three years, with and without an intercept', () => {
    for (const intercept of [true, false]) {
      for (const end of [1960, 1961]) {
        expect(() => run({ window: { start: 1960, end }, intercept })).toThrow(/^window: expected at least 3 years/);
      }
      expect(run({ window: { start: 1960, end: 1962 }, intercept }).fit?.years).toHaveLength(3);
    }
  });

  it('needs a lag that finds years to look back to', () => {
    const run6 = (lag: number) =>
      run({ window: { start: 1960, end: 1965 }, covariance: { kind: 'newey-west', lag, smallSample: false } });
    expect(() => run6(6)).toThrow(/lag: expected a lag below the number of years, 6, but found 6/);
    expect(run6(5).standardError).toBeGreaterThan(0);
  });

  it('needs CO2 that changes', () => {
    const still = years.map(() => 316);
    const given = { ...series, co2SeriesId: annualSeries('co2', 'co2', 'ppm', years, still) };
    expect(() => run({}, {}, given)).toThrow(/CO2 that changes over the window, but found 316 ppm in every year/);
  });
});

describe('slopeEstimates', () => {
  const { rows } = anchorRows({ years, co2Ppm, temperatureK }, { kind: 'first-year' });
  const estimate = (covariance: LogRegressionProcedure['covariance']) =>
    slopeEstimates(rows.logRatio, rows.warmingK, { intercept: true, covariance }).slopes;

  it('puts the asked covariance first and the other kind beside it, each with its convention', () => {
    const [classical, neweyWest] = estimate({ kind: 'classical' });
    expect(classical.convention).toBe('classical: independent errors of one variance; t with 58 degrees of freedom');
    // Rule of thumb: floor(4 (60/100)^(2/9)) = 3.
    expect(neweyWest?.convention).toMatch(/lag 3, no prewhitening, without the factor n\/\(n − k\); t with 58/);
    const asked = estimate({ kind: 'newey-west', lag: 5, smallSample: true });
    expect(asked.map(({ convention }) => convention.split(':')[0])).toEqual(['Newey–West', 'classical']);
    expect(asked[0].value).toBe(classical.value);
    expect(asked[1]?.standardError).toBe(classical.standardError);
  });

  it('words a covariance so that another program can be set to it', () => {
    expect(covarianceWords({ kind: 'newey-west', lag: 5, smallSample: true })).toBe(
      'Newey–West: Bartlett weights, lag 5, no prewhitening, with the factor n/(n − k)',
    );
  });
});

describe('fitLogRegression', () => {
  it('refits under another anchor, intercept and covariance, as the recomputation does', () => {
    for (const change of [
      { intercept: true },
      { anchor: { kind: 'mean-of-first', years: 20 } },
      { covariance: { kind: 'newey-west', lag: 4, smallSample: true } },
    ] as const) {
      const procedure = { ...logRegressionProcedure, ...change };
      const { fit } = run(change);
      const refit = fitLogRegression({ years, co2Ppm, temperatureK }, procedure);
      expect(refit.slope).toBe(fit?.slopes[0]?.value);
      expect(refit.slopeStandardError).toBe(fit?.slopes[0]?.standardError);
      expect(refit.slopeInterval95).toMatchObject({
        low: fit?.slopes[0]?.interval95.low,
        high: fit?.slopes[0]?.interval95.high,
      });
      expect(refit.intercept).toEqual(fit?.intercept);
    }
  });
});

describe('slopeConversion', () => {
  // Fact of the trade: 2.71 K per e-folding is 1.88 K per doubling.
  it('turns 2.71 K per e-folding into 1.88 K per doubling', () => {
    const { factor, unit, words } = slopeConversion('per-doubling', 'K per doubling');
    expect(2.71 * factor).toBeCloseTo(1.878, 3);
    expect(unit).toBe('K per doubling');
    expect(words(2.71)).toBe('2.710 K × ln 2 = 1.878 K per doubling');
  });

  it('is 1 per e-folding and ln 2 × 1.8 in Fahrenheit', () => {
    expect(slopeConversion('per-e-folding', 'K per doubling')).toMatchObject({ factor: 1, unit: 'K per e-folding' });
    expect(slopeConversion('per-doubling', '°F per doubling').factor).toBeCloseTo(1.2476649, 7);
    expect(slopeConversion('per-doubling', 'K per e-folding').unit).toBe('K per doubling');
  });
});

describe('unitCaveats', () => {
  it('is silent when the units are the same', () => {
    expect(unitCaveats('K per doubling', 'K per doubling')).toEqual([]);
    expect(unitCaveats('K per year', 'K per decade')[0]?.detail).toMatch(
      /gives K per year, the statement says K per decade/,
    );
  });
});
