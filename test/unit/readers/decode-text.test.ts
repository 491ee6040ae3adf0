import { describe, expect, it } from 'vitest';
import { InputError } from '../../../src-main/errors.ts';
import { decodeText } from '../../../src-main/readers/decode-text.ts';
import { bytesOf } from './fixtures/preview.ts';

function errorOf(bytes: readonly number[] | string): InputError {
  try {
    decodeText('file.dat', typeof bytes === 'string' ? bytesOf(bytes) : Uint8Array.from(bytes));
  } catch (error) {
    if (error instanceof InputError) return error;
  }
  throw new Error('the file was decoded');
}

describe('decodeText', () => {
  it.each([
    ['LF', 'a\nb\n'],
    ['CRLF', 'a\r\nb\r\n'],
    ['CR', 'a\rb\r'],
    ['no end at the last line', 'a\nb'],
  ])('cuts lines at %s', (_, text) => {
    expect(decodeText('f', bytesOf(text)).lines).toEqual(['a', 'b']);
  });

  it('keeps blank lines, so that line numbers are those of an editor', () => {
    expect(decodeText('f', bytesOf('\n\na\n\n')).lines).toEqual(['', '', 'a', '']);
  });

  it('skips a byte order mark and says so', () => {
    const file = decodeText('f', bytesOf('\uFEFFyear'));
    expect(file.lines).toEqual(['year']);
    expect(file.notes.join()).toContain('byte order mark');
  });

  it.each([
    ['little-endian', [0xff, 0xfe, 0x61, 0, 0xb0, 0], 'UTF-16LE'],
    ['big-endian', [0xfe, 0xff, 0, 0x61, 0, 0xb0], 'UTF-16BE'],
  ])('reads %s UTF-16 by its mark', (_, bytes, name) => {
    const file = decodeText('f', Uint8Array.from(bytes));
    expect(file.lines).toEqual(['a°']);
    expect(file.notes.join()).toContain(name);
  });

  it('takes bytes that are no UTF-8 as Windows-1252 and says so', () => {
    const file = decodeText('f', Uint8Array.from([0x54, 0x20, 0xb0, 0x43]));
    expect(file.lines).toEqual(['T °C']);
    expect(file.notes.join()).toContain('not UTF-8');
  });

  it.each([
    ['an older spreadsheet', [0xd0, 0xcf, 0x11, 0xe0, 0xa1], '.xls'],
    ['PDF', [0x25, 0x50, 0x44, 0x46, 0x2d], 'PDF'],
    ['gzip', [0x1f, 0x8b, 8], 'gzip'],
    ['other binary content', [0x61, 0x0a, 0, 1, 2], 'binary'],
  ])('refuses %s by name, with a way out', (_, bytes, named) => {
    const { fields } = errorOf(bytes);
    expect(fields).toMatchObject({ code: 'not-text', where: 'file.dat' });
    expect(fields.received).toContain(named);
    expect(fields.hint).toBeTruthy();
  });

  it.each([
    ['no byte', ''],
    ['blanks only', ' \n\t\n'],
    ['a byte order mark only', '\uFEFF'],
  ])('refuses a file with %s', (_, text) => {
    expect(errorOf(text).fields.code).toBe('empty-file');
  });

  it.each(['{"year": [1990]}', '[{"year": 1990}]', ' [\n  [1990, 0.5]\n]'])('refuses JSON: %j', (text) => {
    expect(errorOf(text).fields.received).toContain('JSON');
  });

  it('reads text that begins with a bracket', () => {
    expect(decodeText('f', bytesOf('[invented] level\n1990 1\n')).lines).toHaveLength(2);
  });

  it('refuses a file of more lines than any series of months has', () => {
    expect(errorOf('1990 1\n'.repeat(300_001)).fields).toMatchObject({ code: 'too-many-lines', received: '300001' });
    expect(decodeText('f', bytesOf('1990 1\n'.repeat(300_000))).lines).toHaveLength(300_000);
  });

  it('refuses a saved web page', () => {
    expect(errorOf('<!DOCTYPE html><html><body>Data</body></html>').fields.code).toBe('web-page');
  });
});
