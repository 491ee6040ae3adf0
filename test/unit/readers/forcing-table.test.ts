import { describe, expect, it } from 'vitest';
import { ar6Forcing, igccForcing } from './fixtures/layouts.ts';
import { offered, preview, steps, valuesOf } from './fixtures/preview.ts';

describe('forcingTable', () => {
  it('offers every agent of the AR6 layout, three of them as main series', () => {
    const found = preview(ar6Forcing, {}, 'AR6_ERF_1750-2019.csv');
    expect(found.reader.id).toBe('forcing-table');
    expect(found.series).toHaveLength(19);
    expect(found.series.filter(({ isMain }) => isMain).map(({ agent }) => agent)).toEqual([
      'co2',
      'total-anthropogenic',
      'total',
    ]);
    expect(offered(found, 'total')).toMatchObject({
      suggestedName: 'erf-total',
      quantity: 'forcing',
      agent: 'total',
      unit: 'W/m²',
      unitFrom: 'provider',
      baseline: null,
      baselineFrom: 'not needed',
      step: 'year',
    });
    expect(found.series.map(({ agent }) => agent)).toContain('aerosol-radiation-interactions');
    expect(steps(valuesOf(ar6Forcing, 'total'))).toEqual(['1750: 0.375', '1751: 0.875']);
  });

  it('reads the IGCC layout: no name over the first column, mid-year stamps, other names for the same agents', () => {
    const found = preview(igccForcing);
    expect(found.series).toHaveLength(18);
    expect(steps(valuesOf(igccForcing, 'total-anthropogenic'))).toEqual(['1750: 0', '1751: 0.5']);
    expect(offered(found, 'nonco2-wmghg').agent).toBe('nonco2-wmghg');
    expect(found.notes.join('\n')).toContain('1750.5');
    expect(found.head.columns[0]).toBe('column 1');
  });

  it('takes the start of an interval for the year, and its end and middle for no agent', () => {
    const newer = igccForcing
      .replace(',CO2', 'time,timebound_lower,timebound_upper,CO2')
      .replace('1750.5', '1750.5,1750,1751')
      .replace('1751.5', '1751.5,1751,1752');
    const found = preview(newer);
    expect(found.series).toHaveLength(18);
    expect(steps(valuesOf(newer, 'co2'))).toEqual(['1750: 0', '1751: 0.5']);
  });

  it('warns that solar and volcanic forcing are not zero in 1750', () => {
    expect(preview(ar6Forcing).notes.join('\n')).toContain('need not be zero');
  });

  it('says when a file holds percentiles, by its name and by sums that do not add up', () => {
    const percentile = ar6Forcing.replace(/0\.875\n/, '0.5\n');
    const found = preview(percentile, {}, 'AR6_ERF_1750-2019_pc05.csv');
    expect(offered(found, 'total').suggestedName).toBe('erf-total-p05');
    expect(offered(found, 'total').label).toContain('5th percentile');
    expect(found.notes.join('\n')).toContain('5th percentiles, not best estimates');
    expect(preview(percentile).notes.join('\n')).toContain('not the sum of its parts');
    expect(preview(ar6Forcing).notes.join('\n')).not.toContain('not the sum');
  });

  it('reads a table of agents of any origin; its unit is the file’s, or asked for', () => {
    const table = 'year,co2,solar,volcanic,total\n2000,1.5,0.1,-0.2,1.4\n2001,1.6,0.1,-0.1,1.6\n';
    expect(offered(preview(table), 'total')).toMatchObject({ unit: '', unitFrom: 'unknown', quantity: 'forcing' });
    expect(offered(preview(`# effective forcing in W m-2\n${table}`), 'total')).toMatchObject({
      unit: 'W/m²',
      unitFrom: 'file',
    });
  });

  it.each([
    ['concentrations', 'year,co2,ch4,n2o,total\n2000,369,1773,316,400\n2001,371,1771,317,401\n'],
    ['emissions', 'year,co2,ch4,n2o,total\n2000,25,8,3,36\n2001,26,8,3,37\n'],
    ['large numbers under agents’ names', 'year,co2,solar,total\n2000,369,1361,400\n2001,371,1361,401\n'],
  ])('leaves %s to the reader of delimited text', (_, table) => {
    expect(preview(table).reader.id).toBe('delimited');
  });
});
