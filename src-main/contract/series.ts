import { z } from 'zod';
import { longText, recordId, sha256, shortText, timestamp, year, yearSpan } from './primitives.ts';

export const seriesQuantity = z.enum(['temperature-anomaly', 'temperature', 'co2', 'forcing', 'other']);
export type SeriesQuantity = z.infer<typeof seriesQuantity>;

export const timeStep = z.enum(['year', 'month']);
export type TimeStep = z.infer<typeof timeStep>;

/** Values in time order, each calendar step at most once. `null` marks a missing value, which is kept in its place. */
export const seriesValues = z.object({
  years: z.array(year),
  /** 1–12 beside each year for a monthly series; null for an annual one. */
  months: z.array(z.int().min(1).max(12)).nullable(),
  values: z.array(z.number().nullable()),
  /** The provider's limits around each value, at `boundsLevelPercent`; null where there are none. */
  lower: z.array(z.number().nullable()).nullable(),
  upper: z.array(z.number().nullable()).nullable(),
  boundsLevelPercent: z.number().nullable(),
});
export type SeriesValues = z.infer<typeof seriesValues>;

/** A year that the file itself covers only in part, or whose annual value the provider formed from part of it. */
export const partialYear = z.object({ year, note: z.string() });

const seriesDescription = z.object({
  /** Unique in the project; how commands and claims name it. */
  name: z.string().min(1).max(120),
  label: shortText,
  quantity: seriesQuantity,
  /** The forcing agent of a forcing series ("total", "co2", …); null otherwise. */
  agent: z.string().nullable(),
  unit: z.string().max(40),
  step: timeStep,
  baseline: yearSpan.nullable(),
  partialYears: z.array(partialYear),
});

export const series = seriesDescription.extend({
  id: recordId,
  datasetId: recordId,
  valuesDigest: sha256,
  startYear: year,
  endYear: year,
  nPresent: z.int(),
  nMissing: z.int(),
  /** Calendar steps inside the span for which the file has no row at all. */
  nAbsent: z.int(),
});
export type Series = z.infer<typeof series>;

/** A series with its values: what computations receive. */
export const seriesData = z.object({
  name: z.string(),
  quantity: seriesQuantity,
  agent: z.string().nullable(),
  unit: z.string(),
  step: timeStep,
  baseline: yearSpan.nullable(),
  partialYears: z.array(partialYear),
  values: seriesValues,
});
export type SeriesData = z.infer<typeof seriesData>;

/** A line of the file that cannot be used as it stands. */
export const badRow = z.object({
  /** 1-based, as an editor counts. */
  line: z.int().positive(),
  text: z.string(),
  reason: z.string(),
});
export type BadRow = z.infer<typeof badRow>;

/** How to read delimited text; every field that is absent is recognised from the file. */
export const delimitedOptions = z.object({
  delimiter: z.enum([',', ';', '\t', 'blanks']).optional(),
  decimalMark: z.enum(['.', ',']).optional(),
  commentMark: z.string().max(3).optional(),
  /** 1-based line that names the columns; 0 when there is none. */
  headerLine: z.int().min(0).optional(),
  /** 0-based columns. */
  timeColumn: z.int().min(0).optional(),
  monthColumn: z.int().min(0).nullable().optional(),
  valueColumns: z.array(z.int().min(0)).optional(),
  missingMarks: z.array(z.string()).optional(),
});
export type DelimitedOptions = z.infer<typeof delimitedOptions>;

/** What the reviewer says about one offered series; fields that are absent keep what was recognised. */
export const seriesChoice = z.object({
  /** Key of the offered series. */
  key: z.string(),
  name: z.string().min(1).max(120).optional(),
  quantity: seriesQuantity.optional(),
  agent: z.string().nullable().optional(),
  unit: z.string().max(40).optional(),
  baseline: yearSpan.nullable().optional(),
});
export type SeriesChoice = z.infer<typeof seriesChoice>;

export const readOptions = z.object({
  /** Absent: recognised from the content. */
  readerId: z.string().optional(),
  /** The sheet of a workbook; absent: the one that is recognised. */
  sheet: z.string().max(100).optional(),
  delimited: delimitedOptions.optional(),
});
export type ReadOptions = z.infer<typeof readOptions>;

export const offeredSeries = seriesDescription.omit({ name: true }).extend({
  /** Identifies this series among those of the file; stable for the same file and reader. */
  key: z.string(),
  suggestedName: z.string(),
  /** Where unit and baseline come from: the file's own words, what the provider documents, or nowhere yet. */
  unitFrom: z.enum(['file', 'provider', 'unknown']),
  baselineFrom: z.enum(['file', 'provider', 'unknown', 'not needed']),
  /** Taken unless the reviewer says otherwise. */
  isMain: z.boolean(),
  startYear: year,
  endYear: year,
  nPresent: z.int(),
  nMissing: z.int(),
  nAbsent: z.int(),
});
export type OfferedSeries = z.infer<typeof offeredSeries>;

export const readerChoice = z.object({ id: z.string(), title: z.string() });

export const importPreview = z.object({
  fileName: z.string(),
  sizeBytes: z.int(),
  digest: sha256,
  reader: z.object({ id: z.string(), title: z.string(), version: z.string(), why: z.string() }),
  /** All readers, so that the reviewer can choose another. */
  readers: z.array(readerChoice),
  /** Of a workbook: the sheet that was read, and all that hold anything. */
  sheet: z.string().nullable(),
  sheets: z.array(z.string()),
  series: z.array(offeredSeries),
  nRows: z.int(),
  badRows: z.array(badRow),
  /** What the reader noticed and did: a byte order mark, unsorted dates put in order, a part year. */
  notes: z.array(z.string()),
  /** The first lines as they are in the file, and how they were split. */
  head: z.object({
    lines: z.array(z.string()),
    columns: z.array(z.string()),
    rows: z.array(z.array(z.string())),
    options: delimitedOptions.nullable(),
  }),
  /** An earlier import of the same bytes, if there is one. */
  alreadyImportedAs: recordId.nullable(),
});
export type ImportPreview = z.infer<typeof importPreview>;

export const dataset = z.object({
  id: recordId,
  fileName: z.string(),
  sizeBytes: z.int(),
  contentDigest: sha256,
  importedAt: timestamp,
  readerId: z.string(),
  readerVersion: z.string(),
  options: readOptions,
  choices: z.array(seriesChoice),
  nRows: z.int(),
  /** Rows left out by the reviewer's decision, each with its reason. */
  leftOut: z.array(badRow),
  notes: z.array(z.string()),
  licence: longText,
});
export type Dataset = z.infer<typeof dataset>;
