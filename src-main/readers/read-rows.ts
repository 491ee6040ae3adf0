import type { BadRow } from '../contract/series.ts';
import { InputError } from '../errors.ts';
import { arrangeRows } from './arrange-rows.ts';
import { isMissingText } from './missing-marks.ts';
import { type DecimalMark, parseNumber } from './parse-number.ts';
import type { Place, Row, RowsRead, ValueColumn } from './row.ts';
import type { Table, TableLine } from './split-table.ts';

export interface RowFormat {
  nCells: number;
  decimalMark: DecimalMark;
  /** The place in time that a row's cells state; null when they state none. */
  placeOf: (cells: readonly string[]) => Place | null;
  /** Column that states the time, for messages. */
  timeColumn: number;
  columns: readonly ValueColumn[];
  /** Cells that stand for "no value" in all columns; the customary words and signs when absent. */
  isMissingText?: (cell: string) => boolean;
}

/**
 * Turns the lines of a table into rows of numbers in order of time. Every line ends up either among the rows or, with
 * the reason, among the bad rows.
 *
 * @throws InputError `no-rows` when no line can be used, `repeated-times` when most places in time occur repeatedly
 */
export function readRows(table: Table, format: RowFormat): RowsRead {
  const read: Row[] = [];
  const badRows: BadRow[] = [];
  const marks = new Map<string, number>();
  for (const line of table.lines) {
    const row = readRow(line, table, format, marks);
    if (typeof row === 'string') badRows.push({ line: line.line, text: line.text, reason: row });
    else read.push(row);
  }
  if (read.length === 0) throw noRows(table, badRows);
  const arranged = arrangeRows(table.fileName, read, format.columns);
  return {
    rows: arranged.rows,
    badRows: [...badRows, ...arranged.badRows].sort((a, b) => a.line - b.line),
    notes: [...arranged.notes, ...noteMarks(marks)],
  };
}

/** The row, or the reason why the line is none. */
function readRow(line: TableLine, table: Table, format: RowFormat, marks: Map<string, number>): Row | string {
  if (line.cells === null) return 'a quotation mark is opened and not closed';
  if (repeatsHeader(line.cells, table.header)) return `repeats the header of line ${table.headerLine}`;
  const cells = withoutEmptyTail(line.cells, format.nCells);
  const place = format.placeOf(cells);
  if (place === null && !cells.some((cell) => parseNumber(cell, format.decimalMark) !== null)) {
    return 'text, not a row of the table';
  }
  if (cells.length !== format.nCells) {
    return `has ${cells.length} cell${cells.length === 1 ? '' : 's'} where the table has ${format.nCells}`;
  }
  if (place === null) return `“${cells[format.timeColumn] ?? ''}” states no time of the kind the other rows state`;
  if (Math.abs(place.year) > 10_000) return `the year ${place.year} is out of range`;
  const values: (number | null)[] = [];
  const missing: string[] = [];
  for (const column of format.columns) {
    const cell = cells[column.index] ?? '';
    const value = valueOf(cell, column, format);
    if (value === undefined) return `column ${column.name}: “${cell}” is not a number`;
    if (value === null) missing.push(cell);
    values.push(value);
  }
  for (const mark of missing) marks.set(mark, (marks.get(mark) ?? 0) + 1);
  return { line: line.line, text: line.text, ...place, values };
}

/** A number, null for "no value", undefined for neither. */
function valueOf(cell: string, column: ValueColumn, format: RowFormat): number | null | undefined {
  if ((format.isMissingText ?? isMissingText)(cell)) return null;
  const value = parseNumber(cell, format.decimalMark);
  if (value === null) return undefined;
  return column.isMissing(value) ? null : value;
}

/** A row may end in more delimiters than the table has columns. */
function withoutEmptyTail(cells: readonly string[], nCells: number): readonly string[] {
  return cells.slice(nCells).every((cell) => cell === '') ? cells.slice(0, nCells) : cells;
}

function repeatsHeader(cells: readonly string[], header: readonly string[]): boolean {
  return header.length > 0 && cells.length === header.length && cells.every((cell, place) => cell === header[place]);
}

function noteMarks(marks: ReadonlyMap<string, number>): string[] {
  if (marks.size === 0) return [];
  const listed = [...marks].map(
    ([mark, n]) =>
      `${mark === '' ? 'empty cells' : `“${mark}”`} ${n === 1 ? 'once' : n === 2 ? 'twice' : `${n} times`}`,
  );
  return [`Read as missing: ${listed.join(', ')}.`];
}

function noRows(table: Table, badRows: readonly BadRow[]): InputError {
  const first = badRows[0];
  return new InputError({
    code: 'no-rows',
    where: first ? `${table.fileName}, line ${first.line}` : table.fileName,
    expected: 'rows that begin with a year or date and hold numbers',
    received: first
      ? `“${first.text.trim().slice(0, 80)}” (${first.reason}), and no other line that could be used`
      : 'no row at all',
    hint: 'Look at the preview and say which line names the columns and how they are separated.',
  });
}
