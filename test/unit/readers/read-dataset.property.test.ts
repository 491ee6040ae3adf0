import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { importPreview } from '../../../src-main/contract/series.ts';
import { InputError } from '../../../src-main/errors.ts';
import { openFile } from '../../../src-main/readers/open-file.ts';
import { previewDataset, readDataset } from '../../../src-main/readers/read-dataset.ts';
import { readers } from '../../../src-main/readers/readers.ts';
import * as layouts from './fixtures/layouts.ts';
import { bytesOf } from './fixtures/preview.ts';

const files = Object.values(layouts).map((file) => (typeof file === 'string' ? file : file(0.1)));

/** A published layout with characters taken out, put in or exchanged. */
const damaged = fc
  .record({
    file: fc.constantFrom(...files),
    cuts: fc.array(
      fc.record({ at: fc.double({ min: 0, max: 1, noNaN: true }), n: fc.nat(12), put: fc.string({ maxLength: 4 }) }),
      {
        minLength: 1,
        maxLength: 6,
      },
    ),
  })
  .map(({ file, cuts }) =>
    cuts.reduce((text, { at, n, put }) => {
      const place = Math.floor(at * text.length);
      return text.slice(0, place) + put + text.slice(place + n);
    }, file),
  );

/** Reads a file whole; true when it was read, false when it was refused with an InputError. */
async function isRead(bytes: Uint8Array, readerId: string | undefined): Promise<boolean> {
  const options = readerId === undefined ? {} : { readerId };
  try {
    const opened = await openFile('file.csv', bytes);
    const found = previewDataset(opened, options);
    importPreview.parse({ ...found, digest: '0'.repeat(64), alreadyImportedAs: null });
    const choices = found.series.map(({ key }) => ({ key }));
    const { series } = readDataset(opened, options, choices);
    for (const { values, description } of series) {
      expect(values.values.every((value) => value === null || Number.isFinite(value))).toBe(true);
      const places = values.years.map((year, place) => year * 12 + (values.months?.[place] ?? 1));
      expect(places.every((place, index) => index === 0 || place > (places[index - 1] ?? place))).toBe(true);
      expect(description.nPresent + description.nMissing).toBe(values.values.length);
      expect(description.nAbsent).toBeGreaterThanOrEqual(0);
    }
    return true;
  } catch (error) {
    if (!(error instanceof InputError)) throw error;
    expect(error.fields.where).toContain('file.csv');
    return false;
  }
}

describe('reading any file', () => {
  it('gives series in order of time or a clear error for damaged files of each layout', async () => {
    let nRead = 0;
    await fc.assert(
      fc.asyncProperty(damaged, async (text) => {
        nRead += (await isRead(bytesOf(text), undefined)) ? 1 : 0;
      }),
      { numRuns: 400 },
    );
    expect(nRead).toBeGreaterThan(100);
  });

  it('never fails in another way, whichever reader is told to read what', async () => {
    const readerId = fc.constantFrom(undefined, 'net-cdf', ...readers.map(({ id }) => id));
    const bytes = fc.oneof(
      fc.uint8Array({ maxLength: 200 }),
      fc.string({ maxLength: 200, unit: 'grapheme' }).map(bytesOf),
      damaged.map(bytesOf),
    );
    await fc.assert(
      fc.asyncProperty(bytes, readerId, async (content, id) => {
        await isRead(content, id);
      }),
      { numRuns: 600 },
    );
  });
});
