import { describe, expect, it } from 'vitest';
import { importPreview, series, seriesValues } from '../../../src-main/contract/series.ts';
import { InputError } from '../../../src-main/errors.ts';
import { readers } from '../../../src-main/readers/readers.ts';
import * as layouts from './fixtures/layouts.ts';
import { errorOf, preview, read } from './fixtures/preview.ts';

const table = 'year,level,other (°C)\n1990,1.5,9\n1991,1.7,14\n1992,abc,15\n';
const files: [string, string][] = [
  ['a plain table', table],
  ...Object.entries(layouts).map(([name, file]): [string, string] => [
    name,
    typeof file === 'string' ? file : file(0.1),
  ]),
];

function inputError(run: () => unknown): InputError {
  try {
    run();
  } catch (error) {
    if (error instanceof InputError) return error;
    throw error;
  }
  throw new Error('nothing was refused');
}

describe('previewDataset', () => {
  it.each(files)('answers as the contract says for %s', (_, text) => {
    const answer = { ...preview(text), digest: '0'.repeat(64), alreadyImportedAs: null };
    expect(importPreview.parse(answer)).toEqual(answer);
    expect(answer.series.filter(({ isMain }) => isMain).length).toBeGreaterThan(0);
  });

  it.each(files)('gives the series of %s keys and names of their own', (_, text) => {
    const found = preview(text).series;
    expect(new Set(found.map(({ key }) => key)).size).toBe(found.length);
    expect(new Set(found.map(({ suggestedName }) => suggestedName)).size).toBe(found.length);
  });

  it('counts bytes, lists all readers, and says why it chose one', () => {
    const found = preview(`\uFEFF${table}`);
    expect(found.sizeBytes).toBe(new TextEncoder().encode(table).length + 3);
    expect(found.readers).toEqual(readers.map(({ id, title }) => ({ id, title })));
    expect(found.reader.why).toContain('commas');
  });

  it('reads with the reader that the reviewer chose', () => {
    const found = preview(layouts.gistempCsv, { readerId: 'delimited' });
    expect(found.reader.id).toBe('delimited');
    expect(found.series.map(({ key }) => key)).toContain('monthly');
  });

  it('reads as delimited text when the reviewer says how it is split', () => {
    expect(preview(layouts.gistempCsv, { delimited: { headerLine: 2 } }).reader.id).toBe('delimited');
  });

  it.each(readers.filter(({ id }) => id !== 'delimited').map(({ id }) => id))(
    'refuses to read an unfitting table as %s, naming file, line, expectation and way out',
    (readerId) => {
      const { fields } = errorOf('a,b\n1,2\n', { readerId }, 'odd.csv');
      expect(fields.code).toBe('other-format');
      expect(fields.where).toMatch(/^odd\.csv, line \d+$/);
      expect(fields.expected.length).toBeGreaterThan(20);
      expect(fields.hint).toBeTruthy();
    },
  );

  it('names the readers there are when another is asked for', () => {
    const { fields } = errorOf(table, { readerId: 'spreadsheet' });
    expect(fields.code).toBe('unknown-reader');
    expect(fields.expected).toContain('noaa-gml');
  });

  it.each([
    ['LF', '\n'],
    ['CRLF', '\r\n'],
  ])('recognises every published layout with %s line ends and a byte order mark', (_, lineEnd) => {
    for (const [, text] of files) {
      const plain = preview(text);
      const other = preview(`\uFEFF${text.replace('\uFEFF', '').replaceAll('\n', lineEnd)}`);
      expect(other.reader.id).toBe(plain.reader.id);
      expect(other.series).toEqual(plain.series);
    }
  });
});

describe('readDataset', () => {
  it('describes the chosen series as the contract says', () => {
    const answer = read(table, [{ key: 'level' }]);
    expect(answer).toMatchObject({ readerId: 'delimited', readerVersion: '1', nRows: 2 });
    const [level] = answer.series;
    expect(seriesValues.parse(level?.values)).toEqual(level?.values);
    const row = { ...level?.description, id: 1, datasetId: 1, valuesDigest: '0'.repeat(64) };
    expect(series.parse(row)).toEqual(row);
    expect(answer.badRows).toEqual([{ line: 4, text: '1992,abc,15', reason: 'column level: “abc” is not a number' }]);
  });

  it('takes what the reviewer says and keeps what was recognised', () => {
    const [described] = read(table, [
      {
        key: 'other-c',
        name: 'coast',
        unit: '°F',
        quantity: 'temperature-anomaly',
        baseline: { start: 1961, end: 1990 },
      },
    ]).series;
    expect(described?.description).toMatchObject({
      name: 'coast',
      label: 'other (°C)',
      quantity: 'temperature-anomaly',
      unit: '°F',
      baseline: { start: 1961, end: 1990 },
      startYear: 1990,
      endYear: 1991,
    });
    const [kept] = read(layouts.gistempCsv, [{ key: 'annual' }]).series;
    expect(kept?.description).toMatchObject({
      name: 'gistemp-annual',
      unit: 'K',
      baseline: { start: 1951, end: 1980 },
    });
  });

  it('can take a base period and an agent away', () => {
    const [bare] = read(layouts.gistempCsv, [{ key: 'annual', baseline: null }]).series;
    expect(bare?.description.baseline).toBeNull();
    const [agentless] = read(layouts.ar6Forcing, [{ key: 'co2', agent: null }]).series;
    expect(agentless?.description.agent).toBeNull();
  });

  it('keeps the order of the choices', () => {
    const { series: chosen } = read(layouts.ar6Forcing, [{ key: 'total' }, { key: 'co2' }]);
    expect(chosen.map(({ description }) => description.agent)).toEqual(['total', 'co2']);
  });

  it('names the keys there are when another is chosen, and refuses a key twice', () => {
    const unknown = inputError(() => read(table, [{ key: 'levels' }])).fields;
    expect(unknown).toMatchObject({ code: 'unknown-series', received: 'levels' });
    expect(unknown.expected).toContain('level, other-c');
    expect(inputError(() => read(table, [{ key: 'level' }, { key: 'level' }])).fields.code).toBe('series-twice');
  });
});
