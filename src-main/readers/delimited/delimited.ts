import type { DelimitedOptions } from '../../contract/series.ts';
import { InputError } from '../../errors.ts';
import type { TextFile } from '../decode-text.ts';
import { readRows } from '../read-rows.ts';
import type { Reader, Reading, Recognition } from '../reader.ts';
import { splitLine } from '../split-line.ts';
import { isComment, splitTable, type Table } from '../split-table.ts';
import { offerColumns } from './offer-columns.ts';
import { recogniseHeader } from './recognise-header.ts';
import { recogniseSplit, type Split } from './recognise-split.ts';
import { recogniseTimeColumns, type TimeColumns } from './recognise-time-columns.ts';
import { columnName, recogniseValueColumns, type ValueColumns } from './recognise-value-columns.ts';

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
    const { series, notes } = offerColumns({ ...layout, fileName: file.fileName }, read);
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
  if (options.headerLine === undefined && headerLine === 0 && split.nRows < minRowsWithoutHeader) {
    throw noTable(file, 'a header, or more than a line or two of numbers');
  }
  // Above the first row: titles and rules of dashes are no rows; lines with as many cells as the rows are, if damaged ones.
  const lines = file.lines.map((line, place) => {
    if (place >= split.firstRow || place < headerLine) return line;
    return /[\p{L}\p{N}]/u.test(line) && splitLine(line, split.delimiter)?.length === split.nCells ? line : '';
  });
  const commentMarks = split.commentMark === null ? [] : [split.commentMark];
  const table = splitTable({ ...file, lines }, { delimiter: split.delimiter, commentMarks, headerLine });
  const time = recogniseTimeColumns(table, names, split, options);
  if (time === null) throw noTable(file, 'a column of years, months or dates');
  // Where a unit stands over the column of years, it is that of the table.
  const preamble = `${textAbove(file, split, headerLine)}\n${names[time.timeColumn] ?? ''}`;
  const values = recogniseValueColumns(table, { names, split, time, preamble }, options);
  return { split, names, table, time, values, preamble };
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
  if (values.wordColumns.length > 0) {
    notes.push(`Not offered, because they hold words: ${values.wordColumns.join(', ')}.`);
  }
  if (values.percentColumns.length > 0) {
    notes.push(
      `Not offered, because their numbers carry a percent sign: ${values.percentColumns.join(', ')}. Take the sign out of the file to read them, in %.`,
    );
  }
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
