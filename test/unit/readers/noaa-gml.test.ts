import { describe, expect, it } from 'vitest';
import {
  noaaAnnualGlobalCsv,
  noaaAnnualText,
  noaaGlobalMonthly,
  noaaMonthlyCsv,
  noaaMonthlyText,
  noaaSevenColumns,
} from './fixtures/layouts.ts';
import { errorOf, offered, preview, steps, valuesOf } from './fixtures/preview.ts';

describe('noaaGml, monthly text with eight columns', () => {
  it('offers the average as main series, in ppm at Mauna Loa', () => {
    const found = preview(noaaMonthlyText);
    expect(found.reader.id).toBe('noaa-gml');
    expect(found.series.map(({ key, isMain }) => [key, isMain])).toEqual([
      ['average', true],
      ['deseasonalised', false],
    ]);
    expect(offered(found, 'average')).toMatchObject({
      suggestedName: 'co2-mauna-loa-monthly',
      quantity: 'co2',
      unit: 'ppm',
      unitFrom: 'provider',
      step: 'month',
      baseline: null,
      baselineFrom: 'not needed',
      startYear: 1973,
      endYear: 1974,
      nPresent: 6,
      nMissing: 0,
      nAbsent: 4,
    });
  });

  it('reads average and deseasonalised values', () => {
    expect(steps(valuesOf(noaaMonthlyText, 'average'))).toEqual([
      '1973-11: 401.1',
      '1973-12: 401.8',
      '1974-01: 402.5',
      '1974-06: 405.6',
      '1974-07: 403.9',
      '1974-08: 401.7',
    ]);
    expect(valuesOf(noaaMonthlyText, 'deseasonalised').values.at(-1)).toBe(403.1);
  });

  it('has limits of one standard uncertainty, and none where the mean was interpolated', () => {
    const { lower, upper, boundsLevelPercent } = valuesOf(noaaMonthlyText, 'average');
    expect(boundsLevelPercent).toBe(68.27);
    expect(lower).toEqual([null, null, null, 405.6 - 0.15, null, 401.7 - 0.2]);
    expect(upper).toEqual([null, null, null, 405.6 + 0.15, null, 401.7 + 0.2]);
    expect(valuesOf(noaaMonthlyText, 'deseasonalised').boundsLevelPercent).toBeNull();
  });

  it('names interpolated months of its own record, and years covered in part', () => {
    const found = preview(noaaMonthlyText);
    expect(found.notes.join('\n')).toMatch(/Interpolated by the provider.*: 1974-07\./);
    expect(offered(found, 'average').partialYears).toEqual([
      { year: 1973, note: '2 of 12 months have a value' },
      { year: 1974, note: '4 of 12 months have a value' },
    ]);
  });

  it('reads Windows line ends and a byte order mark the same way', () => {
    const windows = `\uFEFF${noaaMonthlyText.replaceAll('\n', '\r\n')}`;
    expect(valuesOf(windows, 'average')).toEqual(valuesOf(noaaMonthlyText, 'average'));
  });
});

describe('noaaGml, other layouts', () => {
  it('reads the monthly CSV', () => {
    const values = valuesOf(noaaMonthlyCsv, 'average');
    expect(steps(values)).toEqual(['1974-06: 405.6', '1974-07: 403.9', '1974-08: 401.7']);
    expect(values.lower).toEqual([405.6 - 0.15, null, 401.7 - 0.2]);
  });

  it('reads seven columns: a missing average stays in its place, and the filled and trend series are offered', () => {
    const found = preview(noaaSevenColumns);
    expect(steps(valuesOf(noaaSevenColumns, 'average'))).toEqual([
      '1961-03: 395.11',
      '1961-04: null',
      '1961-05: 397.3',
    ]);
    expect(offered(found, 'average')).toMatchObject({ nPresent: 2, nMissing: 1, nAbsent: 0, unitFrom: 'file' });
    expect(steps(valuesOf(noaaSevenColumns, 'interpolated'))[1]).toBe('1961-04: 396.2');
    expect(steps(valuesOf(noaaSevenColumns, 'trend'))[1]).toBe('1961-04: 394.1');
    expect(found.notes.join('\n')).toContain('“-99.99” once');
  });

  it('tells the global layout, which has seven columns too, by what they hold', () => {
    const found = preview(noaaGlobalMonthly);
    expect(found.series.map(({ suggestedName }) => suggestedName)).toEqual([
      'co2-global-monthly',
      'co2-global-monthly-trend',
    ]);
    expect(valuesOf(noaaGlobalMonthly, 'trend').lower?.[0]).toBeCloseTo(359.84, 10);
    const text = noaaGlobalMonthly
      .replace(/year.*\n/, '# year month decimal average unc trend unc\n')
      .replaceAll(/^(\d.*)$/gm, (row) => row.replaceAll(',', '  '));
    expect(valuesOf(text, 'average')).toEqual(valuesOf(noaaGlobalMonthly, 'average'));
    expect(valuesOf(text, 'trend')).toEqual(valuesOf(noaaGlobalMonthly, 'trend'));
  });

  it('reads annual text and CSV, Mauna Loa and global', () => {
    const annual = preview(noaaAnnualText);
    expect(offered(annual, 'average')).toMatchObject({
      suggestedName: 'co2-mauna-loa-annual',
      step: 'year',
      startYear: 1959,
      endYear: 1961,
    });
    const values = valuesOf(noaaAnnualText, 'average');
    expect(values).toMatchObject({ months: null, values: [391.1, 391.8, 392.6], boundsLevelPercent: 68.27 });
    expect(values.upper?.[0]).toBe(391.1 + 0.12);
    expect(offered(preview(noaaAnnualGlobalCsv), 'average').suggestedName).toBe('co2-global-annual');
  });

  it('says so when neither comments nor file name tell the station', () => {
    const nowhere = noaaAnnualText.replace(/^.*KEELING.*\n/im, '');
    const found = preview(nowhere, {}, 'co2.txt');
    expect(offered(found, 'average').suggestedName).toBe('co2-annual');
    expect(found.notes.join('\n')).toContain('does not say whether');
    expect(offered(preview(nowhere, {}, 'co2_annmean_gl.txt'), 'average').suggestedName).toBe('co2-global-annual');
  });

  it('does not take methane for CO2', () => {
    const methane = noaaAnnualText
      .replace('CO2 expressed', 'CH4 expressed')
      .replaceAll(/39(\d)\.(\d)0/g, '18$1$2.0')
      .replace('ppm', 'ppb');
    const found = preview(methane);
    expect(offered(found, 'average')).toMatchObject({ quantity: 'other', unit: 'ppb' });
  });

  it('does not take growth rates for mole fractions', () => {
    const growth = noaaAnnualText.replaceAll(/39\d\.(\d)0/g, '2.$1 ');
    const found = preview(growth);
    expect(found.reader.id).toBe('delimited');
    expect(found.series.every(({ quantity }) => quantity !== 'co2')).toBe(true);
  });

  it('lists rows that it cannot read, with line and reason, and keeps the rest', () => {
    const damaged = noaaAnnualText
      .replace('  1960   391.80     0.12', '  1960   39l.80     0.12')
      .replace('  1961   392.60     0.12', '  1961   392.60');
    const found = preview(damaged);
    expect(found.nRows).toBe(1);
    expect(found.badRows).toEqual([
      { line: 7, text: '  1960   39l.80     0.12', reason: 'column average: “39l.80” is not a number' },
      { line: 8, text: '  1961   392.60', reason: 'has 2 cells where the table has 3' },
    ]);
  });

  it('says what it expected when it is told to read another file', () => {
    const { fields } = errorOf('a,b\n1990,2\n1991,3\n', { readerId: 'noaa-gml' });
    expect(fields).toMatchObject({ code: 'other-format', where: 'table.csv, line 1' });
  });
});
