import { decodeText } from './decode-text.ts';
import { openNetCdf3 } from './net-cdf/open-net-cdf-3.ts';
import { openNetCdf4 } from './net-cdf/open-net-cdf-4.ts';
import type { FileContent, OpenedFile } from './opened-file.ts';
import { openWorkbook } from './workbook/open-workbook.ts';

type Opener = (fileName: string, bytes: Uint8Array) => Promise<FileContent>;

/** Files that are no text, by their first bytes: what is in them counts, not how they are called. */
const openers: readonly { starts: readonly (readonly number[])[]; open: Opener }[] = [
  {
    // A zip archive: one with parts, an empty one, one of several volumes.
    starts: [
      [0x50, 0x4b, 3, 4],
      [0x50, 0x4b, 5, 6],
      [0x50, 0x4b, 7, 8],
    ],
    open: async (fileName, bytes) => ({ kind: 'workbook', sheets: await openWorkbook(fileName, bytes) }),
  },
  {
    // Classic format, 64-bit offsets, 64-bit data.
    starts: [1, 2, 5].map((version) => [0x43, 0x44, 0x46, version]),
    open: async (fileName, bytes) => ({ kind: 'variables', file: openNetCdf3(fileName, bytes) }),
  },
  {
    starts: [[0x89, 0x48, 0x44, 0x46]],
    open: async (fileName, bytes) => ({ kind: 'variables', file: await openNetCdf4(fileName, bytes) }),
  },
];

/**
 * Opens a received file by what it is: text, a workbook, or variables of a NetCDF file.
 *
 * @throws InputError naming the file, what was expected and what to do when it is none of them or damaged
 */
export async function openFile(fileName: string, bytes: Uint8Array): Promise<OpenedFile> {
  const opener = openers.find(({ starts }) =>
    starts.some((start) => start.every((byte, place) => bytes[place] === byte)),
  );
  const content: FileContent = opener
    ? await opener.open(fileName, bytes)
    : { kind: 'text', file: decodeText(fileName, bytes) };
  return { fileName, sizeBytes: bytes.length, content };
}
