import { describe, expect, it } from 'vitest';
import { lawDomeFile } from './fixtures/layouts.ts';
import { offered, preview, steps, valuesOf } from './fixtures/preview.ts';

describe('iceCore', () => {
  it('reads the splines under the text, each with its unit', () => {
    const found = preview(lawDomeFile, {}, 'law2006.txt');
    expect(found.reader.id).toBe('ice-core');
    expect(found.series.map(({ key, unit, unitFrom, isMain }) => [key, unit, unitFrom, isMain])).toEqual([
      ['co2', 'ppm', 'file', true],
      ['ch4', 'ppb', 'file', false],
      ['n2o', 'ppb', 'file', false],
    ]);
    expect(offered(found, 'co2')).toMatchObject({ quantity: 'co2', step: 'year', startYear: 1, endYear: 3 });
    expect(steps(valuesOf(lawDomeFile, 'co2'))).toEqual(['1: 276.5', '2: 276.75', '3: 277']);
    expect(valuesOf(lawDomeFile, 'n2o').values).toEqual([261.25, null, 261.75]);
  });

  it('says how far a spline can be trusted, and that other tables follow', () => {
    const found = preview(lawDomeFile);
    expect(found.badRows).toEqual([]);
    expect(found.notes.join('\n')).toContain('shorter than 20 years');
    expect(found.notes.join('\n')).toContain('3 lines under the splines');
  });

  it('leaves a gas aside whose years are others', () => {
    const shifted = lawDomeFile.replace(
      '2    640.25     2.0    276.75     2.0',
      '2    640.25     2.0    276.75     7.0',
    );
    expect(preview(shifted).series.map(({ key }) => key)).toEqual(['co2', 'ch4']);
  });
});
