import { describe, expect, it } from 'vitest';
import { oceanHeatContentFile } from './fixtures/layouts.ts';
import { offered, preview, steps, valuesOf } from './fixtures/preview.ts';

describe('oceanHeatContent', () => {
  it('reads three areas in 10²² J with one standard error, from mid-year stamps', () => {
    const found = preview(oceanHeatContentFile, {}, 'h22-w0-2000m.dat');
    expect(found.reader.id).toBe('ocean-heat-content');
    expect(found.series.map(({ key, isMain }) => [key, isMain])).toEqual([
      ['world', true],
      ['north', false],
      ['south', false],
    ]);
    expect(offered(found, 'world')).toMatchObject({
      suggestedName: 'ohc-2000m-world-annual',
      unit: '10²² J',
      baseline: { start: 1955, end: 2006 },
      startYear: 2005,
    });
    const world = valuesOf(oceanHeatContentFile, 'world');
    expect(steps(world)).toEqual(['2005: 9.5', '2006: 11.5']);
    expect([world.lower?.[0], world.upper?.[0], world.boundsLevelPercent]).toEqual([9, 10, 68.27]);
    expect(valuesOf(oceanHeatContentFile, 'south').values).toEqual([4, 5.5]);
    expect(found.notes.join('\n')).toContain('ten zettajoules');
  });

  it('warns that five-year means overlap', () => {
    const found = preview(oceanHeatContentFile, {}, 'pent_h22-w0-2000m.dat');
    expect(offered(found, 'world').suggestedName).toBe('ohc-2000m-world-pentadal');
    expect(found.notes.join('\n')).toContain('overlap');
  });
});
