import { InputError } from '../errors.ts';

/** A text file as lines, with what was noticed while decoding it. */
export interface TextFile {
  fileName: string;
  lines: readonly string[];
  notes: readonly string[];
}

/** Twenty thousand years by month, and room for a header: no series of years or months is longer. */
const maxLines = 300_000;

/** First bytes of files that are no text, with what they are. */
const signatures: readonly { bytes: readonly number[]; kind: string; hint: string }[] = [
  {
    bytes: [0xd0, 0xcf, 0x11, 0xe0],
    kind: 'a spreadsheet of the older kind (.xls), or one that a password locks',
    hint: 'Files of that kind are not read. Save it as .xlsx without a password, or its sheet as CSV.',
  },
  {
    bytes: [0x25, 0x50, 0x44, 0x46],
    kind: 'a PDF document',
    hint: 'A document is material under review: attach it as a source. Data are imported from text files.',
  },
  { bytes: [0x1f, 0x8b], kind: 'a gzip archive', hint: 'Unpack it first and import the file inside.' },
];

/**
 * Bytes as lines of text: UTF-8 with or without byte order mark, UTF-16 with one, else Windows-1252 (of which Latin-1's
 * printable characters are a part). Lines end with LF, CRLF or CR.
 *
 * @throws InputError `empty-file`, `not-text`, `web-page` or `too-many-lines`
 */
export function decodeText(fileName: string, bytes: Uint8Array): TextFile {
  if (bytes.length === 0) {
    throw unreadable(fileName, 'empty-file', 'an empty file', 'Look whether the download broke off.');
  }
  const signature = signatures.find((known) => known.bytes.every((byte, place) => bytes[place] === byte));
  if (signature) throw unreadable(fileName, 'not-text', signature.kind, signature.hint);
  const { text, notes } = decode(bytes);
  if (text.trim() === '') {
    throw unreadable(fileName, 'empty-file', 'nothing but blanks', 'Look whether the download broke off.');
  }
  if (text.includes('\0')) {
    throw unreadable(
      fileName,
      'not-text',
      'binary content',
      'Text, workbooks (.xlsx) and NetCDF are read. Export the numbers as one of these.',
    );
  }
  if (/^\s*<(!doctype|html|\?xml)/i.test(text)) {
    throw unreadable(
      fileName,
      'web-page',
      'a web page',
      'The page was saved in place of the data file it links to. Download the file itself.',
    );
  }
  if (/^\s*(\[\s*)?[[{]\s*["[{]/.test(text)) {
    throw unreadable(
      fileName,
      'not-text',
      'a JSON document',
      'Files of that kind are not read. Export a table as CSV.',
    );
  }
  const lines = text.split(/\r\n|\n|\r/);
  if (lines.at(-1) === '') lines.pop();
  if (lines.length > maxLines) {
    throw new InputError({
      code: 'too-many-lines',
      where: fileName,
      expected: `at most ${maxLines} lines: a row for each year or month`,
      received: String(lines.length),
      hint: 'Average hourly or daily values to months first; cut a file of many stations or grid cells to one series.',
    });
  }
  return { fileName, lines, notes };
}

function decode(bytes: Uint8Array): { text: string; notes: string[] } {
  const [first, second] = bytes;
  if (first === 0xff && second === 0xfe) return withMark('utf-16le', bytes);
  if (first === 0xfe && second === 0xff) return withMark('utf-16be', bytes);
  if (first === 0xef && second === 0xbb && bytes[2] === 0xbf) {
    return { text: decodeAs('utf-8', bytes), notes: ['The file begins with a byte order mark; it was skipped.'] };
  }
  try {
    return { text: new TextDecoder('utf-8', { fatal: true }).decode(bytes), notes: [] };
  } catch {
    return {
      text: decodeAs('windows-1252', bytes),
      notes: ['The file is not UTF-8; it was read as Windows-1252 (Latin-1).'],
    };
  }
}

function withMark(encoding: string, bytes: Uint8Array): { text: string; notes: string[] } {
  return { text: decodeAs(encoding, bytes), notes: [`The file is ${encoding.toUpperCase()} by its byte order mark.`] };
}

function decodeAs(encoding: string, bytes: Uint8Array): string {
  return new TextDecoder(encoding).decode(bytes);
}

function unreadable(fileName: string, code: string, received: string, hint: string): InputError {
  return new InputError({ code, where: fileName, expected: 'a text file with a table of numbers', received, hint });
}
