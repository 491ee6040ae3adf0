import { describe, expect, it } from 'vitest';
import { berkeleyEarthFile } from './fixtures/layouts.ts';
import { offered, preview, steps, valuesOf } from './fixtures/preview.ts';

describe('berkeleyEarth', () => {
  it('keeps the two records of one file apart', () => {
    const found = preview(berkeleyEarthFile);
    expect(found.reader.id).toBe('berkeley-earth');
    expect(found.badRows).toEqual([]);
    expect(found.nRows).toBe(5);
    expect(found.series.map(({ key, isMain }) => [key, isMain])).toEqual([
      ['air-monthly', true],
      ['air-annual', false],
      ['water-monthly', false],
      ['water-annual', false],
    ]);
    expect(steps(valuesOf(berkeleyEarthFile, 'air-monthly'))).toEqual([
      '1990-05: -0.75',
      '1990-06: 0.25',
      '1990-07: null',
    ]);
    expect(steps(valuesOf(berkeleyEarthFile, 'water-monthly'))).toEqual(['1990-05: -0.5', '1990-06: 0.125']);
  });

  it('takes unit and base period from the comments, and 95 % limits', () => {
    const series = offered(preview(berkeleyEarthFile), 'air-monthly');
    expect(series).toMatchObject({
      unit: 'K',
      unitFrom: 'file',
      baseline: { start: 1951, end: 1980 },
      baselineFrom: 'file',
    });
    const { lower, upper, boundsLevelPercent } = valuesOf(berkeleyEarthFile, 'air-monthly');
    expect(boundsLevelPercent).toBe(95);
    expect([lower?.[1], upper?.[1], upper?.[2]]).toEqual([0.25 - 0.4, 0.25 + 0.4, null]);
  });

  it('takes the moving average that stands at June for the annual mean', () => {
    expect(steps(valuesOf(berkeleyEarthFile, 'air-annual'))).toEqual(['1990: 0.5']);
    expect(valuesOf(berkeleyEarthFile, 'air-annual').lower).toEqual([0.375]);
  });

  it('reads a file of one record', () => {
    const one = berkeleyEarthFile
      .slice(0, berkeleyEarthFile.lastIndexOf('% Global Average'))
      .replace(/^.*Inferred from Air.*\n/m, '');
    const found = preview(one);
    expect(found.series.map(({ key }) => key)).toEqual(['temperature-monthly', 'temperature-annual']);
    expect(offered(found, 'temperature-monthly').suggestedName).toBe('berkeley-earth-monthly');
  });
});
