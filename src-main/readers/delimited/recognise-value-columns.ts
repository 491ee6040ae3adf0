import type { DelimitedOptions } from '../../contract/series.ts';
import { InputError } from '../../errors.ts';
import { isMissingText, isNegative, numericMarksOf } from '../missing-marks.ts';
import { parseNumber } from '../parse-number.ts';
import type { ValueColumn } from '../read-rows.ts';
import type { Table } from '../split-table.ts';
import type { Split } from './recognise-split.ts';
import type { TimeColumns } from './recognise-time-columns.ts';

export interface ValueColumns {
  columns: ValueColumn[];
  isMissingText: (cell: string) => boolean;
  /** Marks for "no value" that the columns hold. */
  missingMarks: string[];
  /** Names of columns left aside because they hold words. */
  wordColumns: string[];
}

const uncertaintyName =
  /^(unc|uncertainty|std|sd|sdev|s\.?d\.?|st\.?dev.*|std.*|se|s\.e\.|sigma|error|err|n ?days|#days|count|n|n_?obs|.*[ _](unc|uncertainty|sd|sdev|std|se|sigma|error|err))\.?$/i;

/** Columns that describe another one (uncertainties, counts) and are never negative. */
export function isUncertaintyName(name: string): boolean {
  return uncertaintyName.test(name);
}

/**
 * The columns that hold numbers, and what stands for "no value" in them. With missing marks in the options, exactly
 * these and empty cells count as missing.
 *
 * @throws InputError `no-such-column`, or `no-numbers` when no column beside the time holds numbers
 */
export function recogniseValueColumns(
  table: Table,
  names: readonly string[],
  split: Split,
  time: TimeColumns,
  options: DelimitedOptions,
): ValueColumns {
  const rows = table.lines.flatMap(({ cells }) => (cells?.length === split.nCells ? [cells] : []));
  const marks = options.missingMarks;
  const isMissing = marks === undefined ? isMissingText : (cell: string) => cell === '' || marks.includes(cell);
  const stated = options.valueColumns?.find((column) => column >= split.nCells);
  if (stated !== undefined)
    throw noColumn(table, 'no-such-column', `one of ${split.nCells} columns`, `column ${stated + 1}`);
  const taken = [time.timeColumn, time.monthColumn, ...time.repeated];
  const candidates =
    options.valueColumns ?? names.map((_, column) => column).filter((column) => !taken.includes(column));
  const found = new Set<string>();
  const columns: ValueColumn[] = [];
  const wordColumns: string[] = [];
  for (const index of candidates) {
    const cells = rows.map((row) => row[index] ?? '');
    const filled = cells.filter((cell) => !isMissing(cell));
    const numbers = cells.map((cell) => (isMissing(cell) ? null : parseNumber(cell, split.decimalMark)));
    const nNumbers = numbers.filter((number) => number !== null).length;
    const name = columnName(names, index);
    if (nNumbers === 0 || nNumbers * 2 <= filled.length) {
      if (filled.length > 0) wordColumns.push(name);
      continue;
    }
    const isMark =
      marks === undefined
        ? numericMarksOf(numbers)
        : (value: number) => marks.some((mark) => parseNumber(mark, split.decimalMark) === value);
    const isNever = marks === undefined && isUncertaintyName(name) ? isNegative : () => false;
    columns.push({ index, name, isMissing: (value) => isMark(value) || isNever(value) });
    cells.forEach((cell, place) => {
      const number = numbers[place] ?? null;
      if (cell !== '' && (isMissing(cell) || (number !== null && isMark(number)))) found.add(cell);
    });
  }
  if (columns.length === 0) {
    const received = wordColumns.length === 0 ? 'no other column' : `words in ${wordColumns.slice(0, 5).join(', ')}`;
    throw noColumn(table, 'no-numbers', 'a column of numbers beside the time', received);
  }
  return { columns, isMissingText: isMissing, missingMarks: marks ?? [...found], wordColumns };
}

export function columnName(names: readonly string[], column: number): string {
  return names[column] || `column ${column + 1}`;
}

function noColumn(table: Table, code: string, expected: string, received: string): InputError {
  const first = table.lines[0];
  return new InputError({
    code,
    where: first ? `${table.fileName}, line ${first.line}` : table.fileName,
    expected,
    received,
    hint: 'Look at the preview: choose the columns, the delimiter or the decimal mark there.',
  });
}
