import { describe, expect, it } from 'vitest';
import { annualMeans } from '../../../src-main/quantities/annual-means.ts';
import { annualSeries, monthlySeries } from '../../helpers/claim-computation.ts';

const year = (year: number, values: readonly (number | null)[], first = 1): [number, number, number | null][] =>
  values.map((value, index) => [year, first + index, value]);
const full = Array.from({ length: 12 }, (_, month) => month + 1);

describe('annualMeans of months', () => {
  const series = monthlySeries('co2', 'co2', 'ppm', [
    ...year(1958, [315, 317], 3),
    ...year(1959, full),
    ...year(
      1960,
      full.map((value) => (value === 6 ? null : value)),
    ),
    ...year(1963, full),
  ]);

  it('keeps complete years and lists the others with their reason; a gap is not closed up', () => {
    expect(annualMeans(series, 12)).toEqual({
      name: 'co2',
      unit: 'ppm',
      years: [1959, 1963],
      values: [6.5, 6.5],
      leftOut: [
        { year: 1958, reason: 'co2: 2 of 12 months present, 12 needed' },
        { year: 1960, reason: 'co2: 11 of 12 months present, 12 needed' },
        { year: 1961, reason: 'co2 has no row for this year' },
        { year: 1962, reason: 'co2 has no row for this year' },
      ],
      incomplete: [],
    });
  });

  it('uses incomplete years when told to, and says which', () => {
    const { years, values, incomplete } = annualMeans(series, 11);
    expect(years).toEqual([1959, 1960, 1963]);
    expect(values[1]).toBe((78 - 6) / 11);
    expect(incomplete).toEqual([{ year: 1960, nMonths: 11 }]);
  });
});

describe('annualMeans of an annual series', () => {
  it('passes values through and lists missing and absent years', () => {
    const series = annualSeries('t', 'temperature-anomaly', 'K', [1990, 1991, 1993], [0.1, null, 0.3]);
    expect(annualMeans(series, 12)).toMatchObject({
      years: [1990, 1993],
      values: [0.1, 0.3],
      leftOut: [
        { year: 1991, reason: 't: value missing' },
        { year: 1992, reason: 't has no row for this year' },
      ],
    });
  });

  it('is empty for an empty series', () => {
    expect(annualMeans(annualSeries('t', 'temperature', 'K', [], []), 12).years).toEqual([]);
  });
});

describe('annualMeans refuses', () => {
  it('a time step that repeats or goes back', () => {
    const twice = annualSeries('t', 'temperature', 'K', [1990, 1990], [1, 2]);
    expect(() => annualMeans(twice, 12)).toThrow(/series t: expected time steps in order, each at most once.*1990/);
    const back = monthlySeries('t', 'temperature', 'K', [...year(1990, [1], 2), ...year(1990, [1], 1)]);
    expect(() => annualMeans(back, 12)).toThrow(/1990-01/);
  });

  it('columns of different length and values that are not numbers', () => {
    const short = annualSeries('t', 'temperature', 'K', [1990, 1991], [1]);
    expect(() => annualMeans(short, 12)).toThrow(/one value for each of 2 time steps, but found 1 values/);
    const infinite = annualSeries('t', 'temperature', 'K', [1990], [Infinity]);
    expect(() => annualMeans(infinite, 12)).toThrow(/series t, 1990: expected a finite number/);
  });
});
