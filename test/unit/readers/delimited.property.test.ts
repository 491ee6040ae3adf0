import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { preview, read } from './fixtures/preview.ts';

type Delimiter = ',' | ';' | '\t' | 'blanks';
type TimeStyle = 'year' | 'mid-year' | 'month' | 'compact' | 'date' | 'two-columns' | 'decimal';

interface Written {
  delimiter: Delimiter;
  decimalMark: '.' | ',';
  lineEnd: '\n' | '\r\n' | '\r';
  hasMark: boolean;
  isQuoted: boolean;
  head: 'header' | 'title and header' | 'comment and header' | 'commented header' | 'none';
  time: TimeStyle;
  missing: string;
  startYear: number;
  rows: (number | null)[][];
}

const names = ['alpha', 'beta', 'gamma'];
/** No true value comes near a customary mark for "no value" (-99.9), nor looks like a year. */
const value = fc.integer({ min: -400_000, max: 5_000_000 }).map((scaled) => scaled / 10_000);

const written: fc.Arbitrary<Written> = fc
  .record({
    delimiter: fc.constantFrom<Delimiter>(',', ';', '\t', 'blanks'),
    decimalMark: fc.constantFrom<'.' | ','>('.', ','),
    lineEnd: fc.constantFrom<'\n' | '\r\n' | '\r'>('\n', '\r\n', '\r'),
    hasMark: fc.boolean(),
    isQuoted: fc.boolean(),
    head: fc.constantFrom<Written['head']>(
      'header',
      'title and header',
      'comment and header',
      'commented header',
      'none',
    ),
    time: fc.constantFrom<TimeStyle>('year', 'mid-year', 'month', 'compact', 'date', 'two-columns', 'decimal'),
    missing: fc.constantFrom('NaN', '***', '-99.99', '-999', ''),
    startYear: fc.integer({ min: 1700, max: 2000 }),
    rows: fc.integer({ min: 1, max: 3 }).chain((nColumns) =>
      fc.array(fc.array(fc.option(value, { freq: 8 }), { minLength: nColumns, maxLength: nColumns }), {
        minLength: 13,
        maxLength: 40,
      }),
    ),
  })
  // A comma cannot part cells and decimals at once unless cells are quoted; blanks cannot part empty cells.
  .map((way) => ({ ...way, isQuoted: way.isQuoted || (way.delimiter === ',' && way.decimalMark === ',') }))
  .map((way) => (way.delimiter === 'blanks' && way.missing === '' ? { ...way, missing: 'NaN' } : way))
  // A column needs numbers to be told from one of words or one that is empty throughout.
  .filter(({ rows }) => (rows[0] ?? []).every((_, column) => rows.filter((row) => row[column] !== null).length >= 2));

function stepOf({ time, startYear }: Written, place: number): { year: number; month: number | null } {
  if (time === 'year' || time === 'mid-year') return { year: startYear + place, month: null };
  return { year: startYear + Math.floor(place / 12), month: (place % 12) + 1 };
}

function timeCells(way: Written, place: number): string[] {
  const { year, month } = stepOf(way, place);
  const padded = String(month).padStart(2, '0');
  switch (way.time) {
    case 'year':
      return [String(year)];
    case 'mid-year':
      return [`${year}.5`.replace('.', way.decimalMark)];
    case 'month':
      return [`${year}-${padded}`];
    case 'compact':
      return [`${year}${padded}`];
    case 'date':
      return [`${year}-${padded}-15`];
    case 'two-columns':
      return [String(year), String(month)];
    case 'decimal':
      return [(year + ((month ?? 0) - 0.5) / 12).toFixed(4).replace('.', way.decimalMark)];
  }
}

function writeTable(way: Written): string {
  const { delimiter, decimalMark, lineEnd, missing, head, isQuoted } = way;
  const join = (cells: readonly string[]): string =>
    cells.map((cell) => (isQuoted ? `"${cell}"` : cell)).join(delimiter === 'blanks' ? '   ' : delimiter);
  const mark = /^-9/.test(missing) ? missing.replace('.', decimalMark) : missing;
  const rows = way.rows.map((row, place) =>
    join([
      ...timeCells(way, place),
      ...row.map((one) => (one === null ? mark : String(one).replace('.', decimalMark))),
    ]),
  );
  const columns = [
    ...(way.time === 'two-columns' ? ['year', 'month'] : ['time']),
    ...names.slice(0, way.rows[0]?.length),
  ];
  const heads: Record<Written['head'], string[]> = {
    header: [join(columns)],
    'title and header': ['An invented table', '', join(columns)],
    'comment and header': ['# invented', join(columns)],
    'commented header': ['# invented', `# ${join(columns)}`],
    none: [],
  };
  return `${way.hasMark ? '\uFEFF' : ''}${[...heads[head], ...rows].join(lineEnd)}${lineEnd}`;
}

describe('delimited', () => {
  it('reads back what was written, in whichever way it was written', () => {
    fc.assert(
      fc.property(written, (way) => {
        const text = writeTable(way);
        const found = preview(text);
        expect(found.badRows).toEqual([]);
        expect(found.nRows).toBe(way.rows.length);
        expect(found.series).toHaveLength(way.rows[0]?.length ?? 0);
        const { series } = read(
          text,
          found.series.map(({ key }) => ({ key })),
        );
        series.forEach(({ values }, column) => {
          const expected = way.rows.map((_, place) => stepOf(way, place));
          expect(values.years).toEqual(expected.map(({ year }) => year));
          expect(values.months).toEqual(expected[0]?.month === null ? null : expected.map(({ month }) => month));
          expect(values.values).toEqual(way.rows.map((row) => row[column] ?? null));
        });
      }),
      { numRuns: 250 },
    );
  });

  it('reads shuffled rows as the sorted ones', () => {
    fc.assert(
      fc.property(written, fc.array(fc.nat(1000), { minLength: 40, maxLength: 40 }), (way, keys) => {
        const lines = writeTable({ ...way, head: 'header', lineEnd: '\n', hasMark: false })
          .trimEnd()
          .split('\n');
        const [header = '', ...rows] = lines;
        const order = rows.map((row, place) => ({ row, key: keys[place] ?? 0 })).toSorted((a, b) => a.key - b.key);
        const shuffled = [header, ...order.map(({ row }) => row)].join('\n');
        const key = preview(lines.join('\n')).series[0]?.key ?? '';
        expect(read(shuffled, [{ key }]).series[0]?.values).toEqual(
          read(lines.join('\n'), [{ key }]).series[0]?.values,
        );
      }),
      { numRuns: 50 },
    );
  });

  it('accounts for every line: read, listed as bad, or blank', () => {
    const cell = fc.oneof(
      fc.integer({ min: 1900, max: 2050 }).map(String),
      fc.constantFrom('', 'x', '1.5', '-99.99', 'NaN', 'year', '3,4'),
    );
    const line = fc.oneof(
      fc.array(cell, { minLength: 1, maxLength: 4 }).map((cells) => cells.join(',')),
      fc.tuple(fc.integer({ min: 1900, max: 1999 }), value).map(([year, level]) => `${year},${level}`),
    );
    fc.assert(
      fc.property(fc.array(line, { maxLength: 20 }), (noise) => {
        const good = Array.from({ length: 30 }, (_, place) => `${2000 + place},${place / 4}`);
        const text = ['year,level', ...good, ...noise].join('\n');
        const { nRows, badRows } = preview(text);
        const nBlank = noise.filter((one) => one.trim() === '').length;
        expect(nRows + badRows.length + nBlank).toBe(30 + noise.length);
        for (const { line: place, text: shown } of badRows) expect(shown).toBe(text.split('\n')[place - 1]);
      }),
      { numRuns: 150 },
    );
  });
});
