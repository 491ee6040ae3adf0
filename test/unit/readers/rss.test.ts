import { describe, expect, it } from 'vitest';
import { rssFile } from './fixtures/layouts.ts';
import { offered, preview, steps, valuesOf } from './fixtures/preview.ts';

const fileName = 'RSS_Monthly_MSU_AMSU_Channel_TLT_Anomalies_Land_and_Ocean_v04_0.txt';

describe('rss', () => {
  it('offers the bands that the header names, the widest one first', () => {
    const found = preview(rssFile, {}, fileName);
    expect(found.reader.id).toBe('rss');
    expect(found.series).toHaveLength(9);
    expect(found.series.filter(({ isMain }) => isMain).map(({ key }) => key)).toEqual(['s70-0-to-82-5']);
    expect(offered(found, 's70-0-to-82-5')).toMatchObject({
      label: 'RSS lower troposphere (TLT), latitudes -70.0/82.5, monthly mean',
      quantity: 'temperature-anomaly',
      unit: 'K',
      unitFrom: 'provider',
      baseline: { start: 1979, end: 1998 },
      partialYears: [
        { year: 1990, note: '2 of 12 months have a value' },
        { year: 1991, note: '1 of 12 months have a value' },
      ],
    });
    expect(steps(valuesOf(rssFile, 's70-0-to-82-5'))).toEqual(['1990-11: -0.25', '1990-12: 0.125', '1991-01: 0.25']);
  });

  it('takes -99.9 as missing and says that the widest band is no global mean', () => {
    expect(valuesOf(rssFile, 's70-0-to-s60-0').values).toEqual([null, null, 0.25]);
    const notes = preview(rssFile, {}, fileName).notes.join('\n');
    expect(notes).toContain('“-99.9” twice');
    expect(notes).toContain('not a global mean');
    expect(notes).toContain('not surface temperatures');
  });

  it('offers only the first band where the header names none', () => {
    const bare = rssFile.split('\n').slice(3).join('\n');
    const found = preview(bare, {}, fileName);
    expect(found.reader.id).toBe('rss');
    expect(found.series.map(({ key }) => key)).toEqual(['s70-0-to-82-5']);
    expect(found.notes.join('\n')).toContain('does not name all bands');
    expect(preview(bare, {}, 'table.txt').reader.id).toBe('delimited');
  });
});
