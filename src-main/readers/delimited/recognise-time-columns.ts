import type { DelimitedOptions, TimeStep } from '../../contract/series.ts';
import { InputError } from '../../errors.ts';
import { monthOfName } from '../month-names.ts';
import { parseNumber } from '../parse-number.ts';
import type { Place } from '../row.ts';
import type { Table } from '../split-table.ts';
import { recogniseTime, yearPlace } from '../time-form.ts';
import type { Split } from './recognise-split.ts';

export interface TimeColumns {
  timeColumn: number;
  monthColumn: number | null;
  step: TimeStep;
  note: string | null;
  placeOf: (cells: readonly string[]) => Place | null;
  /** Columns that only repeat the time: decimal years beside years and months, days, ends of intervals. */
  repeated: number[];
}

const yearName = /^(years?|yr|yyyy|year ?(ad|ce)|jahr|ann[ée]e|a[ñn]o|anno)$/i;
const timeName = /^(dates?|time|year[ _]?month|decimal.*|month.*year|timebounds?_lower|datum|zeit|t)$/i;
const monthName = /^(months?|mon?|mn|mm|monat|mois|mes|mese)$/i;
const onlyTimeName = /^(days?|dd|tag|dates?( .*)?|time|decimal.*|timebounds?_(lower|upper))$/i;

/** The time is recognised from the first rows; later ones that state it otherwise are bad rows. */
const maxSampleRows = 2000;

/**
 * Recognises which column states the time, and whether another states the month: by name, else the leftmost column whose
 * cells are years from 1000 to 2999 or dates. Null when no column does.
 *
 * @throws InputError `no-such-column` when the options name a column that the table does not have, `no-time` when it
 *   states no years or dates
 */
export function recogniseTimeColumns(
  table: Table,
  names: readonly string[],
  split: Split,
  options: DelimitedOptions,
): TimeColumns | null {
  const rows = table.lines
    .flatMap(({ cells }) => (cells?.length === split.nCells ? [cells] : []))
    .slice(0, maxSampleRows);
  for (const column of [options.timeColumn, options.monthColumn]) {
    if (column !== undefined && column !== null && column >= split.nCells) {
      throw noSuchColumn(table, column, split.nCells);
    }
  }
  const candidates = options.timeColumn === undefined ? candidatesOf(names, rows, split) : [options.timeColumn];
  const readings = candidates
    .map((timeColumn) => readTime(timeColumn, { names, rows, split, options }))
    .filter((reading) => reading !== null);
  const best = readings.find((reading) => isMostlyDistinct(reading, rows)) ?? readings[0] ?? null;
  if (best === null && options.timeColumn !== undefined) throw noTime(table, options.timeColumn, rows);
  return best && { ...best, repeated: repeatedColumns(best, names, rows, split) };
}

type Rows = readonly (readonly string[])[];
type Reading = Omit<TimeColumns, 'repeated'>;

function candidatesOf(names: readonly string[], rows: Rows, { nCells, decimalMark }: Split): number[] {
  const columns = Array.from({ length: nCells }, (_, column) => column);
  const named = [yearName, timeName].flatMap((pattern) =>
    columns.filter((column) => pattern.test(names[column] ?? '')),
  );
  const byContent = columns.filter((column) => {
    const cells = rows.map((row) => row[column] ?? '');
    const form = recogniseTime(cells, decimalMark);
    const years = cells.map((cell) => form?.placeOf(cell)?.year).filter((year) => year !== undefined);
    return years.length > 0 && years.filter((year) => year >= 1000 && year < 3000).length * 2 > cells.length;
  });
  return [...new Set([...named, ...byContent])];
}

function readTime(
  timeColumn: number,
  { names, rows, split, options }: { names: readonly string[]; rows: Rows; split: Split; options: DelimitedOptions },
): Reading | null {
  const form = recogniseTime(
    rows.map((row) => row[timeColumn] ?? ''),
    split.decimalMark,
  );
  if (form === null) return null;
  const monthColumn = options.monthColumn === undefined ? findMonths(timeColumn, names, rows) : options.monthColumn;
  if (monthColumn === null || (form.step === 'month' && options.monthColumn === undefined)) {
    return {
      timeColumn,
      monthColumn: null,
      step: form.step,
      note: form.note,
      placeOf: (cells) => form.placeOf(cells[timeColumn] ?? ''),
    };
  }
  const placeOf = (cells: readonly string[]): Place | null =>
    yearPlace(cells[timeColumn] ?? '', cells[monthColumn] ?? '');
  return { timeColumn, monthColumn, step: 'month', note: null, placeOf };
}

/** A column named for months, or, beside a column of repeating years, one without a name that holds 1 to 12. */
function findMonths(timeColumn: number, names: readonly string[], rows: Rows): number | null {
  const named = names.findIndex((name, column) => column !== timeColumn && monthName.test(name));
  if (named !== -1) return holdsMonths(named, rows) ? named : null;
  const years = new Set(rows.map((row) => row[timeColumn]));
  if (years.size * 2 > rows.length) return null;
  const beside = [timeColumn + 1, timeColumn - 1].filter((column) => names[column] === '');
  return beside.find((column) => holdsMonths(column, rows)) ?? null;
}

function holdsMonths(column: number, rows: Rows): boolean {
  return rows.filter((row) => isMonth(row[column] ?? '')).length * 2 > rows.length;
}

function isMonth(cell: string): boolean {
  return /^(0?[1-9]|1[0-2])$/.test(cell) || monthOfName(cell) !== null;
}

function isMostlyDistinct({ placeOf }: Reading, rows: Rows): boolean {
  const places = rows.map(placeOf).filter((place) => place !== null);
  const distinct = new Set(places.map(({ year, month }) => year * 12 + (month ?? 0)));
  return distinct.size * 2 > places.length;
}

function repeatedColumns(
  { timeColumn, monthColumn, placeOf }: Reading,
  names: readonly string[],
  rows: Rows,
  { nCells, decimalMark }: Split,
): number[] {
  return Array.from({ length: nCells }, (_, column) => column).filter((column) => {
    if (column === timeColumn || column === monthColumn) return false;
    if (onlyTimeName.test(names[column] ?? '') || yearName.test(names[column] ?? '')) return true;
    return rows.every((row) => {
      const value = parseNumber(row[column] ?? '', decimalMark);
      const place = placeOf(row);
      return place === null || (value !== null && Math.floor(value) === place.year);
    });
  });
}

function noSuchColumn(table: Table, column: number, nCells: number): InputError {
  return new InputError({
    code: 'no-such-column',
    where: table.fileName,
    expected: `one of ${nCells} columns`,
    received: `column ${column + 1}`,
    hint: 'Choose a column that the table has.',
  });
}

function noTime(table: Table, column: number, rows: Rows): InputError {
  return new InputError({
    code: 'no-time',
    where: `${table.fileName}, column ${column + 1}`,
    expected: 'years, months or dates, such as 1959, 1750.5, 1958-03, 1958-03-01 or 1958.2027',
    received: `“${rows[0]?.[column] ?? ''}”`,
    hint: 'Choose the column that states the time.',
  });
}
