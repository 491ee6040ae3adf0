import { describe, expect, it } from 'vitest';
import { igccGmstFile } from './fixtures/layouts.ts';
import { offered, preview, valuesOf } from './fixtures/preview.ts';

describe('igccGmst', () => {
  it('reads mid-year stamps behind a byte order mark, against 1850–1900', () => {
    const found = preview(igccGmstFile());
    expect(found.reader.id).toBe('igcc-gmst');
    expect(offered(found, 'gmst')).toMatchObject({
      suggestedName: 'igcc-gmst-annual',
      quantity: 'temperature-anomaly',
      unit: 'K',
      unitFrom: 'provider',
      baseline: { start: 1850, end: 1900 },
      baselineFrom: 'provider',
      startYear: 1850,
      endYear: 1909,
    });
    expect(valuesOf(igccGmstFile(), 'gmst')).toMatchObject({ months: null });
    expect(found.notes.join('\n')).toContain('byte order mark');
  });

  it('does not claim the base period when the values do not bear it out', () => {
    const found = preview(igccGmstFile(0.3));
    expect(found.reader.id).toBe('delimited');
    expect(offered(found, 'gmst')).toMatchObject({
      quantity: 'temperature-anomaly',
      unit: '',
      baseline: null,
      baselineFrom: 'unknown',
    });
    const told = preview(igccGmstFile(0.3), { readerId: 'igcc-gmst' });
    expect(offered(told, 'gmst')).toMatchObject({ baseline: null, baselineFrom: 'unknown' });
    expect(told.notes.join('\n')).toContain('do not average to zero');
  });
});
