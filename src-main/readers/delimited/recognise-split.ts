import type { DelimitedOptions } from '../../contract/series.ts';
import type { TextFile } from '../decode-text.ts';
import { isMissingText } from '../missing-marks.ts';
import type { DecimalMark } from '../parse-number.ts';
import { type Delimiter, splitLine } from '../split-line.ts';
import { isComment } from '../split-table.ts';
import { isDataCell, isMonthNumberHeader } from './is-data-cell.ts';

/** How the rows of a delimited text are built. */
export interface Split {
  delimiter: Delimiter;
  decimalMark: DecimalMark;
  commentMark: string | null;
  nCells: number;
  /** 0-based line of the first row. */
  firstRow: number;
  /** Lines that look like rows, as far as the file was sampled. */
  nRows: number;
}

interface Rated extends Omit<Split, 'commentMark'> {
  score: number;
}

/** In order of preference where several fit equally well. */
const delimiters: readonly Delimiter[] = ['\t', ';', ',', 'blanks'];
const decimalMarks: readonly DecimalMark[] = ['.', ','];
const commentMarks: readonly string[] = ['#', '%', '//', '!'];
const maxSampleLines = 2000;
/** Of two ways that give as many numbers, the one that leaves fewer cells of something else is right. */
const wordPenalty = 0.001;

/**
 * Recognises comment mark, delimiter and decimal mark of a delimited text: those under which most cells become numbers
 * or dates. What the options state is taken as stated. Null when no line looks like a row.
 */
export function recogniseSplit({ lines }: TextFile, options: DelimitedOptions): Split | null {
  const commentMark = options.commentMark ?? mostFrequentMark(lines);
  const marks = commentMark === null ? [] : [commentMark];
  const sample = lines
    .map((text, place) => ({ text, place }))
    .slice(options.headerLine ?? 0)
    .filter(({ text }) => text.trim() !== '' && !isComment(text, marks))
    .slice(0, maxSampleLines);
  let best: Rated | null = null;
  for (const delimiter of options.delimiter ? [options.delimiter] : delimiters) {
    const split = sample.map(({ text, place }) => ({ place, cells: splitLine(text, delimiter) ?? [] }));
    for (const decimalMark of options.decimalMark ? [options.decimalMark] : decimalMarks) {
      const rated = rate(split, delimiter, decimalMark);
      if (rated !== null && rated.score > (best?.score ?? 0)) best = rated;
    }
  }
  return best && { ...best, commentMark };
}

function mostFrequentMark(lines: readonly string[]): string | null {
  const counts = commentMarks.map((mark) => ({ mark, n: lines.filter((line) => isComment(line, [mark])).length }));
  const [most] = counts.toSorted((a, b) => b.n - a.n);
  return most && most.n > 0 ? most.mark : null;
}

/** How many cells become numbers or dates, in lines of the most frequent number of cells. */
function rate(
  lines: readonly { place: number; cells: readonly string[] }[],
  delimiter: Delimiter,
  decimalMark: DecimalMark,
): Rated | null {
  const rows = lines
    .filter(({ cells }) => !isMonthNumberHeader(cells))
    .map(({ place, cells }) => ({
      place,
      nCells: cells.length,
      nData: cells.filter((cell) => isDataCell(cell, decimalMark)).length,
      nMissing: cells.filter(isMissingText).length,
    }))
    // A number or date, and either another or nothing but marks for "no value" beside it.
    .filter(({ nCells, nData, nMissing }) => nData >= 2 || (nData === 1 && nCells > 1 && nMissing === nCells - 1));
  const counts = new Map<number, number>();
  for (const { nCells, nData, nMissing } of rows) {
    const nWords = nCells - nData - nMissing;
    counts.set(nCells, (counts.get(nCells) ?? 0) + nData - nWords * wordPenalty);
  }
  const [winner] = [...counts].toSorted((a, b) => b[1] - a[1]);
  const firstRow = rows.find(({ nCells }) => nCells === winner?.[0]);
  if (winner === undefined || firstRow === undefined) return null;
  const nRows = rows.filter(({ nCells }) => nCells === winner[0]).length;
  return { delimiter, decimalMark, nCells: winner[0], firstRow: firstRow.place, nRows, score: winner[1] };
}
