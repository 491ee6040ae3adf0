import { zipSync } from 'fflate';
import { InputError } from '../../errors.ts';
import type { Sheet } from '../opened-file.ts';
import { damagedWorkbook, unpackArchive } from './unpack-archive.ts';
import { sheetLines } from './sheet-lines.ts';

/**
 * The sheets of a workbook (.xlsx) that hold anything, in their order.
 *
 * @throws InputError `no-workbook`, `too-large`, `damaged-file` or `empty-file`
 */
export async function openWorkbook(fileName: string, bytes: Uint8Array): Promise<Sheet[]> {
  // The library is handed what was unpacked within bounds, and nothing else.
  const safe = zipSync(unpackArchive(fileName, bytes), { level: 0 });
  const { default: readWorkbook } = await import('read-excel-file/universal');
  const read = await readWorkbook(safe.buffer).catch(() => {
    throw damagedWorkbook(fileName);
  });
  const sheets = read
    .map(({ sheet, data }) => ({ name: sheet, lines: sheetLines(data) }))
    .filter(({ lines }) => lines.some((line) => line !== ''));
  if (sheets.length === 0) {
    throw new InputError({
      code: 'empty-file',
      where: fileName,
      expected: 'a sheet with a table of numbers',
      received: 'a workbook in which every sheet is empty',
      hint: 'Look whether the numbers stand in pictures or charts only.',
    });
  }
  return sheets.map(({ name, lines }) => ({ name, file: { fileName, lines, notes: [] } }));
}
