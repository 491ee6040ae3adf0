import type { BadRow, ImportPreview, ReadOptions, Series, SeriesChoice, SeriesValues } from '../contract/series.ts';
import { InputError } from '../errors.ts';
import { countSteps } from './count-steps.ts';
import { decodeText, type TextFile } from './decode-text.ts';
import { delimited } from './delimited/delimited.ts';
import type { ReadSeries, Reader, Reading } from './reader.ts';
import { readers } from './readers.ts';

export interface ReceivedFile {
  fileName: string;
  bytes: Uint8Array;
  options: ReadOptions;
}

/** A file as read, with the series that were chosen and what was said about them. */
export interface DatasetRead {
  readerId: string;
  readerVersion: string;
  series: { description: Omit<Series, 'id' | 'datasetId' | 'valuesDigest'>; values: SeriesValues }[];
  nRows: number;
  badRows: BadRow[];
  notes: string[];
}

const nHeadRows = 20;
/** The head shows this many lines from the first row on, and all above it. */
const nHeadLines = 25;
const maxHeadLines = 250;

/**
 * What a file holds, as recognised or as the options say, for the reviewer to look at before it is imported.
 *
 * @throws InputError naming file, place, what was expected and what to do when the file cannot be read at all
 */
export function previewDataset({
  fileName,
  bytes,
  options,
}: ReceivedFile): Omit<ImportPreview, 'digest' | 'alreadyImportedAs'> {
  const { file, reader, why, reading } = readFile({ fileName, bytes, options });
  const firstLine = reading.table.lines[0]?.line ?? 1;
  return {
    fileName,
    sizeBytes: bytes.length,
    reader: { id: reader.id, title: reader.title, version: reader.version, why },
    readers: readers.map(({ id, title }) => ({ id, title })),
    series: reading.series.map(({ values, ...offered }) => ({ ...offered, ...countSteps(values) })),
    nRows: reading.nRows,
    badRows: reading.badRows,
    notes: notesOf(file, reading),
    head: {
      lines: file.lines.slice(0, Math.min(firstLine + nHeadLines, maxHeadLines)),
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
export function readDataset({
  choices,
  ...received
}: ReceivedFile & { choices: readonly SeriesChoice[] }): DatasetRead {
  const { file, reader, reading } = readFile(received);
  refuseRepeats(received.fileName, choices);
  return {
    readerId: reader.id,
    readerVersion: reader.version,
    series: choices.map((choice) => describeChosen(seriesOfKey(received.fileName, reading, choice.key), choice)),
    nRows: reading.nRows,
    badRows: reading.badRows,
    notes: notesOf(file, reading),
  };
}

function readFile({ fileName, bytes, options }: ReceivedFile): {
  file: TextFile;
  reader: Reader;
  why: string;
  reading: Reading;
} {
  const file = decodeText(fileName, bytes);
  const { reader, why } = chooseReader(file, options);
  return { file, reader, why, reading: reader.read(file, options.delimited) };
}

/** The stated reader; delimited text when its options are stated; else the one that is surest of the content. */
function chooseReader(file: TextFile, options: ReadOptions): { reader: Reader; why: string } {
  if (options.readerId !== undefined) {
    const reader = readers.find(({ id }) => id === options.readerId);
    if (reader === undefined) throw unknownReader(file, options.readerId);
    return { reader, why: 'Chosen by the reviewer' };
  }
  if (options.delimited !== undefined) {
    return { reader: delimited, why: 'The reviewer says how the text is to be split' };
  }
  let best = { reader: delimited, why: '', certainty: 0 };
  const others = readers.filter((reader) => reader !== delimited);
  for (const reader of others) {
    const recognition = reader.recognise(file);
    if (recognition !== null && recognition.certainty > best.certainty) best = { reader, ...recognition };
  }
  if (best.certainty > 0) return best;
  return { reader: delimited, why: delimited.recognise(file)?.why ?? '' };
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

function notesOf(file: TextFile, reading: Reading): string[] {
  return [...file.notes, ...reading.notes];
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

function unknownReader(file: TextFile, id: string): InputError {
  return new InputError({
    code: 'unknown-reader',
    where: file.fileName,
    expected: `one of the readers ${readers.map((reader) => reader.id).join(', ')}`,
    received: id,
    hint: 'Leave the reader open to have the format recognised.',
  });
}
