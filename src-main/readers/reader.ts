import type { BadRow, DelimitedOptions, OfferedSeries, SeriesValues } from '../contract/series.ts';
import type { TextFile } from './decode-text.ts';
import type { Table } from './split-table.ts';

/** Why a reader thinks that a file is of its format, and how sure it is: from 0 to 1. */
export interface Recognition {
  certainty: number;
  why: string;
}

type Counts = 'startYear' | 'endYear' | 'nPresent' | 'nMissing' | 'nAbsent';

/** A series as a reader takes it out of a file; its span and counts follow from the values. */
export type ReadSeries = Omit<OfferedSeries, Counts> & { values: SeriesValues };

/** All that a reader takes out of a file. */
export interface Reading {
  series: ReadSeries[];
  /** Rows that became values; bad rows are not among them. */
  nRows: number;
  badRows: BadRow[];
  notes: string[];
  columns: readonly string[];
  /** The lines as they were split. */
  table: Table;
  /** How the text was split; null for a format that leaves no choice. */
  options: DelimitedOptions | null;
}

/** One published layout. */
export interface Reader {
  id: string;
  title: string;
  version: string;
  recognise(file: TextFile): Recognition | null;
  /** @throws InputError naming file and line when the file is not of this format or holds no usable row */
  read(file: TextFile, options?: DelimitedOptions): Reading;
}
