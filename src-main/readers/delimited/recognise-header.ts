import type { DelimitedOptions } from '../../contract/series.ts';
import { InputError } from '../../errors.ts';
import type { TextFile } from '../decode-text.ts';
import { splitLine } from '../split-line.ts';
import { headerCells, isComment } from '../split-table.ts';
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

/**
 * The line that names the columns: the one above the first row, comment or not, if it has as many cells as the rows and
 * they are words. A header of which cells are empty, or all are units, goes on in the line above it.
 *
 * @throws InputError `no-such-line` when the options name a line that the file does not have
 */
export function recogniseHeader(file: TextFile, split: Split, options: DelimitedOptions): Header {
  if ((options.headerLine ?? 0) > file.lines.length) throw noSuchLine(file, options.headerLine ?? 0);
  const headerLine = options.headerLine ?? lineAbove(file, split);
  const names = Array.from({ length: split.nCells }, () => '');
  for (let line = headerLine; line > Math.max(0, headerLine - maxHeaderLines); line -= 1) {
    const cells = cellsOf(file, line, split);
    if (line < headerLine && !isHeader(cells, split)) break;
    names.forEach((name, column) => {
      names[column] = [clean(cells[column] ?? ''), name].filter((part) => part !== '').join(' ');
    });
    const isWhole = cells.length >= split.nCells && cells.every((cell, column) => column === 0 || cell !== '');
    if (isWhole && !cells.every(isUnit)) break;
  }
  return { headerLine, names };
}

function lineAbove(file: TextFile, split: Split): number {
  for (let line = split.firstRow; line > 0; line -= 1) {
    const hasWords = /[\p{L}\p{N}]/u.test(file.lines[line - 1] ?? '');
    if (hasWords) return isHeader(cellsOf(file, line, split), split) ? line : 0;
  }
  return 0;
}

function isHeader(cells: readonly string[], { nCells, decimalMark }: Split): boolean {
  if (cells.length !== nCells) return false;
  if (isMonthNumberHeader(cells)) return true;
  const nData = cells.filter((cell) => isDataCell(cell, decimalMark)).length;
  return nData * 2 <= nCells && cells.some((cell) => /\p{L}/u.test(cell));
}

/** The cells of a header line without delimiters at its end, and with a place for row numbers that it does not name. */
function cellsOf({ lines }: TextFile, line: number, { delimiter, commentMark, nCells, firstRow }: Split): string[] {
  const text = lines[line - 1] ?? '';
  const cells = headerCells(text, { delimiter, commentMarks: commentMark === null ? [] : [commentMark] });
  const lastFilled = cells.findLastIndex((cell) => cell !== '');
  const filled = cells.slice(0, Math.max(lastFilled + 1, Math.min(cells.length, nCells)));
  const isNumbered = splitLine(lines[firstRow] ?? '', delimiter)?.[0] === '1';
  const isShifted =
    filled.length === nCells - 1 && isNumbered && !isComment(text, commentMark === null ? [] : [commentMark]);
  return isShifted ? ['', ...filled] : filled;
}

function clean(cell: string): string {
  return cell.replace(/[,;:]+$/, '').trim();
}

function isUnit(cell: string): boolean {
  return /^(|-+|[([].*[\])]|yr|years?|k|°c|°f|ppmv?|ppb|w\/?m.*|1|%)$/i.test(cell);
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
