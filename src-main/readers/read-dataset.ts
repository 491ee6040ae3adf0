import type { BadRow, ImportPreview, ReadOptions, Series, SeriesChoice, SeriesValues } from '../contract/series.ts';
import { InputError } from '../errors.ts';
import { countSteps } from './count-steps.ts';
import type { TextFile } from './decode-text.ts';
import { delimited } from './delimited/delimited.ts';
import { netCdf } from './net-cdf/net-cdf.ts';
import { variableLines } from './net-cdf/variable-lines.ts';
import type { OpenedFile, Sheet } from './opened-file.ts';
import type { ReadSeries, Reader, Reading, Recognition } from './reader.ts';
import { readers } from './readers.ts';

/** A file as read, with the series that were chosen and what was said about them. */
export interface DatasetRead {
  readerId: string;
  readerVersion: string;
  series: { description: Omit<Series, 'id' | 'datasetId' | 'valuesDigest'>; values: SeriesValues }[];
  nRows: number;
  badRows: BadRow[];
  notes: string[];
}

/** What reads delimited text reads the rows of a sheet, which has no delimiters. */
const sheetReaders = readers.map((reader) =>
  reader === delimited ? { ...reader, title: 'Table in a sheet' } : reader,
);
const nHeadRows = 20;
/** The head shows this many lines from the first row on, and all above it. */
const nHeadLines = 25;
const maxHeadLines = 250;

/**
 * What a file holds, as recognised or as the options say, for the reviewer to look at before it is imported.
 *
 * @throws InputError naming file, place, what was expected and what to do when the file cannot be read at all
 */
export function previewDataset(
  opened: OpenedFile,
  options: ReadOptions,
): Omit<ImportPreview, 'digest' | 'alreadyImportedAs'> {
  const { fileName, sizeBytes, content } = opened;
  const { reader, why, reading, lines, sheet, notes } = readFile(opened, options);
  const firstLine = reading.table.lines[0]?.line ?? 1;
  const choices = content.kind === 'variables' ? [netCdf] : content.kind === 'workbook' ? sheetReaders : readers;
  return {
    fileName,
    sizeBytes,
    reader: { id: reader.id, title: reader.title, version: reader.version, why },
    readers: choices.map(({ id, title }) => ({ id, title })),
    sheet,
    sheets: content.kind === 'workbook' ? content.sheets.map(({ name }) => name) : [],
    series: reading.series.map(({ values, ...offered }) => ({ ...offered, ...countSteps(values) })),
    nRows: reading.nRows,
    badRows: reading.badRows,
    notes: [...notes, ...reading.notes],
    head: {
      lines: lines.slice(0, Math.min(firstLine + nHeadLines, maxHeadLines)),
      columns: [...reading.columns],
      rows: reading.table.lines.slice(0, nHeadRows).map(({ cells, text }) => cells ?? [text]),
      options: reading.options,
    },
  };
}

/**
 * Reads the chosen series of a file. What a choice leaves open stays as recognised.
 *
 * @throws InputError as `previewDataset`; `unknown-series` or `series-twice` naming the keys there are
 */
export function readDataset(opened: OpenedFile, options: ReadOptions, choices: readonly SeriesChoice[]): DatasetRead {
  const { reader, reading, notes } = readFile(opened, options);
  refuseRepeats(opened.fileName, choices);
  return {
    readerId: reader.id,
    readerVersion: reader.version,
    series: choices.map((choice) => describeChosen(seriesOfKey(opened.fileName, reading, choice.key), choice)),
    nRows: reading.nRows,
    badRows: reading.badRows,
    notes: [...notes, ...reading.notes],
  };
}

/** A file as its reader took it: which reader, why, and from which sheet. */
interface ReadFile {
  reader: Pick<Reader, 'id' | 'title' | 'version'>;
  why: string;
  reading: Reading;
  /** The lines that the head of the preview shows, from the first of the file on. */
  lines: readonly string[];
  sheet: string | null;
  notes: readonly string[];
}

function readFile({ fileName, content }: OpenedFile, options: ReadOptions): ReadFile {
  if (content.kind === 'variables') {
    refuseUnknownReader(fileName, options.readerId, [netCdf]);
    const why = options.readerId === undefined ? netCdf.why(content.file) : 'Chosen by the reviewer';
    const lines = variableLines(content.file);
    return { reader: netCdf, why, reading: netCdf.read(content.file), lines, sheet: null, notes: [] };
  }
  refuseUnknownReader(fileName, options.readerId, readers);
  if (content.kind === 'workbook') return readSheet(fileName, content.sheets, options);
  const { reader, why } = chooseReader(content.file, options);
  const { lines, notes } = content.file;
  return { reader, why, reading: reader.read(content.file, options.delimited), lines, sheet: null, notes };
}

/** The stated reader; delimited text when its options are stated; else the one that is surest of the content. */
function chooseReader(file: TextFile, options: ReadOptions): Recognition & { reader: Reader } {
  const chosen = readers.find(({ id }) => id === options.readerId);
  if (chosen !== undefined) {
    return { reader: chosen, why: 'Chosen by the reviewer', certainty: chosen.recognise(file)?.certainty ?? 0 };
  }
  if (options.delimited !== undefined) {
    return { reader: delimited, why: 'The reviewer says how the text is to be split', certainty: 1 };
  }
  let best: Recognition & { reader: Reader } = { reader: delimited, why: '', certainty: 0 };
  const others = readers.filter((reader) => reader !== delimited);
  for (const reader of others) {
    const recognition = reader.recognise(file);
    if (recognition !== null && recognition.certainty > best.certainty) best = { reader, ...recognition };
  }
  if (best.certainty > 0) return best;
  return { reader: delimited, why: '', certainty: 0, ...delimited.recognise(file) };
}

/** The stated sheet, or the one that a reader is surest of; the first of several. */
function readSheet(fileName: string, sheets: readonly Sheet[], options: ReadOptions): ReadFile {
  const stated = sheets.filter(({ name }) => options.sheet === undefined || name === options.sheet);
  const choices = stated.map((sheet) => ({ sheet, ...chooseReader(sheet.file, options) }));
  const [best] = choices.toSorted((a, b) => b.certainty - a.certainty);
  if (best === undefined) throw unknownSheet(fileName, sheets, options.sheet);
  const { sheet, reader, why } = best;
  const others = sheets.filter(({ name }) => name !== sheet.name).map(({ name }) => `“${name}”`);
  try {
    const reading = reader.read(sheet.file, { ...options.delimited, delimiter: ',' });
    return {
      reader: sheetReaders.find(({ id }) => id === reader.id) ?? reader,
      why: why.replace('Columns separated by commas, a header in line', 'The sheet has a header in row'),
      reading,
      lines: sheet.file.lines,
      sheet: sheet.name,
      notes: others.length === 0 ? [] : [`Sheet “${sheet.name}”; the workbook also holds ${others.join(', ')}.`],
    };
  } catch (error) {
    if (!(error instanceof InputError)) throw error;
    const where = error.fields.where.replace(fileName, `${fileName}, sheet “${sheet.name}”`);
    throw new InputError({ ...error.fields, where: where.replace(/, line (\d+)$/, ', row $1') });
  }
}

function describeChosen(series: ReadSeries, choice: SeriesChoice): DatasetRead['series'][number] {
  const { values } = series;
  return {
    description: {
      name: choice.name ?? series.suggestedName,
      label: series.label,
      quantity: choice.quantity ?? series.quantity,
      agent: choice.agent === undefined ? series.agent : choice.agent,
      unit: choice.unit ?? series.unit,
      step: series.step,
      baseline: choice.baseline === undefined ? series.baseline : choice.baseline,
      partialYears: series.partialYears,
      ...countSteps(values),
    },
    values,
  };
}

function seriesOfKey(fileName: string, { series }: Reading, key: string): ReadSeries {
  const found = series.find((one) => one.key === key);
  if (found !== undefined) return found;
  throw new InputError({
    code: 'unknown-series',
    where: fileName,
    expected: `one of the series ${series.map((one) => one.key).join(', ')}`,
    received: key,
    hint: 'Choose series by the keys that the preview gives.',
  });
}

function refuseRepeats(fileName: string, choices: readonly SeriesChoice[]): void {
  const repeated = choices.find(({ key }, place) => choices.findIndex((other) => other.key === key) !== place);
  if (repeated === undefined) return;
  throw new InputError({
    code: 'series-twice',
    where: fileName,
    expected: 'each series at most once',
    received: `${repeated.key} twice`,
    hint: 'Take it once; a series can be renamed later.',
  });
}

function refuseUnknownReader(fileName: string, id: string | undefined, known: readonly Pick<Reader, 'id'>[]): void {
  if (id === undefined || known.some((reader) => reader.id === id)) return;
  throw new InputError({
    code: 'unknown-reader',
    where: fileName,
    expected: `one of the readers ${known.map((reader) => reader.id).join(', ')}`,
    received: id,
    hint: 'Leave the reader open to have the format recognised.',
  });
}

function unknownSheet(fileName: string, sheets: readonly Sheet[], name: string | undefined): InputError {
  return new InputError({
    code: 'unknown-sheet',
    where: fileName,
    expected: `one of the sheets ${sheets.map((sheet) => sheet.name).join(', ')}`,
    received: name ?? '',
    hint: 'Sheets without any cell are not listed.',
  });
}
