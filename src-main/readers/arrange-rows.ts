import type { BadRow } from '../contract/series.ts';
import { InputError } from '../errors.ts';
import { type Place, type Row, type RowsRead, type ValueColumn, placeName } from './row.ts';

/**
 * Puts rows in order of time and settles repeated ones: a row that repeats an earlier one word for word is left out;
 * of two rows that give different values for the same time the earlier is kept, and both are named.
 *
 * @throws InputError `repeated-times` when conflicts are so many that rows cannot be years or months of one series
 */
export function arrangeRows(fileName: string, rows: readonly Row[], columns: readonly ValueColumn[]): RowsRead {
  const kept = new Map<number, Row>();
  const badRows: BadRow[] = [];
  const conflicts: { first: Row; later: Row }[] = [];
  for (const row of rows) {
    const first = kept.get(orderOf(row));
    if (first === undefined) {
      kept.set(orderOf(row), row);
      continue;
    }
    const difference = firstDifference(first, row, columns);
    if (difference !== null) conflicts.push({ first, later: row });
    const reason =
      difference === null
        ? `repeats line ${first.line}`
        : `gives ${placeName(row)} again with other values than line ${first.line}, which is kept: ${difference}`;
    badRows.push({ line: row.line, text: row.text, reason });
  }
  const [conflict] = conflicts;
  if (conflict && areTooMany(conflicts.length, kept.size)) throw repeatedTimes(fileName, conflict, conflicts.length);
  const notes = conflicts.map(
    ({ first, later }) =>
      `Conflict: lines ${first.line} and ${later.line} give different values for ${placeName(first)}; line ${later.line} is left out.`,
  );
  const inFileOrder = [...kept.values()];
  const inOrder = inFileOrder.toSorted((a, b) => orderOf(a) - orderOf(b));
  return { rows: inOrder, badRows, notes: [...notes, ...noteOrder(inFileOrder, inOrder)] };
}

/** One or two conflicts in a short file are slips; as many as there are times, or half as many in a longer one, are not. */
function areTooMany(nConflicts: number, nKept: number): boolean {
  return nConflicts >= nKept || (nConflicts >= 3 && nConflicts * 2 >= nKept);
}

function orderOf({ year, month }: Place): number {
  return year * 12 + (month ?? 1) - 1;
}

/** In words, the first column in which two rows differ; null when they are the same. */
function firstDifference(first: Row, later: Row, columns: readonly ValueColumn[]): string | null {
  const place = first.values.findIndex((value, index) => value !== later.values[index]);
  if (place === -1) return null;
  const [before, now] = [first.values[place], later.values[place]].map((value) => value ?? 'no value');
  return `${columns[place]?.name ?? 'value'} ${before} there, ${now} here`;
}

function noteOrder(inFileOrder: readonly Row[], inOrder: readonly Row[]): string[] {
  const firstMoved = inFileOrder.find((row, place) => row !== inOrder[place]);
  if (firstMoved === undefined) return [];
  if (inFileOrder.toReversed().every((row, place) => row === inOrder[place])) {
    return ['The file runs from the newest to the oldest row; the values were put in order of time.'];
  }
  const outOfOrder = inFileOrder.find(
    (row, place) => place > 0 && orderOf(row) < orderOf(inFileOrder[place - 1] ?? row),
  );
  return [`Line ${(outOfOrder ?? firstMoved).line} is out of order; the values were put in order of time.`];
}

function repeatedTimes(fileName: string, { first, later }: { first: Row; later: Row }, nConflicts: number): InputError {
  return new InputError({
    code: 'repeated-times',
    where: `${fileName}, line ${later.line}`,
    expected: first.month === null ? 'one row for each year' : 'one row for each month',
    received: `${placeName(later)} again with other values than in line ${first.line}, and ${nConflicts} such rows in all`,
    hint:
      first.month === null
        ? 'If the rows are months, say which column holds the month; if the file holds several series below each other, split it.'
        : 'Daily or weekly values must be averaged to months first; if the file holds several series below each other, split it.',
  });
}
