import fc from 'fast-check';
import { Zip, ZipDeflate, strFromU8, strToU8, unzipSync, zipSync } from 'fflate';
import { beforeAll, describe, expect, it } from 'vitest';
import { InputError } from '../../../../src-main/errors.ts';
import { openWorkbook } from '../../../../src-main/readers/workbook/open-workbook.ts';
import { fileError, offered, previewFile, steps, valuesInFile } from '../fixtures/preview.ts';
import { workbook } from '../fixtures/workbook.ts';

const rows = [
  ['Invented readings at Marrowick, in °C'],
  [null],
  ['year', 'air temperature anomaly (°C)', 'remark, if any'],
  [1990, -0.1, null],
  [1991, 0.30000000000000004, 'said "about 0.3"'],
  [1992, 1e-7, null],
  [1993, null, null],
];

/** The workbook with one of its parts written anew. */
function altered(bytes: Uint8Array, part: string, change: (xml: string) => string): Uint8Array {
  const parts = unzipSync(bytes);
  const old = parts[part];
  if (old === undefined) throw new Error(`no part ${part} among ${Object.keys(parts).join(', ')}`);
  return zipSync({ ...parts, [part]: strToU8(change(strFromU8(old))) });
}

describe('openWorkbook', () => {
  let bytes: Uint8Array;
  beforeAll(async () => {
    bytes = await workbook({
      Empty: [[null]],
      Readings: rows,
      'A & B': [
        ['year', 'x'],
        [1990, 1],
        [1991, 2],
      ],
    });
  });

  it('gives the sheets that hold anything, their rows as lines with all digits', async () => {
    const sheets = await openWorkbook('book.xlsx', bytes);
    expect(sheets.map(({ name }) => name)).toEqual(['Readings', 'A & B']);
    expect(sheets[0]?.file.lines).toEqual([
      '"Invented readings at Marrowick, in °C",,',
      '',
      'year,air temperature anomaly (°C),"remark, if any"',
      '1990,-0.1,',
      '1991,0.30000000000000004,"said ""about 0.3"""',
      '1992,1e-7,',
      '1993,,',
    ]);
  });

  it('is read as a table from the sheet that is recognised, or the one that is chosen', async () => {
    const found = await previewFile(bytes, 'book.xlsx');
    expect(found).toMatchObject({
      reader: { id: 'delimited', title: 'Table in a sheet' },
      sheet: 'Readings',
      sheets: ['Readings', 'A & B'],
    });
    expect(found.reader.why).toBe(
      'The sheet has a header in row 3, years in year; no published layout that is known here',
    );
    expect(offered(found, 'air-temperature-anomaly-c')).toMatchObject({
      unit: 'K',
      quantity: 'temperature-anomaly',
      suggestedName: 'book',
      nMissing: 1,
    });
    expect(found.notes.join('\n')).toContain('Sheet “Readings”; the workbook also holds “A & B”.');
    expect(steps(await valuesInFile(bytes, 'air-temperature-anomaly-c'))).toEqual([
      '1990: -0.1',
      '1991: 0.30000000000000004',
      '1992: 1e-7',
      '1993: null',
    ]);
    const other = await previewFile(bytes, 'book.xlsx', { sheet: 'A & B' });
    expect(other.series.map(({ key }) => key)).toEqual(['x']);
    expect((await valuesInFile(bytes, 'x', { sheet: 'A & B', delimited: { headerLine: 1 } })).values).toEqual([1, 2]);
  });

  it('names the sheets there are when another is chosen', async () => {
    const { fields } = await fileError(bytes, 'book.xlsx', { sheet: 'Empty' });
    expect(fields).toMatchObject({ code: 'unknown-sheet', where: 'book.xlsx', received: 'Empty' });
    expect(fields.expected).toContain('Readings, A & B');
  });

  it('names sheet and row where a sheet holds no table', async () => {
    const prose = await workbook({ Letter: [[null], ['Dear colleague'], ['no numbers here']] });
    expect((await fileError(prose, 'letter.xlsx')).fields).toMatchObject({
      code: 'no-table',
      where: 'letter.xlsx, sheet “Letter”, row 2',
    });
  });

  it('reads dates as months', async () => {
    const dated = await workbook({
      Sheet1: [['date', 'level'], ...[0, 1, 2].map((month) => [new Date(Date.UTC(1990, month, 15)), month + 0.5])],
    });
    expect(steps(await valuesInFile(dated, 'level'))).toEqual(['1990-01: 0.5', '1990-02: 1.5', '1990-03: 2.5']);
  });

  it('recognises a published layout that was pasted into a sheet', async () => {
    const months = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'];
    const header = ['Year', ...months, 'J-D', 'D-N', 'DJF', 'MAM', 'JJA', 'SON'];
    const values = Array.from({ length: 18 }, () => 0.25);
    const pasted = await workbook({
      Sheet1: [['Land-Ocean: Global Means'], header, [1990, ...values], [1991, ...values]],
    });
    expect((await previewFile(pasted, 'b.xlsx')).reader.id).toBe('gistemp');
  });

  it('refuses a workbook of empty sheets', async () => {
    expect((await fileError(await workbook({ A: [[null]], B: [[]] }), 'b.xlsx')).fields.code).toBe('empty-file');
  });

  it.each([
    ['a deck', { 'ppt/presentation.xml': '<p/>' }, 'a document or a deck', 'attach it as a source'],
    [
      'an OpenDocument sheet',
      { mimetype: 'x', 'content.xml': '<o/>' },
      'an OpenDocument file',
      'Save the sheet as .xlsx',
    ],
    ['another archive', { 'data.csv': 'year,a\n1990,1\n' }, 'other files, such as data.csv', 'Unpack it'],
    ['an empty archive', {}, 'an empty zip archive', 'Unpack it'],
  ])('refuses %s, whatever its name', async (_, parts, received, hint) => {
    const zip = zipSync(Object.fromEntries(Object.entries(parts).map(([name, text]) => [name, strToU8(text)])));
    const { fields } = await fileError(zip, 'book.xlsx');
    expect(fields).toMatchObject({ code: 'no-workbook', where: 'book.xlsx' });
    expect(fields.received).toContain(received);
    expect(fields.hint).toContain(hint);
  });

  it.each([
    ['says so', null],
    ['lies about it', 1000],
  ])('refuses a sheet that becomes too large and %s, at once', async (_, stated) => {
    const bomb = altered(bytes, 'xl/worksheets/sheet1.xml', (xml) => xml + ' '.repeat(66_000_000));
    expect(bomb.length).toBeLessThan(120_000);
    const view = new DataView(bomb.buffer, bomb.byteOffset, bomb.length);
    // Sizes stand in the local header of each part and in the central directory.
    for (let at = 0; stated !== null && at + 30 < bomb.length; at += 1) {
      const signature = view.getUint32(at, true);
      const place = signature === 0x04034b50 ? at + 22 : signature === 0x02014b50 ? at + 24 : -1;
      if (place !== -1 && view.getUint32(place, true) > 1_000_000) view.setUint32(place, stated, true);
    }
    const started = performance.now();
    expect((await fileError(bomb, 'bomb.xlsx')).fields).toMatchObject({ code: 'too-large', where: 'bomb.xlsx' });
    // A few tenths of a second where nothing else runs.
    expect(performance.now() - started).toBeLessThan(10_000);
  });

  it('refuses an archive of too many parts', async () => {
    const many = Array.from({ length: 1001 }, (_, place): [string, Uint8Array] => [
      `xl/part${place}.xml`,
      strToU8('<a/>'),
    ]);
    const { fields } = await fileError(zipSync(Object.fromEntries(many)), 'many.xlsx');
    expect(fields).toMatchObject({ code: 'too-large', where: 'many.xlsx' });
  });

  it('reads a workbook that was written as a stream, with the sizes behind each part', async () => {
    const streamed: Uint8Array[] = [];
    const zip = new Zip((error, chunk) => {
      if (error !== null) throw error;
      streamed.push(chunk);
    });
    for (const [name, content] of Object.entries(unzipSync(bytes))) {
      const part = new ZipDeflate(name);
      zip.add(part);
      part.push(content, true);
    }
    zip.end();
    const sheets = await openWorkbook('book.xlsx', Uint8Array.from(Buffer.concat(streamed)));
    expect(sheets[0]?.file.lines[6]).toBe('1993,,');
  });

  it.each([
    ['a cell far away', '<row r="4"><c r="XFD1048576"><v>1</v></c></row>'],
    ['a row far away', '<row r="99999999999"><c r="A99999999999"><v>1</v></c></row>'],
    ['a hidden reference', '<row r="4"><c r="&#88;FD1048576"><v>1</v></c></row>'],
  ])('refuses a sheet with %s', async (_, row) => {
    const far = altered(bytes, 'xl/worksheets/sheet2.xml', (xml) => xml.replace('</sheetData>', `${row}</sheetData>`));
    expect((await fileError(far, 'far.xlsx')).fields).toMatchObject({ code: 'too-large', where: 'far.xlsx' });
  });

  it('is refused with a clear sentence when it is cut short', async () => {
    for (const share of [0.02, 0.5, 0.95]) {
      const { fields } = await fileError(bytes.slice(0, Math.floor(bytes.length * share)), 'cut.xlsx');
      expect(fields).toMatchObject({ code: 'damaged-file', where: 'cut.xlsx' });
    }
  });

  it('gives a table or a clear error when bytes or words of it are exchanged', async () => {
    const parts = Object.keys(unzipSync(bytes)).filter((name) => name.endsWith('.xml'));
    const damage = fc.oneof(
      fc
        .array(fc.record({ at: fc.nat(bytes.length - 1), byte: fc.nat(255) }), { minLength: 1, maxLength: 6 })
        .map((changes) => {
          const other = Uint8Array.from(bytes);
          for (const { at, byte } of changes) other[at] = byte;
          return other;
        }),
      fc
        .record({
          part: fc.constantFrom(...parts),
          at: fc.double({ min: 0, max: 1, noNaN: true }),
          n: fc.nat(30),
          put: fc.string(),
        })
        .map(({ part, at, n, put }) =>
          altered(bytes, part, (xml) => {
            const place = Math.floor(at * xml.length);
            return xml.slice(0, place) + put + xml.slice(place + n);
          }),
        ),
    );
    await fc.assert(
      fc.asyncProperty(damage, async (other) => {
        try {
          await previewFile(other, 'file.xlsx');
        } catch (error) {
          if (!(error instanceof InputError)) throw error;
          expect(error.fields.where).toContain('file.xlsx');
        }
      }),
      { numRuns: 120 },
    );
  });
});
