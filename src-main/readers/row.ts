import type { BadRow } from '../contract/series.ts';

/** A place in time: a month of a year, or a whole year. */
export interface Place {
  year: number;
  month: number | null;
}

/** A column of numbers, and which of them stand for "no value". */
export interface ValueColumn {
  index: number;
  name: string;
  isMissing: (value: number) => boolean;
}

/** A row that was read: its place in time and one number, or null for "no value", for each value column. */
export interface Row extends Place {
  line: number;
  text: string;
  values: (number | null)[];
}

export interface RowsRead {
  /** In order of time, each place at most once. */
  rows: Row[];
  badRows: BadRow[];
  notes: string[];
}

export function placeName({ year, month }: Place): string {
  return month === null ? String(year) : `${year}-${String(month).padStart(2, '0')}`;
}
