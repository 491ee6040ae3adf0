import type { TextFile } from './decode-text.ts';
import { type Delimiter, splitLine } from './split-line.ts';

/** How a file is cut into comments, a header and rows. */
export interface TableFormat {
  delimiter: Delimiter;
  /** Marks at the start of a line that make it a comment. */
  commentMarks: readonly string[];
  /** 1-based line that names the columns; 0 when there is none. Rows begin after it. */
  headerLine: number;
}

/** A line under the header that is neither blank nor a comment. */
export interface TableLine {
  /** 1-based. */
  line: number;
  text: string;
  /** null when a quotation mark is opened and not closed. */
  cells: string[] | null;
}

export interface Table {
  fileName: string;
  headerLine: number;
  header: string[];
  lines: TableLine[];
}

/** A line, with those that a quoted cell goes on in. */
export interface JoinedLine {
  text: string;
  cells: string[] | null;
  nLines: number;
}

/** A quoted cell may run over this many lines; a quotation mark left open beyond them is taken as a slip. */
const maxLinesPerRow = 10;

/** Cuts a file into rows of cells. Blank lines and comments are no rows. */
export function splitTable({ fileName, lines }: TextFile, format: TableFormat): Table {
  const { delimiter, commentMarks, headerLine } = format;
  const head = headerLine === 0 ? null : joinQuoted(lines, headerLine - 1, delimiter, null);
  const header = head ? headerCells(head.text, format) : [];
  const rows: TableLine[] = [];
  let place = head ? headerLine - 1 + head.nLines : 0;
  while (place < lines.length) {
    const text = lines[place] ?? '';
    if (text.trim() === '' || isComment(text, commentMarks)) {
      place += 1;
      continue;
    }
    const row = joinQuoted(lines, place, delimiter, header.length);
    rows.push({ line: place + 1, text: row.text, cells: row.cells });
    place += row.nLines;
  }
  return { fileName, headerLine, header, lines: rows };
}

export function isComment(text: string, commentMarks: readonly string[]): boolean {
  const start = text.trimStart();
  return commentMarks.some((mark) => mark !== '' && start.startsWith(mark));
}

/** The first line, 0-based, that is neither blank nor a comment; -1 when there is none. */
export function firstTextLine({ lines }: TextFile, commentMarks: readonly string[] = []): number {
  return lines.findIndex((line) => line.trim() !== '' && !isComment(line, commentMarks));
}

/** The cells of a header, which may stand in a comment. */
export function headerCells(text: string, { commentMarks, delimiter }: Omit<TableFormat, 'headerLine'>): string[] {
  let bare = text.trimStart();
  const mark = commentMarks.find((known) => known !== '' && bare.startsWith(known));
  if (mark !== undefined) bare = bare.slice(mark.length);
  return splitLine(bare, delimiter) ?? bare.split(delimiter === 'blanks' ? /\s+/ : delimiter);
}

/** A cell in quotation marks may hold line ends: the row then goes on in the next line, if that makes it whole. */
export function joinQuoted(
  lines: readonly string[],
  start: number,
  delimiter: Delimiter,
  nCells: number | null,
): JoinedLine {
  const first = lines[start] ?? '';
  const alone = { text: first, cells: splitLine(first, delimiter), nLines: 1 };
  if (delimiter === 'blanks' || alone.cells !== null) return alone;
  let text = first;
  let isOpen = hasOddQuotes(first);
  for (let nLines = 2; nLines <= maxLinesPerRow && start + nLines <= lines.length; nLines += 1) {
    const next = lines[start + nLines - 1] ?? '';
    text += `\n${next}`;
    isOpen = isOpen !== hasOddQuotes(next);
    if (isOpen) continue;
    const cells = splitLine(text, delimiter);
    if (cells !== null && (nCells === null || cells.length === nCells)) return { text, cells, nLines };
  }
  return alone;
}

function hasOddQuotes(text: string): boolean {
  return text.split('"').length % 2 === 0;
}
