import { describe, expect, it } from 'vitest';
import { alignForLogRegression } from '../../../../src-main/climate/procedures/align-for-log-regression.ts';
import { alignWindow } from '../../../../src-main/climate/procedures/align-window.ts';
import { seriesOf } from '../../../../src-main/climate/procedures/series-of.ts';
import {
  annualSeries,
  computationOf,
  logRegressionProcedure,
  monthlySeries,
} from '../../../helpers/claim-computation.ts';

const years = [2000, 2001, 2002, 2003, 2004, 2005];
const temperature = annualSeries('t', 'temperature-anomaly', 'K', years, [0.1, 0.2, null, 0.4, 0.5, 0.6]);
const co2 = annualSeries('c', 'co2', 'ppm', years, [370, 371, 372, 373, 374, 375]);

describe('alignWindow', () => {
  it('uses the years that all series have, and says what a gap does to the diagnostics', () => {
    const { window, years: used, columns, leftOut, caveats } = alignWindow([co2, temperature], 12, null);
    expect(window).toEqual({ start: 2000, end: 2005 });
    expect(used).toEqual([2000, 2001, 2003, 2004, 2005]);
    expect(columns[0]).toEqual([370, 371, 373, 374, 375]);
    expect(leftOut).toEqual([{ year: 2002, reason: 't: value missing' }]);
    expect(caveats).toEqual([{ code: 'gap-in-window', detail: expect.stringContaining('No value in 2002') as string }]);
  });

  it('needs the first and the last year of a window, names what is missing and what there is', () => {
    expect(() => alignWindow([co2, temperature], 12, { start: 2002, end: 2007 })).toThrow(
      /window 2002–2007: expected an annual value.*none in 2002 \(t: value missing\) and none in 2007 \(c covers 2000–2005; t covers 2000–2005\).*2000–2001, 2003–2005/,
    );
    expect(() => alignWindow([co2], 12, { start: 2005, end: 2001 })).toThrow(/a first year that is not after the last/);
  });

  it('has no gap to report in a window without one', () => {
    expect(alignWindow([co2, temperature], 12, { start: 2003, end: 2005 }).caveats).toEqual([]);
  });

  it('warns of a part year that the provider put in, only where it is used', () => {
    const withPart = { ...temperature, partialYears: [{ year: 2005, note: '7 of 12 months have a value' }] };
    expect(alignWindow([withPart], 12, null).caveats).toContainEqual({
      code: 'part-year',
      detail: 't, 2005: 7 of 12 months have a value. Leave the year out of the window, or say why it may stay.',
    });
    expect(alignWindow([withPart], 12, { start: 2000, end: 2004 }).caveats.map(({ code }) => code)).toEqual([
      'gap-in-window',
    ]);
  });

  it('warns of means of incomplete years', () => {
    const months = monthlySeries('m', 'co2', 'ppm', [
      ...Array.from({ length: 12 }, (_, month) => [2000, month + 1, 370] as const),
      ...Array.from({ length: 9 }, (_, month) => [2001, month + 1, 371] as const),
    ]);
    const { caveats, years: used } = alignWindow([months], 9, null);
    expect(used).toEqual([2000, 2001]);
    expect(caveats).toEqual([{ code: 'incomplete-year-means', detail: expect.stringContaining('2001 (9)') as string }]);
    expect(alignWindow([months], 10, null).leftOut).toEqual([
      { year: 2001, reason: 'm: 9 of 12 months present, 10 needed' },
    ]);
  });
});

describe('alignForLogRegression', () => {
  it('brings both series to ppm and K', () => {
    const fahrenheit = { ...annualSeries('f', 'temperature-anomaly', '°F', years, [0, 1.8, 3.6, 5.4, 7.2, 9]) };
    const ppb = annualSeries(
      'c',
      'co2',
      'ppb',
      years,
      years.map((year) => year * 200),
    );
    const aligned = alignForLogRegression(
      computationOf(logRegressionProcedure, { temperatureSeriesId: fahrenheit, co2SeriesId: ppb }),
      logRegressionProcedure,
    );
    aligned.temperatureK.forEach((value, row) => expect(value).toBeCloseTo(row, 12));
    aligned.co2Ppm.forEach((value, row) => expect(value).toBeCloseTo((2000 + row) * 0.2, 12));
  });

  it('refuses a CO2 value that has no logarithm, naming the year', () => {
    const wrong = annualSeries('c', 'co2', 'ppm', years, [370, 371, 372, 373, -99.99, 375]);
    const computation = computationOf(logRegressionProcedure, { temperatureSeriesId: temperature, co2SeriesId: wrong });
    expect(() => alignForLogRegression(computation, logRegressionProcedure)).toThrow(
      /series c, 2004: .*found -99\.99.*missing values/,
    );
  });

  it('refuses series in each other’s place', () => {
    const computation = computationOf(logRegressionProcedure, { temperatureSeriesId: co2, co2SeriesId: temperature });
    expect(() => alignForLogRegression(computation, logRegressionProcedure)).toThrow(/series t: expected a CO2 series/);
  });
});

describe('seriesOf', () => {
  it('says which series a procedure lacks', () => {
    const computation = computationOf(logRegressionProcedure, { co2SeriesId: co2 });
    expect(seriesOf(computation, 'co2SeriesId', 'the CO2 series')).toBe(co2);
    expect(() => seriesOf(computation, 'temperatureSeriesId', 'the temperature series')).toThrow(
      /procedure log-regression: expected the temperature series, but found none/,
    );
  });
});
