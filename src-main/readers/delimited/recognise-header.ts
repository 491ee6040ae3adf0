import type { DelimitedOptions } from '../../contract/series.ts';
import type { TextFile } from '../decode-text.ts';
import { splitLine } from '../split-line.ts';
import { headerCells, isComment, joinQuoted } from '../split-table.ts';
import { isDataCell, isMonthNumberHeader } from './is-data-cell.ts';
import type { Split } from './recognise-split.ts';

export interface Header {
  /** 1-based; 0 when no line names the columns. */
  headerLine: number;
  /** One name for each column; empty where the file gives none. */
  names: string[];
}

/** A header may run over this many lines. */
const maxHeaderLines = 3;
/** How far above the first row a header is looked for, blank lines not counted. */
const maxLinesAbove = 10;

/**
 * The line that names the columns: the one above the first row, comment or not, if it has as many cells as the rows and
 * they are words. A header of which cells are empty, or all are units, goes on in the line above it.
 */
export function recogniseHeader(file: TextFile, split: Split, options: DelimitedOptions): Header {
  const headerLine = options.headerLine ?? lineAbove(file, split);
  const names = Array.from({ length: split.nCells }, () => '');
  for (let line = headerLine; line > Math.max(0, headerLine - maxHeaderLines); line -= 1) {
    const cells = cellsOf(file, line, split);
    if (
      line < headerLine &&
      (cells.length !== split.nCells || cells.some((cell) => isDataCell(cell, split.decimalMark)))
    )
      break;
    names.forEach((name, column) => {
      names[column] = [clean(cells[column] ?? ''), name].filter((part) => part !== '').join(' ');
    });
    const isWhole = cells.length >= split.nCells && cells.every((cell, column) => column === 0 || cell !== '');
    if (isWhole && !cells.every(isUnit)) break;
  }
  return { headerLine, names };
}

/**
 * The nearest line of nothing but words, with damaged rows in between if need be; else the nearest that is words in the
 * main (a header may hold numbers: 5, 50 and 95 for percentiles).
 */
function lineAbove(file: TextFile, split: Split): number {
  let mixed = 0;
  for (let line = split.firstRow, nLooked = 0; line > 0 && nLooked < maxLinesAbove; line -= 1) {
    if (!/[\p{L}\p{N}]/u.test(file.lines[line - 1] ?? '')) continue;
    nLooked += 1;
    line = startOf(file, line, split);
    const cells = cellsOf(file, line, split);
    if (cells.length !== split.nCells) break;
    const nData = cells.filter((cell) => isDataCell(cell, split.decimalMark)).length;
    if (!cells.some((cell) => /\p{L}/u.test(cell))) continue;
    if (nData === 0 || isMonthNumberHeader(cells)) return line;
    if (mixed === 0 && nData * 2 <= split.nCells && !isDataCell(cells[0] ?? '', split.decimalMark)) mixed = line;
  }
  return mixed;
}

/** Where a row begins of which a quoted cell holds line ends, so that `line` is its last. */
function startOf({ lines }: TextFile, line: number, { delimiter }: Split): number {
  for (let nBefore = maxHeaderLines - 1; nBefore > 0; nBefore -= 1) {
    const start = line - nBefore;
    if (start > 0 && joinQuoted(lines, start - 1, delimiter, null).nLines === nBefore + 1) return start;
  }
  return line;
}

/** The cells of a header line without delimiters at its end, and with a place for row numbers that it does not name. */
function cellsOf({ lines }: TextFile, line: number, { delimiter, commentMark, nCells, firstRow }: Split): string[] {
  const { text } = joinQuoted(lines, line - 1, delimiter, null);
  const cells = headerCells(text, { delimiter, commentMarks: commentMark === null ? [] : [commentMark] });
  const lastFilled = cells.findLastIndex((cell) => cell !== '');
  const filled = cells.slice(0, Math.max(lastFilled + 1, Math.min(cells.length, nCells)));
  const isNumbered = splitLine(lines[firstRow] ?? '', delimiter)?.[0] === '1';
  const isShifted =
    filled.length === nCells - 1 && isNumbered && !isComment(text, commentMark === null ? [] : [commentMark]);
  return isShifted ? ['', ...filled] : filled;
}

function clean(cell: string): string {
  return /^-+$/.test(cell) ? '' : cell.replace(/[,;:]+$/, '').trim();
}

function isUnit(cell: string): boolean {
  return /^(|-+|[([].*[\])]|yr|years?|k|°c|°f|ppmv?|ppbv?|pptv?|w\/?m.*|[mck]?m|gtc|pgc|zj|1|%)$/i.test(cell);
}
