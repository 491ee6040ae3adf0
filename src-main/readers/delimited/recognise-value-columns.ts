import type { DelimitedOptions } from '../../contract/series.ts';
import { InputError } from '../../errors.ts';
import { isMissingText, isNegative, numericMarksOf } from '../missing-marks.ts';
import { parseNumber } from '../parse-number.ts';
import type { ValueColumn } from '../row.ts';
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
  /** Names of columns left aside because their numbers carry a percent sign. */
  percentColumns: string[];
}

/** What stands for "no value" in all columns. */
interface Marks {
  isText: (cell: string) => boolean;
  isNumberIn: (column: readonly (number | null)[]) => (value: number) => boolean;
}

const uncertaintyName =
  /^(unc|uncertainty|std|sd|sdev|s\.?d\.?|st\.?dev.*|std.*|se|s\.e\.|sigma|error|err|n ?days|#days|count|n|n_?obs|.*[ _](unc|uncertainty|sd|sdev|std|se|sigma|error|err))\.?$/i;
const statedMark = /\bmissing(?: (?:values?|data|marks?))?\s*[:=]\s*["']?([^\s,;"']+)/gi;

/** Columns that describe another one (uncertainties, counts) and are never negative. */
export function isUncertaintyName(name: string): boolean {
  return uncertaintyName.test(name);
}

/**
 * The columns that hold numbers, and what stands for "no value" in them: the customary marks and those that the text
 * above the table states; with missing marks in the options, exactly these and empty cells. In columns of uncertainties
 * and counts, by their names, every negative number does.
 *
 * @throws InputError `no-such-column`, or `no-numbers` when no column beside the time holds numbers
 */
export function recogniseValueColumns(
  table: Table,
  { names, split, time, preamble }: { names: readonly string[]; split: Split; time: TimeColumns; preamble: string },
  options: DelimitedOptions,
): ValueColumns {
  const stated = options.valueColumns?.find((column) => column >= split.nCells);
  if (stated !== undefined) {
    throw noColumn(table, 'no-such-column', `one of ${split.nCells} columns`, `column ${stated + 1}`);
  }
  const marks = marksOf(options, preamble, split);
  const taken = [time.timeColumn, time.monthColumn, ...time.repeated];
  const candidates =
    options.valueColumns ?? names.map((_, column) => column).filter((column) => !taken.includes(column));
  const found: ValueColumns = {
    columns: [],
    isMissingText: marks.isText,
    missingMarks: [],
    wordColumns: [],
    percentColumns: [],
  };
  for (const index of candidates) {
    const cells = table.lines.flatMap(({ cells: all }) => (all?.length === split.nCells ? [all[index] ?? ''] : []));
    const numbers = cells.map((cell) => (marks.isText(cell) ? null : parseNumber(cell, split.decimalMark)));
    const nNumbers = numbers.filter((number) => number !== null).length;
    const nFilled = cells.filter((cell) => !marks.isText(cell)).length;
    const name = columnName(names, index);
    if (nNumbers === 0 || nNumbers * 2 <= nFilled) {
      const nPercents = cells.filter((cell) => /^[+-]?[\d.,]+ ?%$/.test(cell)).length;
      if (nFilled > 0) (nPercents * 2 > nFilled ? found.percentColumns : found.wordColumns).push(name);
      continue;
    }
    const isUnnamed = names[index] === '' && names.some((other) => other !== '');
    if (options.valueColumns === undefined && isUnnamed && isRowNumbers(numbers)) continue;
    const isMark = marks.isNumberIn(numbers);
    const isImpossible = isUncertaintyName(name) ? isNegative : (): boolean => false;
    found.columns.push({ index, name, isMissing: (value) => isMark(value) || isImpossible(value) });
    found.missingMarks.push(
      ...cells.filter((cell, place) => cell !== '' && (marks.isText(cell) || isMark(numbers[place] ?? Number.NaN))),
    );
  }
  if (found.columns.length === 0) {
    const words = [...found.wordColumns, ...found.percentColumns].slice(0, 5).join(', ');
    throw noColumn(
      table,
      'no-numbers',
      'a column of numbers beside the time',
      words ? `words in ${words}` : 'no other column',
    );
  }
  return { ...found, missingMarks: options.missingMarks ?? [...new Set(found.missingMarks)] };
}

export function columnName(names: readonly string[], column: number): string {
  return names[column] || `column ${column + 1}`;
}

function marksOf({ missingMarks }: DelimitedOptions, preamble: string, { decimalMark }: Split): Marks {
  const stated = missingMarks ?? [...preamble.matchAll(statedMark)].map(([, mark]) => mark ?? '');
  const numbers = stated.map((mark) => parseNumber(mark, decimalMark));
  const isStated = (cell: string): boolean => cell === '' || stated.includes(cell);
  if (missingMarks !== undefined) return { isText: isStated, isNumberIn: () => (value) => numbers.includes(value) };
  return {
    isText: (cell) => isMissingText(cell) || isStated(cell),
    isNumberIn(column) {
      const isCustomary = numericMarksOf(column.filter((value) => !numbers.includes(value)));
      return (value) => numbers.includes(value) || isCustomary(value);
    },
  };
}

/** Some programs write row numbers, from 0 or 1 on, into a column without a name. */
function isRowNumbers(numbers: readonly (number | null)[]): boolean {
  const first = numbers[0] ?? Number.NaN;
  return (
    numbers.length > 1 && (first === 0 || first === 1) && numbers.every((number, place) => number === first + place)
  );
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
