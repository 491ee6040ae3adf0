import { describe, expect, it } from 'vitest';
import { noaaGlobalTempAnnual, noaaGlobalTempMonthly } from './fixtures/layouts.ts';
import { offered, preview, steps, valuesOf } from './fixtures/preview.ts';

const annualName = 'aravg.ann.land_ocean.90S.90N.v5.0.0.199207.asc';

describe('noaaGlobalTemp', () => {
  it('reads anomalies in K with the root of the total variance as limits', () => {
    const found = preview(noaaGlobalTempAnnual, {}, annualName);
    expect(found.reader.id).toBe('noaa-global-temp');
    expect(offered(found, 'anomaly')).toMatchObject({
      suggestedName: 'noaaglobaltemp-annual',
      quantity: 'temperature-anomaly',
      unit: 'K',
      unitFrom: 'provider',
      baseline: { start: 1971, end: 2000 },
      baselineFrom: 'provider',
    });
    expect(steps(valuesOf(noaaGlobalTempAnnual, 'anomaly'))).toEqual(['1990: -0.25', '1991: -0.125', '1992: 0.5']);
    const { lower, upper, boundsLevelPercent } = valuesOf(noaaGlobalTempAnnual, 'anomaly');
    expect(boundsLevelPercent).toBe(68.27);
    expect(lower?.[0]).toBeCloseTo(-0.35, 12);
    expect(upper?.[0]).toBeCloseTo(-0.15, 12);
  });

  it('finds a part year by the file name and by a variance beyond the sum of its parts', () => {
    expect(offered(preview(noaaGlobalTempAnnual, {}, annualName), 'anomaly').partialYears).toEqual([
      {
        year: 1992,
        note: 'by its name the file ends in month 7; its total variance is more than the sum of its parts',
      },
    ]);
    const whole = noaaGlobalTempAnnual.replace('0.090000', '0.010000');
    expect(offered(preview(whole, {}, annualName.replace('199207', '199212')), 'anomaly').partialYears).toEqual([]);
    expect(offered(preview(whole, {}, annualName), 'anomaly').partialYears[0]?.year).toBe(1992);
  });

  it('is recognised by its variances under any name; the base period is then open', () => {
    const found = preview(noaaGlobalTempAnnual, {}, 'download.txt');
    expect(found.reader.id).toBe('noaa-global-temp');
    expect(offered(found, 'anomaly')).toMatchObject({ baseline: null, baselineFrom: 'unknown' });
    expect(preview(noaaGlobalTempAnnual.replaceAll('0.008000', '0.050000'), {}, 'download.txt').reader.id).toBe(
      'delimited',
    );
  });

  it('reads months, with -999 for missing anomalies and variances', () => {
    const name = 'aravg.mon.ocean.60S.60N.v6.0.0.199003.asc';
    const found = preview(noaaGlobalTempMonthly, {}, name);
    expect(offered(found, 'anomaly')).toMatchObject({
      suggestedName: 'noaaglobaltemp-ocean-60s-60n-monthly',
      baseline: { start: 1991, end: 2020 },
      nPresent: 2,
      nMissing: 1,
      partialYears: [{ year: 1990, note: '2 of 12 months have a value' }],
    });
    const values = valuesOf(noaaGlobalTempMonthly, 'anomaly', { readerId: 'noaa-global-temp' });
    expect(values.values).toEqual([-0.25, 0.125, null]);
    expect(values.lower?.slice(1)).toEqual([null, null]);
  });
});
