import { describe, expect, it } from 'vitest';
import { recogniseTime, yearPlace } from '../../../src-main/readers/time-form.ts';

function places(cells: readonly string[], decimalMark: '.' | ',' = '.'): (string | null)[] {
  const form = recogniseTime(cells, decimalMark);
  return cells.map((cell) => {
    const place = form?.placeOf(cell) ?? null;
    if (place === null) return null;
    return place.month === null ? String(place.year) : `${place.year}-${place.month}`;
  });
}

/** Day of the year on which each month begins, counted from 0, in a year without leap day. */
const monthStarts = [0, 31, 59, 90, 120, 151, 181, 212, 243, 273, 304, 334, 365];
const allMonths = Array.from({ length: 12 }, (_, month) => `1958-${month + 1}`);

describe('recogniseTime', () => {
  it.each<[string, string[], string[]]>([
    ['years', ['1958', '1959'], ['1958', '1959']],
    ['years of three digits and before the epoch', ['-12', '987'], ['-12', '987']],
    ['mid-year stamps', ['1750.5', '1751.5', '1752.5'], ['1750', '1751', '1752']],
    ['years with idle decimals', ['2005.000', '2006.000'], ['2005', '2006']],
    ['months', ['1958-03', '1958-12'], ['1958-3', '1958-12']],
    ['months with a slash', ['1850/01', '1850/02'], ['1850-1', '1850-2']],
    ['months without a mark', ['195803', '195812'], ['1958-3', '1958-12']],
    ['months before years', ['03/1958', '04/1958'], ['1958-3', '1958-4']],
    ['months by name', ['Mar 1958', 'September 1958', 'Sept-1959'], ['1958-3', '1958-9', '1959-9']],
    ['months by name behind years', ['1958-Mar', '1958 Apr'], ['1958-3', '1958-4']],
    ['days of months', ['1958-03-01', '1958-04-01'], ['1958-3', '1958-4']],
    ['days with a time', ['1958-03-16T12:00:00Z', '1958-04-16 00:00'], ['1958-3', '1958-4']],
    ['days without a mark', ['19580301', '19580401'], ['1958-3', '1958-4']],
    ['days before months', ['15.03.1958', '15.04.1958'], ['1958-3', '1958-4']],
    ['one day a year, as years', ['1958-07-01', '1959-07-01', '1960-07-01'], ['1958', '1959', '1960']],
  ])('reads %s', (_, cells, expected) => {
    expect(places(cells)).toEqual(expected);
  });

  it('tells day/month/year from month/day/year by which part runs through the year', () => {
    expect(places(['01/03/1958', '01/04/1958', '01/05/1958'])).toEqual(['1958-3', '1958-4', '1958-5']);
    expect(places(['03/01/1958', '04/01/1958', '05/01/1958'])).toEqual(['1958-3', '1958-4', '1958-5']);
  });

  it.each<[string, (month: number) => number]>([
    ['middles in equal months', (month) => (month + 0.5) / 12],
    ['middles in days', (month) => ((monthStarts[month] ?? 0) + (monthStarts[month + 1] ?? 0)) / 2 / 365],
    ['the fifteenth', (month) => ((monthStarts[month] ?? 0) + 14) / 365],
    ['beginnings in equal months', (month) => month / 12],
    ['beginnings in days', (month) => (monthStarts[month] ?? 0) / 365],
    ['beginnings in days of a leap year', (month) => ((monthStarts[month] ?? 0) + (month > 1 ? 1 : 0)) / 366],
  ])('reads decimal years at the %s of months, with three to six decimals', (_, fractionOf) => {
    for (const decimals of [3, 4, 6]) {
      const cells = allMonths.map((__, month) => (1958 + fractionOf(month)).toFixed(decimals));
      expect(places(cells)).toEqual(allMonths);
    }
  });

  it('reads decimal years with a decimal comma, and January without decimals', () => {
    expect(places(['1958,208', '1958,292'], ',')).toEqual(['1958-3', '1958-4']);
    expect(places(['1958.917', '1959', '1959.083'])).toEqual(['1958-12', '1959-1', '1959-2']);
  });

  it('reads the two digits of 1958.03 as a month where all are', () => {
    expect(places(['1958.11', '1958.12', '1959.01', '1959.02'])).toEqual(['1958-11', '1958-12', '1959-1', '1959-2']);
  });

  it('states no time for a cell unlike the others', () => {
    expect(places(['1958', '1959', 'Trend', '1960'])).toEqual(['1958', '1959', null, '1960']);
    expect(places(['1958-03', '1958-13', '1958-05'])).toEqual(['1958-3', null, '1958-5']);
  });

  it.each([[['a', 'b']], [['0.31', '-0.12', '0.4']], [['1958.001', '1958.004', '1958.9', '1958.3']], [[]]])(
    'recognises no time in %j',
    (cells: string[]) => {
      const years = places(cells).filter((place) => place !== null && Number.parseInt(place, 10) > 1000);
      expect(years).toEqual([]);
    },
  );
});

describe('yearPlace', () => {
  it('takes months by number or name', () => {
    expect(yearPlace('1958', '3')).toEqual({ year: 1958, month: 3 });
    expect(yearPlace('1958', '03')).toEqual({ year: 1958, month: 3 });
    expect(yearPlace('1958', 'Mar')).toEqual({ year: 1958, month: 3 });
    expect(yearPlace('1958', null)).toEqual({ year: 1958, month: null });
  });

  it.each([
    ['1958', '0'],
    ['1958', '13'],
    ['1958', ''],
    ['1958', '1.5'],
    ['Year', '1'],
  ])('states no time for year %s and month "%s"', (year, month) => {
    expect(yearPlace(year, month)).toBeNull();
  });
});
