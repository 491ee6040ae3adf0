import { describe, expect, it } from 'vitest';
import { alignByYear } from '../../../src-main/quantities/align-by-year.ts';
import type { AnnualSeries } from '../../../src-main/quantities/annual-means.ts';

const annual = (name: string, years: number[], leftOut: AnnualSeries['leftOut'] = []): AnnualSeries => ({
  name,
  unit: 'K',
  years,
  values: years.map((year) => year / 1000),
  leftOut,
  incomplete: [],
});

describe('alignByYear', () => {
  const a = annual('a', [1990, 1991, 1993, 1994], [{ year: 1992, reason: 'a: value missing' }]);
  const b = annual('b', [1991, 1992, 1993], [{ year: 1994, reason: 'b: 4 of 12 months present, 12 needed' }]);

  it('keeps the years that all series have and names what is missing in the years between', () => {
    expect(alignByYear([a, b], null)).toEqual({
      years: [1991, 1993],
      columns: [
        [1.991, 1.993],
        [1.991, 1.993],
      ],
      leftOut: [
        { year: 1992, reason: 'a: value missing' },
        { year: 1994, reason: 'b: 4 of 12 months present, 12 needed' },
      ],
    });
  });

  it('lists every year of a window that cannot be used, also where a series does not reach', () => {
    const { years, leftOut } = alignByYear([a, b], { start: 1990, end: 1992 });
    expect(years).toEqual([1991]);
    expect(leftOut).toEqual([
      { year: 1990, reason: 'b covers 1991–1993' },
      { year: 1992, reason: 'a: value missing' },
    ]);
  });

  it('names all series that lack a year', () => {
    expect(alignByYear([a, b], { start: 1991, end: 1995 }).leftOut.at(-1)).toEqual({
      year: 1995,
      reason: 'a covers 1990–1994; b covers 1991–1993',
    });
  });

  it('says what each series covers when they share no year', () => {
    expect(() => alignByYear([a, annual('c', [2000])], null)).toThrow(
      /a and c: expected years that all of them have.*a 1990–1994, c 2000/,
    );
    expect(() => alignByYear([a, annual('d', [])], null)).toThrow(/d no complete year/);
  });
});
