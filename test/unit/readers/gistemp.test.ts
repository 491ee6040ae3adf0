import { describe, expect, it } from 'vitest';
import { gistempCsv, gistempText } from './fixtures/layouts.ts';
import { errorOf, offered, preview, steps, valuesOf } from './fixtures/preview.ts';

describe('gistemp, CSV', () => {
  it('offers annual means as main series and monthly means, in K against 1951–1980', () => {
    const found = preview(gistempCsv);
    expect(found.reader.id).toBe('gistemp');
    expect(found.series.map(({ key, isMain, suggestedName }) => [key, isMain, suggestedName])).toEqual([
      ['annual', true, 'gistemp-annual'],
      ['monthly', false, 'gistemp-monthly'],
    ]);
    for (const series of found.series) {
      expect(series).toMatchObject({
        quantity: 'temperature-anomaly',
        unit: 'K',
        unitFrom: 'provider',
        baseline: { start: 1951, end: 1980 },
        baselineFrom: 'provider',
      });
    }
  });

  it('keeps missing months and the missing annual mean of the year that is not over', () => {
    const found = preview(gistempCsv);
    expect(steps(valuesOf(gistempCsv, 'annual'))).toEqual(['1990: 0.02', '1991: -0.19', '1992: null']);
    expect(offered(found, 'annual')).toMatchObject({ nPresent: 2, nMissing: 1, nAbsent: 0 });
    expect(offered(found, 'monthly')).toMatchObject({
      startYear: 1990,
      endYear: 1992,
      nPresent: 31,
      nMissing: 5,
      nAbsent: 0,
    });
    const part = [{ year: 1992, note: '7 of 12 months have a value' }];
    expect(offered(found, 'annual').partialYears).toEqual(part);
    expect(offered(found, 'monthly').partialYears).toEqual(part);
    expect(found.notes.join('\n')).toContain('“***” 6 times');
  });

  it('reads leading-dot decimals month by month', () => {
    const monthly = valuesOf(gistempCsv, 'monthly');
    expect(steps(monthly).slice(0, 4)).toEqual(['1990-01: -0.31', '1990-02: -0.22', '1990-03: 0.03', '1990-04: 0']);
    expect(steps(monthly).slice(-6, -4)).toEqual(['1992-07: 0.07', '1992-08: null']);
  });

  it('names the hemisphere and the land stations by the title', () => {
    const north = preview(gistempCsv.replace('Land-Ocean: Global Means', 'Land-Ocean: Northern Hemispheric Means'));
    expect(offered(north, 'annual').suggestedName).toBe('gistemp-north-annual');
    const stations = preview(gistempCsv.replace('Land-Ocean: Global Means', 'Station: Global Means'));
    expect(offered(stations, 'annual').suggestedName).toBe('gistemp-stations-annual');
  });

  it('lists a damaged row and a repeated header, and does not hide them', () => {
    const lines = gistempCsv.trimEnd().split('\n');
    const damaged = [...lines.slice(0, 3), lines[1], lines[3]?.replace('1991', 'l991'), lines[4]].join('\n');
    expect(preview(damaged).badRows.map(({ line, reason }) => [line, reason])).toEqual([
      [4, 'repeats the header of line 2'],
      [5, '“l991” states no time of the kind the other rows state'],
    ]);
  });

  it('says what it expected when it is told to read another file', () => {
    expect(errorOf('year,temp\n1990,2\n1991,3\n', { readerId: 'gistemp' }).fields.code).toBe('other-format');
  });
});

describe('gistemp, text in 0.01 °C', () => {
  it('divides by 100 and says so', () => {
    const found = preview(gistempText);
    expect(found.reader.id).toBe('gistemp');
    expect(steps(valuesOf(gistempText, 'annual'))).toEqual(['1980: 0.02', '1981: -0.09', '1982: null']);
    expect(steps(valuesOf(gistempText, 'monthly')).slice(24, 28)).toEqual([
      '1982-01: 1.18',
      '1982-02: 1.21',
      '1982-03: 1.2',
      '1982-04: null',
    ]);
    expect(found.notes.join('\n')).toContain('divided by 100');
    expect(offered(found, 'annual').partialYears).toEqual([{ year: 1982, note: '3 of 12 months have a value' }]);
  });

  it('takes repeated headers and remarks for what they are, and notes their lines', () => {
    const found = preview(gistempText);
    expect(found.badRows).toEqual([]);
    expect(found.notes.join('\n')).toContain('lines 9, 13, 14');
  });

  it('still lists a damaged row among the years', () => {
    const damaged = gistempText.replace('1981    18   21', '1981    1x   21');
    expect(preview(damaged).badRows.map(({ line }) => line)).toEqual([10]);
  });
});
