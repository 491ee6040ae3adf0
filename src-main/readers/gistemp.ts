import type { BadRow, SeriesValues } from '../contract/series.ts';
import type { TextFile } from './decode-text.ts';
import { monthOfName } from './month-names.ts';
import { otherFormat } from './other-format.ts';
import { parseNumber } from './parse-number.ts';
import { type PartialYear, partialYears } from './partial-years.ts';
import { readRows } from './read-rows.ts';
import type { Row } from './row.ts';
import type { ReadSeries, Reader, Reading, Recognition } from './reader.ts';
import { monthsAcross, seriesValues } from './series-values.ts';
import type { Delimiter } from './split-line.ts';
import { type Table, splitTable } from './split-table.ts';
import { yearPlace } from './time-form.ts';

interface Layout {
  table: Table;
  delimiter: Delimiter;
  /** Title of the table, or its first line. */
  title: string;
  /** Columns of the months from January on, then of the annual mean January to December. */
  columns: number[];
  /** One unit of the file in °C. */
  unitC: number;
}

const seasons = ['J-D', 'D-N', 'DJF', 'MAM', 'JJA', 'SON'];
const baseline = { start: 1951, end: 1980 };
/** No monthly anomaly of a hemisphere or the globe is as large, in °C. */
const largestAnomalyC = 10;

/** GISTEMP v4: a year a row with twelve months, annual and seasonal means; CSV in °C, text in 0.01 °C. */
export const gistemp: Reader = {
  id: 'gistemp',
  title: 'GISTEMP',
  version: '1',

  recognise(file): Recognition | null {
    const layout = layoutOf(file);
    if (layout === null) return null;
    return {
      certainty: 0.95,
      why: `Months, J-D, D-N and seasons across, as in GISTEMP's tables; titled “${layout.title}”`,
    };
  },

  read(file): Reading {
    const layout = layoutOf(file);
    if (layout === null) {
      throw otherFormat(file, 0, 'a GISTEMP table: a header Year, Jan, …, Dec, J-D, D-N, DJF, MAM, JJA, SON');
    }
    const { table, delimiter, columns, unitC } = layout;
    const read = readRows(table, {
      nCells: table.header.length,
      decimalMark: '.',
      timeColumn: 0,
      placeOf: (cells) => yearPlace(cells[0] ?? '', null),
      columns: columns.map((index) => ({ index, name: table.header[index] ?? '', isMissing: () => false })),
    });
    const rows = read.rows.map((row) => ({ ...row, values: row.values.map((value) => value && inC(value, unitC)) }));
    const furniture = delimiter === 'blanks' ? read.badRows.filter((row) => isFurniture(row, read.rows)) : [];
    const unitNote = unitC === 1 ? '' : ' The file is in 0.01 °C; the values were divided by 100.';
    return {
      series: offeredSeries(layout, rows),
      nRows: rows.length,
      badRows: read.badRows.filter((row) => !furniture.includes(row)),
      notes: [
        ...read.notes,
        ...noteFurniture(furniture),
        `Anomalies in °C; differences are the same in K, so the unit is K.${unitNote}`,
        'The base period 1951–1980 is the provider’s.',
      ],
      columns: table.header,
      table,
      options: null,
    };
  },
};

function layoutOf(file: TextFile): Layout | null {
  const headerLine = file.lines.slice(0, 20).findIndex((line) => /^\s*"?Year"?[\s,]+"?Jan\b/.test(line)) + 1;
  if (headerLine === 0) return null;
  const delimiter = (file.lines[headerLine - 1] ?? '').includes(',') ? ',' : 'blanks';
  const table = splitTable(file, { delimiter, commentMarks: [], headerLine });
  const months = Array.from({ length: 12 }, (_, month) =>
    table.header.findIndex((name) => monthOfName(name) === month + 1),
  );
  const columns = [...months, table.header.indexOf('J-D')];
  if (columns.includes(-1) || !seasons.every((name) => table.header.includes(name))) return null;
  const titles = file.lines.slice(0, headerLine - 1).join(' ');
  const isHundredths =
    /0\.01 deg/i.test(titles) ||
    table.lines.some(({ cells }) =>
      months.some((column) => Math.abs(parseNumber(cells?.[column] ?? '', '.') ?? 0) > largestAnomalyC),
    );
  const title = file.lines.slice(0, headerLine - 1).find((line) => line.trim() !== '') ?? 'no title';
  return { table, delimiter, title: title.trim(), columns, unitC: isHundredths ? 0.01 : 1 };
}

function inC(value: number, unitC: number): number {
  return unitC === 1 ? value : value / 100;
}

function offeredSeries({ title }: Layout, rows: readonly Row[]): ReadSeries[] {
  const region = regionOf(title);
  const monthly = monthsAcross(rows, [0, 1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11]);
  const parts = partialYears(monthly);
  const offer = (step: 'year' | 'month', values: SeriesValues, years: PartialYear[]): ReadSeries => ({
    key: step === 'year' ? 'annual' : 'monthly',
    suggestedName: `gistemp${region.id}-${step === 'year' ? 'annual' : 'monthly'}`,
    label: `GISTEMP, ${region.name}, ${step === 'year' ? 'annual mean January to December' : 'monthly mean'}`,
    quantity: 'temperature-anomaly',
    agent: null,
    unit: 'K',
    unitFrom: 'provider',
    step,
    baseline,
    baselineFrom: 'provider',
    partialYears: years,
    isMain: step === 'year',
    values,
  });
  return [offer('year', seriesValues(rows, 12), parts), offer('month', monthly, parts)];
}

function regionOf(title: string): { name: string; id: string } {
  const surface = /^station|meteorological stations/i.test(title) ? 'land stations' : 'land and ocean';
  const id = surface === 'land stations' ? '-stations' : '';
  if (/north/i.test(title)) return { name: `${surface}, northern hemisphere`, id: `${id}-north` };
  if (/south/i.test(title)) return { name: `${surface}, southern hemisphere`, id: `${id}-south` };
  return { name: `${surface}, global mean`, id };
}

/** The text files repeat the header every twenty years and end in remarks. */
function isFurniture({ line, reason }: BadRow, rows: readonly Row[]): boolean {
  const isBelow = rows.every((row) => row.line < line);
  return reason.startsWith('repeats the header') || (isBelow && !reason.startsWith('column'));
}

function noteFurniture(lines: readonly BadRow[]): string[] {
  if (lines.length === 0) return [];
  const listed = lines.map(({ line }) => line).join(', ');
  return [`Repeated headers and remarks under the table, as in all files of this kind: lines ${listed}.`];
}
