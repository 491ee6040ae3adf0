import { beforeAll, describe, expect, it } from 'vitest';
import { openFile } from '../../../src-main/readers/open-file.ts';
import { monthlyFile } from './fixtures/net-cdf.ts';
import { netCdf3 } from './fixtures/net-cdf-3.ts';
import { netCdf4 } from './fixtures/net-cdf-4.ts';
import { bytesOf, fileError } from './fixtures/preview.ts';
import { workbook } from './fixtures/workbook.ts';

const table = 'year,level\n1990,1.5\n1991,1.75\n';

describe('openFile', () => {
  const files: Record<string, Uint8Array> = {};
  beforeAll(async () => {
    files.text = bytesOf(table);
    files.workbook = await workbook({
      Sheet1: [
        ['year', 'level'],
        [1990, 1.5],
        [1991, 1.75],
      ],
    });
    files['NetCDF-3'] = netCdf3(monthlyFile());
    files['NetCDF-4'] = await netCdf4(monthlyFile());
  });

  it.each([
    ['text', 'text'],
    ['workbook', 'workbook'],
    ['NetCDF-3', 'variables'],
    ['NetCDF-4', 'variables'],
  ])('opens %s by its bytes, however the file is called', async (what, kind) => {
    const bytes = files[what] ?? new Uint8Array();
    for (const fileName of ['a.csv', 'a.xlsx', 'a.nc', 'a']) {
      const opened = await openFile(fileName, bytes);
      expect(opened).toMatchObject({ fileName, sizeBytes: bytes.length, content: { kind } });
    }
  });

  it.each(['PK,year\n1,1990\n2,1991\n', 'CDF,year\n1,1990\n2,1991\n'])('takes text for text: %j', async (text) => {
    expect((await openFile('a.csv', bytesOf(text))).content.kind).toBe('text');
  });

  it.each([
    ['no bytes', '', 'empty-file'],
    ['a web page saved under the name of a table', '<!DOCTYPE html><html>404</html>', 'web-page'],
    ['bytes of nothing known', Uint8Array.from([0, 1, 2, 3]), 'not-text'],
    ['the beginning of a workbook', Uint8Array.from([0x50, 0x4b, 3, 4]), 'damaged-file'],
    ['the beginning of NetCDF-3', Uint8Array.from([0x43, 0x44, 0x46, 1]), 'damaged-file'],
    ['NetCDF of an unknown version', Uint8Array.from([0x43, 0x44, 0x46, 5, 0, 0, 0, 0]), 'damaged-file'],
    ['the beginning of NetCDF-4', Uint8Array.from([0x89, 0x48, 0x44, 0x46, 13, 10, 26, 10]), 'damaged-file'],
  ])('refuses %s', async (_, content, code) => {
    const { fields } = await fileError(bytesOf(content), 'data.csv');
    expect(fields).toMatchObject({ code, where: 'data.csv' });
    expect(fields.hint).toBeTruthy();
  });
});
