import { readFileSync } from 'node:fs';
import Papa from 'papaparse';
import { describe, expect, it } from 'vitest';
import { offered, preview, steps, valuesOf } from './fixtures/preview.ts';

// Real, open data: npm package vega-datasets 3.2.1. The expectations come from Papa Parse and from reading the file by eye.
const co2 = readFileSync('node_modules/vega-datasets/data/co2-concentration.csv');
const temperature = readFileSync('node_modules/vega-datasets/data/global-temp.csv');

function cells(bytes: Buffer): string[][] {
  return Papa.parse<string[]>(bytes.toString('utf8'), { skipEmptyLines: true }).data.slice(1);
}

describe('vegaTables on the CO2 table', () => {
  it('takes first days for months and offers both columns in ppm', () => {
    const found = preview(co2);
    expect(found.reader.id).toBe('vega-tables');
    expect(found.badRows).toEqual([]);
    expect(offered(found, 'co2')).toMatchObject({
      suggestedName: 'co2-mauna-loa-monthly',
      quantity: 'co2',
      unit: 'ppm',
      unitFrom: 'provider',
      step: 'month',
      isMain: true,
      startYear: 1958,
      endYear: 2020,
      nPresent: 741,
      nMissing: 0,
      nAbsent: 5,
    });
    expect(offered(found, 'adjusted-co2').isMain).toBe(false);
  });

  it('reads every value as an independent parser does', () => {
    const expected = cells(co2).map(([date, value]) => `${date?.slice(0, 7)}: ${Number(value)}`);
    expect(steps(valuesOf(co2, 'co2'))).toEqual(expected);
    expect(valuesOf(co2, 'adjusted-co2').values).toEqual(cells(co2).map((row) => Number(row[2])));
  });

  it('lists the years that it covers in part', () => {
    expect(offered(preview(co2), 'co2').partialYears.map(({ year, note }) => [year, note.slice(0, 2).trim()])).toEqual([
      [1958, '8'],
      [1964, '9'],
      [2020, '4'],
    ]);
  });
});

describe('vegaTables on the temperature table', () => {
  it('reads years in K against 1951–1980, which the values bear out', () => {
    const found = preview(temperature);
    expect(found.reader.id).toBe('vega-tables');
    expect(offered(found, 'temp')).toMatchObject({
      suggestedName: 'gistemp-annual',
      quantity: 'temperature-anomaly',
      unit: 'K',
      unitFrom: 'provider',
      baseline: { start: 1951, end: 1980 },
      startYear: 1880,
      endYear: 2023,
      nPresent: 144,
      nAbsent: 0,
    });
    expect(steps(valuesOf(temperature, 'temp'))).toEqual(
      cells(temperature).map(([year, value]) => `${year}: ${Number(value)}`),
    );
  });

  it.each([
    ['values not of that base period', (year: number) => `${year},0.3`],
    ['another first year', (year: number) => `${year + 20},0`],
  ])('asks for unit and base period where the header is the same with %s', (_, row) => {
    const rows = Array.from({ length: 144 }, (__, place) => row(1880 + place));
    const found = preview(`year,temp\n${rows.join('\n')}\n`);
    expect(found.reader.id).toBe('delimited');
    expect(offered(found, 'temp')).toMatchObject({
      unit: '',
      unitFrom: 'unknown',
      baseline: null,
      baselineFrom: 'unknown',
    });
  });
});
