import Papa from 'papaparse';
import type { DelimitedOptions } from '../contract/series.ts';

export type Delimiter = NonNullable<DelimitedOptions['delimiter']>;

/** The cells of one line, trimmed; null when a quotation mark is opened and not closed. */
export function splitLine(line: string, delimiter: Delimiter): string[] | null {
  if (delimiter === 'blanks') return splitAtBlanks(line.trim());
  if (!line.includes('"')) return trimAll(line.split(delimiter));
  const { data, errors } = Papa.parse<string[]>(line, { delimiter, newline: '\n' });
  return errors.some((error) => error.type === 'Quotes') ? null : trimAll(data[0] ?? []);
}

function splitAtBlanks(line: string): string[] | null {
  if (!line.includes('"')) return line.split(/\s+/);
  const cells = line.match(/"(?:[^"]|"")*"|[^\s"]+/g) ?? [];
  if ((line.match(/"/g)?.length ?? 0) % 2 === 1) return null;
  return trimAll(cells.map((cell) => (cell.startsWith('"') ? cell.slice(1, -1).replaceAll('""', '"') : cell)));
}

function trimAll(cells: readonly string[]): string[] {
  return cells.map((cell) => cell.trim());
}
