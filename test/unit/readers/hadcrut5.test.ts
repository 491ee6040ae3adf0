import { describe, expect, it } from 'vitest';
import { hadcrutAnnual, hadcrutMonthly } from './fixtures/layouts.ts';
import { offered, preview, steps, valuesOf } from './fixtures/preview.ts';

describe('hadcrut5', () => {
  it('reads annual values with the provider’s 95 % limits, in K against 1961–1990', () => {
    const file = hadcrutAnnual(0.1);
    const found = preview(file, {}, 'HadCRUT.5.0.9.0.analysis.summary_series.global.annual.csv');
    expect(found.reader.id).toBe('hadcrut5');
    expect(offered(found, 'anomaly')).toMatchObject({
      suggestedName: 'hadcrut5-annual',
      quantity: 'temperature-anomaly',
      unit: 'K',
      unitFrom: 'file',
      baseline: { start: 1961, end: 1990 },
      baselineFrom: 'provider',
      step: 'year',
      startYear: 1990,
      endYear: 2002,
      isMain: true,
    });
    const values = valuesOf(file, 'anomaly');
    expect(values.boundsLevelPercent).toBe(95);
    expect([values.lower?.[0], values.values[0], values.upper?.[0]]).toEqual([0.15, 0.25, 0.35]);
  });

  it('takes a last year with much wider limits as a part year, with the reason', () => {
    const found = preview(hadcrutAnnual(0.4));
    expect(offered(found, 'anomaly').partialYears).toEqual([
      {
        year: 2002,
        note: 'probably a part year: its limits are 4.0 times as wide as the widest of the 10 years before; the file itself does not say',
      },
    ]);
    expect(found.notes.join('\n')).toContain('2002, the last year, is probably a part year');
  });

  it('says that nothing speaks for a part year where the limits are like the others', () => {
    const found = preview(hadcrutAnnual(0.11));
    expect(offered(found, 'anomaly').partialYears).toEqual([]);
    expect(found.notes.join('\n')).toContain('no mark for a part year');
  });

  it('reads months, powers of ten among them, and lists years covered in part', () => {
    const found = preview(hadcrutMonthly);
    expect(steps(valuesOf(hadcrutMonthly, 'anomaly'))).toEqual([
      '2001-11: 0.41',
      '2001-12: -0.0000885525',
      '2002-01: 0.52',
    ]);
    expect(offered(found, 'anomaly')).toMatchObject({
      suggestedName: 'hadcrut5-monthly',
      partialYears: [
        { year: 2001, note: '2 of 12 months have a value' },
        { year: 2002, note: '1 of 12 months have a value' },
      ],
    });
  });

  it('keeps not infilled and regional series apart by the file name', () => {
    const name = 'HadCRUT.5.0.9.0.summary_series.northern_hemisphere.annual.csv';
    expect(preview(hadcrutAnnual(0.1), {}, name).series[0]?.suggestedName).toBe('hadcrut5-northern-hemisphere-annual');
    const other = 'HadCRUT.5.0.9.0.analysis.non_infilled.global.annual.csv';
    expect(preview(hadcrutAnnual(0.1), {}, other).series[0]?.label).toContain('not infilled');
  });
});
