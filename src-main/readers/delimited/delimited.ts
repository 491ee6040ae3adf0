import type { DelimitedOptions } from '../../contract/series.ts';
import { InputError } from '../../errors.ts';
import type { TextFile } from '../decode-text.ts';
import { monthOfName } from '../month-names.ts';
import { nameOf, stemOf } from '../name-of.ts';
import { partialYears } from '../partial-years.ts';
import { type RowsRead, readRows } from '../read-rows.ts';
import type { ReadSeries, Reader, Reading, Recognition } from '../reader.ts';
import { monthsAcross, seriesValues } from '../series-values.ts';
import { splitLine } from '../split-line.ts';
import { isComment, splitTable, type Table } from '../split-table.ts';
import { recogniseHeader } from './recognise-header.ts';
import { recogniseMeaning } from './recognise-meaning.ts';
import { recogniseSplit, type Split } from './recognise-split.ts';
import { recogniseTimeColumns, type TimeColumns } from './recognise-time-columns.ts';
import { columnName, isUncertaintyName, recogniseValueColumns, type ValueColumns } from './recognise-value-columns.ts';

/** A delimited text as recognised, before its rows are read. */
interface Layout {
  split: Split;
  names: string[];
  table: Table;
  time: TimeColumns;
  values: ValueColumns;
  /** Titles and comments. */
  preamble: string;
}

/** Prose holds a line with two numbers now and then; fewer lines than this without a header are no table. */
const minRowsWithoutHeader = 3;

/** Any delimited text with a column of years or dates and columns of numbers. */
export const delimited: Reader = {
  id: 'delimited',
  title: 'Delimited text',
  version: '1',

  recognise(file): Recognition | null {
    try {
      const layout = layoutOf(file, {});
      return { certainty: 0.2, why: `${described(layout)}; no published layout that is known here` };
    } catch (error) {
      if (error instanceof InputError) return null;
      throw error;
    }
  },

  read(file, options = {}): Reading {
    const layout = layoutOf(file, options);
    const { split, names, table, time, values } = layout;
    const read = readRows(table, {
      nCells: split.nCells,
      decimalMark: split.decimalMark,
      placeOf: time.placeOf,
      timeColumn: time.timeColumn,
      columns: values.columns,
      isMissingText: values.isMissingText,
    });
    const { series, notes } = seriesOf(file, layout, read);
    return {
      series,
      nRows: read.rows.length,
      badRows: read.badRows,
      notes: [...notesOn(layout), ...read.notes, ...notes],
      columns: names.map((_, column) => columnName(names, column)),
      table,
      options: {
        delimiter: split.delimiter,
        decimalMark: split.decimalMark,
        ...(split.commentMark === null ? {} : { commentMark: split.commentMark }),
        headerLine: table.headerLine,
        timeColumn: time.timeColumn,
        monthColumn: time.monthColumn,
        valueColumns: values.columns.map(({ index }) => index),
        ...(values.missingMarks.length === 0 ? {} : { missingMarks: values.missingMarks }),
      },
    };
  },
};

/** @throws InputError `no-such-line`, `no-table`, and what the recognition of header, time and columns throws */
function layoutOf(file: TextFile, options: DelimitedOptions): Layout {
  const stated = options.headerLine ?? 0;
  if (stated > file.lines.length) throw noSuchLine(file, stated);
  const split = recogniseSplit(file, options);
  if (split === null) throw noTable(file, 'lines that hold a year or date and at least one number');
  const { headerLine, names } = recogniseHeader(file, split, options);
  if (options.headerLine === undefined && headerLine === 0 && split.nRows < minRowsWithoutHeader)
    throw noTable(file, 'a header, or more than a line or two of numbers');
  // Above the first row: titles and rules of dashes are no rows; lines with as many cells as the rows are, if damaged ones.
  const lines = file.lines.map((line, place) => {
    if (place >= split.firstRow || place < headerLine) return line;
    return /[\p{L}\p{N}]/u.test(line) && splitLine(line, split.delimiter)?.length === split.nCells ? line : '';
  });
  const commentMarks = split.commentMark === null ? [] : [split.commentMark];
  const table = splitTable({ ...file, lines }, { delimiter: split.delimiter, commentMarks, headerLine });
  const time = recogniseTimeColumns(table, names, split, options);
  if (time === null) throw noTable(file, 'a column of years, months or dates');
  const preamble = textAbove(file, split, headerLine);
  const values = recogniseValueColumns(table, { names, split, time, preamble }, options);
  return { split, names, table, time, values, preamble };
}

function seriesOf(file: TextFile, layout: Layout, read: RowsRead): { series: ReadSeries[]; notes: string[] } {
  const { preamble } = layout;
  const across = monthColumns(layout);
  const stem = stemOf(file.fileName);
  const series: ReadSeries[] = [];
  const notes: string[] = [];
  const withoutUnit: string[] = [];
  const celsius: string[] = [];
  const add = (name: string, values: ReadSeries['values'], position: string): void => {
    if (values.values.every((value) => value === null)) {
      notes.push(`“${name}” holds no value and is not offered.`);
      return;
    }
    const {
      notes: remarks,
      isCelsiusDifference,
      ...meaning
    } = recogniseMeaning({ column: name, preamble, fileName: file.fileName }, values);
    notes.push(...remarks);
    if (meaning.unitFrom === 'unknown') withoutUnit.push(name);
    if (isCelsiusDifference) celsius.push(name);
    const plain = nameOf(name) || 'column';
    const key = series.some((other) => other.key === plain) ? nameOf(`${plain} ${position}`) : plain;
    series.push({
      key,
      suggestedName: nameOf(`${stem} ${key}`) || key,
      label: key === plain ? name : `${name} (${position})`,
      ...meaning,
      step: values.months ? 'month' : 'year',
      partialYears: partialYears(values),
      isMain: false,
      values,
    });
  };
  if (across !== null) add('monthly', monthsAcross(read.rows, across), 'months');
  layout.values.columns.forEach(({ name, index }, place) => {
    if (across?.includes(place)) return;
    add(name, seriesValues(read.rows, place), `column ${index + 1}`);
  });
  if (celsius.length > 0)
    notes.push(`In °C in the file: ${celsius.join(', ')}. Differences are the same in K, so the unit is K.`);
  if (withoutUnit.length > 0) notes.push(`The file does not say in which unit these are: ${withoutUnit.join(', ')}.`);
  const main = mainOf(series);
  const [only] = series;
  return {
    series: series.map((one) => ({
      ...one,
      isMain: one === main,
      ...(only === one && series.length === 1 ? { suggestedName: nameOf(stem) || one.key } : {}),
    })),
    notes,
  };
}

/** The first series of a quantity that claims are about; else the first that does not describe another one. */
function mainOf(series: readonly ReadSeries[]): ReadSeries | undefined {
  const candidates = series.filter(({ label }) => !isUncertaintyName(label));
  return candidates.find(({ quantity }) => quantity !== 'other') ?? candidates[0] ?? series[0];
}

/** Places of twelve columns named January to December, or 1 to 12, in a table with a row for each year. */
function monthColumns({ time, values: { columns } }: Layout): number[] | null {
  if (time.step !== 'year') return null;
  const months = columns.map(
    ({ name }) => monthOfName(name) ?? (/^(0?[1-9]|1[0-2])$/.test(name) ? Number(name) : null),
  );
  const places = Array.from({ length: 12 }, (_, month) => months.indexOf(month + 1));
  return places.every((place) => place !== -1) ? places : null;
}

/** Titles and comments, without the line that names the columns. */
function textAbove(file: TextFile, split: Split, headerLine: number): string {
  return file.lines
    .filter((line, place) => {
      if (place === headerLine - 1) return false;
      return place < split.firstRow || (split.commentMark !== null && isComment(line, [split.commentMark]));
    })
    .join('\n');
}

function notesOn({ split, time, values, table }: Layout): string[] {
  const notes: string[] = [];
  if (split.decimalMark === ',') notes.push(...noteDecimalComma(table));
  if (table.headerLine === 0) notes.push('No line names the columns.');
  if (time.note !== null) notes.push(time.note);
  if (values.wordColumns.length > 0)
    notes.push(`Not offered, because they hold words: ${values.wordColumns.join(', ')}.`);
  return notes;
}

function noteDecimalComma({ lines }: Table): string[] {
  const decimals = lines.flatMap(({ cells }) => cells ?? []).filter((cell) => /^-?\d*,\d+$/.test(cell));
  const [first] = decimals;
  if (first === undefined) return [];
  const mayBeThousands = decimals.every((cell) => /^-?\d{1,3},\d{3}$/.test(cell));
  return [
    `Numbers have a decimal comma: “${first}” is ${Number(first.replace(',', '.'))}.`,
    ...(mayBeThousands
      ? ['All have three digits after the comma. If it parts thousands, the values are wrong: take it out of the file.']
      : []),
  ];
}

function described({ split, names, table, time }: Layout): string {
  const separator = { ',': 'commas', ';': 'semicolons', '\t': 'tabs', blanks: 'blanks' }[split.delimiter];
  const header = table.headerLine === 0 ? 'no header' : `a header in line ${table.headerLine}`;
  const what = time.step === 'year' ? 'years' : 'months';
  return `Columns separated by ${separator}, ${header}, ${what} in ${columnName(names, time.timeColumn)}`;
}

function noTable(file: TextFile, expected: string): InputError {
  const place = file.lines.findIndex((line) => line.trim() !== '');
  return new InputError({
    code: 'no-table',
    where: `${file.fileName}, line ${place + 1}`,
    expected,
    received: `“${(file.lines[place] ?? '').trim().slice(0, 80)}” and ${file.lines.length - 1} more lines that hold none`,
    hint: 'If the file is a table, say in the preview how its columns are separated and which one states the time.',
  });
}

function noSuchLine(file: TextFile, headerLine: number): InputError {
  return new InputError({
    code: 'no-such-line',
    where: `${file.fileName}, line ${headerLine}`,
    expected: `a header in one of the ${file.lines.length} lines`,
    received: `line ${headerLine}`,
    hint: 'Choose the line that names the columns; 0 when there is none.',
  });
}
