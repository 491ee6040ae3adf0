import { describe, expect, it } from 'vitest';
import { uahFile } from './fixtures/layouts.ts';
import { offered, preview, steps, valuesOf } from './fixtures/preview.ts';

describe('uah', () => {
  it('gives repeated column names their region', () => {
    const found = preview(uahFile, {}, 'uahncdc_lt_6.1.txt');
    expect(found.reader.id).toBe('uah');
    expect(found.series.map(({ key }) => key)).toEqual([
      'globe',
      'globe-land',
      'globe-ocean',
      'nh',
      'nh-land',
      'nh-ocean',
      'sh',
      'sh-land',
      'sh-ocean',
      'usa48',
    ]);
    expect(found.series.filter(({ isMain }) => isMain).map(({ key }) => key)).toEqual(['globe']);
    expect(steps(valuesOf(uahFile, 'globe'))).toEqual(['1990-11: -0.25', '1990-12: 0.13', '1991-01: 0.2']);
    expect(valuesOf(uahFile, 'nh-land').values).toEqual([-0.3, 0.2, null]);
  });

  it('takes the base period from the remarks, which with the trends are no rows', () => {
    const found = preview(uahFile, {}, 'uahncdc_lt_6.1.txt');
    expect(offered(found, 'globe')).toMatchObject({
      suggestedName: 'uah-globe-monthly',
      label: 'UAH lower troposphere, Globe, monthly mean',
      unit: 'K',
      baseline: { start: 1991, end: 2020 },
      baselineFrom: 'file',
    });
    expect(found.badRows).toEqual([]);
    expect(found.notes.join('\n')).toContain('lines 5, 7, 9, 10');
    expect(found.notes.join('\n')).toContain('not surface temperatures');
  });

  it('lists a damaged row', () => {
    expect(preview(uahFile.replace('1990 12  0.13', '1990 12  0.l3')).badRows.map(({ line }) => line)).toEqual([3]);
  });
});
