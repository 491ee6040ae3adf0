import { Unzip, UnzipInflate } from 'fflate';
import { InputError } from '../../errors.ts';

const megabyte = 1_000_000;
/** All parts of a workbook, unpacked; those of the carbon budget take three megabytes. */
const maxUnpackedBytes = 64 * megabyte;
/** Unpacked in one go; a thousand times as many bytes may come out of it. */
const chunkBytes = 16_384;
const maxParts = 1000;
/** Cells of the rectangle that a sheet spans, empty ones counted. */
const maxCells = 3_000_000;

const cellReference = /\sr\s*=\s*["']([A-Za-z]{0,9})(\d{1,15})["']/g;
/** Which part of the list at its end a whole archive has, whatever comes before. */
const endOfArchive = [0x50, 0x4b, 5, 6];

type Parts = Record<string, Uint8Array>;

/**
 * Unpacks the parts of a workbook that are XML, as they come and no further than a workbook can reasonably go: what an
 * archive says about its sizes is not believed.
 *
 * @throws InputError `no-workbook`, `too-large` or `damaged-file`
 */
export function unpackArchive(fileName: string, bytes: Uint8Array): Parts {
  const { names, chunks, nBytes, isWhole } = unpack(fileName, bytes);
  if (nBytes > maxUnpackedBytes || names.length > maxParts) {
    const expected = `at most ${maxUnpackedBytes / megabyte} MB in ${maxParts} parts when unpacked`;
    throw tooLarge(fileName, expected, names.length > maxParts ? `${names.length} parts or more` : 'more');
  }
  if (!isWhole) throw damagedWorkbook(fileName);
  if (!names.includes('xl/workbook.xml')) throw noWorkbook(fileName, names);
  const parts = Object.fromEntries([...chunks].map(([name, pieces]) => [name, joined(pieces)]));
  for (const [name, part] of Object.entries(parts)) {
    if (!/^xl\/worksheets\/[^/]+\.xml$/i.test(name)) continue;
    const nCells = spannedCells(new TextDecoder().decode(part));
    if (nCells > maxCells) {
      throw tooLarge(fileName, `at most ${maxCells} cells in a sheet`, `${nCells} in ${name}, empty ones counted`);
    }
  }
  return parts;
}

function unpack(
  fileName: string,
  bytes: Uint8Array,
): { names: string[]; chunks: Map<string, Uint8Array[]>; nBytes: number; isWhole: boolean } {
  const names: string[] = [];
  const chunks = new Map<string, Uint8Array[]>();
  let [nBytes, nOpen] = [0, 0];
  const archive = new Unzip((part) => {
    names.push(part.name);
    if (!/\.(xml|rels)$/i.test(part.name)) return;
    const pieces: Uint8Array[] = [];
    chunks.set(part.name, pieces);
    nOpen += 1;
    part.ondata = (error, piece, isLast) => {
      if (error !== null) throw error;
      nBytes += piece.length;
      pieces.push(piece);
      if (isLast) nOpen -= 1;
    };
    part.start();
  });
  archive.register(UnzipInflate);
  try {
    for (let at = 0; at < bytes.length && nBytes <= maxUnpackedBytes && names.length <= maxParts; at += chunkBytes) {
      archive.push(bytes.subarray(at, at + chunkBytes), at + chunkBytes >= bytes.length);
    }
  } catch {
    throw damagedWorkbook(fileName);
  }
  return { names, chunks, nBytes, isWhole: nOpen === 0 && hasEnd(bytes) };
}

function hasEnd(bytes: Uint8Array): boolean {
  for (let at = bytes.length - 22; at >= Math.max(0, bytes.length - 70_000); at -= 1) {
    if (endOfArchive.every((byte, place) => bytes[at + place] === byte)) return true;
  }
  return false;
}

function joined(pieces: readonly Uint8Array[]): Uint8Array {
  const whole = new Uint8Array(pieces.reduce((sum, { length }) => sum + length, 0));
  let at = 0;
  for (const piece of pieces) {
    whole.set(piece, at);
    at += piece.length;
  }
  return whole;
}

/** Rows times columns up to the last cell that is named. */
function spannedCells(xml: string): number {
  let [nRows, nColumns] = [0, 1];
  for (const [, letters = '', digits = ''] of xml.matchAll(cellReference)) {
    nRows = Math.max(nRows, Number(digits));
    nColumns = Math.max(nColumns, columnNumber(letters));
  }
  // A reference written with character entities would not be counted: no program writes one.
  return /\sr\s*=\s*["'][^"']*&/.test(xml) ? Infinity : nRows * nColumns;
}

function columnNumber(letters: string): number {
  return [...letters.toUpperCase()].reduce((sum, letter) => sum * 26 + letter.charCodeAt(0) - 64, 0);
}

export function damagedWorkbook(fileName: string): InputError {
  return new InputError({
    code: 'damaged-file',
    where: fileName,
    expected: 'a whole workbook (.xlsx)',
    received: 'a zip archive that cannot be unpacked',
    hint: 'Look whether the download broke off, and whether a spreadsheet program opens the file.',
  });
}

function noWorkbook(fileName: string, names: readonly string[]): InputError {
  const isText = names.includes('mimetype') || names.includes('content.xml');
  const isDocument = names.some((name) => name.startsWith('word/') || name.startsWith('ppt/'));
  const kind = isText
    ? 'an OpenDocument file'
    : isDocument
      ? 'a document or a deck'
      : names.length === 0
        ? 'an empty zip archive'
        : `a zip archive of other files, such as ${names[0]?.slice(0, 60)}`;
  return new InputError({
    code: 'no-workbook',
    where: fileName,
    expected: 'a workbook (.xlsx), a text file or a NetCDF file',
    received: kind,
    hint: isDocument
      ? 'A document is material under review: attach it as a source.'
      : isText
        ? 'Save the sheet as .xlsx or as CSV and import that.'
        : 'Unpack it and import the data file inside.',
  });
}

function tooLarge(fileName: string, expected: string, received: string): InputError {
  const hint = 'Copy the sheet with the annual or monthly values into a workbook of its own, or save it as CSV.';
  return new InputError({ code: 'too-large', where: fileName, expected, received, hint });
}
