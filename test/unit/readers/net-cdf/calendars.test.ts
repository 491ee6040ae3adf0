import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { calendarOf, monthOfDay } from '../../../../src-main/readers/net-cdf/calendars.ts';

function calendar(name: string) {
  const found = calendarOf(name);
  if (found === null) throw new Error(`no calendar ${name}`);
  return found;
}

/** Dates that the Python library cftime 1.6.2 gives for days since 0001-01-01 in each calendar (num2date). */
const cftime: Record<string, readonly [days: number, year: number, month: number][]> = {
  standard: [
    [58.5, 1, 2],
    [59, 1, 3],
    [577_737, 1582, 10],
    [712_345.5, 1951, 5],
    [730_000, 1999, 9],
  ],
  proleptic_gregorian: [
    [577_737, 1582, 10],
    [712_345.5, 1951, 5],
    [730_000, 1999, 9],
  ],
  julian: [
    [577_737, 1582, 10],
    [712_345.5, 1951, 4],
    [730_000, 1999, 8],
  ],
  noleap: [
    [59, 1, 3],
    [577_738, 1583, 11],
    [730_000, 2001, 1],
  ],
  all_leap: [
    [59, 1, 2],
    [365, 1, 12],
    [577_737, 1579, 7],
    [730_000, 1995, 7],
  ],
  '360_day': [
    [59, 1, 2],
    [365, 2, 1],
    [712_345.5, 1979, 9],
    [730_000, 2028, 10],
  ],
};

describe('calendars', () => {
  it.each(Object.entries(cftime))('finds the months of cftime in the calendar %s', (name, dates) => {
    const days = calendar(name);
    for (const [since, year, month] of dates) {
      expect(monthOfDay(days, days(1, 1, 1) + since)).toEqual({ year, month });
    }
  });

  it('lets 1582-10-15 follow 1582-10-04 in the standard calendar, by decree of Gregory XIII', () => {
    const standard = calendar('standard');
    expect(standard(1582, 10, 15) - standard(1582, 10, 4)).toBe(1);
  });

  it('counts days as the clock of the machine does, from 1600 on', () => {
    const gregorian = calendar('proleptic_gregorian');
    const date = fc.record({
      year: fc.integer({ min: 1600, max: 2600 }),
      month: fc.integer({ min: 1, max: 12 }),
      day: fc.integer({ min: 1, max: 28 }),
    });
    fc.assert(
      fc.property(date, ({ year, month, day }) => {
        expect(gregorian(year, month, day)).toBe(Date.UTC(year, month - 1, day) / 86_400_000);
        expect(calendar('gregorian')(year, month, day)).toBe(gregorian(year, month, day));
      }),
    );
  });

  it('finds each day of each calendar in its own month, before year 0 too', () => {
    const date = fc.record({
      name: fc.constantFrom(...Object.keys(cftime)),
      year: fc.integer({ min: -4000, max: 6000 }),
      month: fc.integer({ min: 1, max: 12 }),
      day: fc.double({ min: 1, max: 28.999, noNaN: true }),
    });
    fc.assert(
      fc.property(date, ({ name, year, month, day }) => {
        fc.pre(!(name === 'standard' && year === 1582 && month === 10));
        const days = calendar(name);
        expect(monthOfDay(days, days(year, month, Math.floor(day)) + (day % 1))).toEqual({ year, month });
      }),
    );
  });

  it('knows no other calendar, and no day beyond ten thousand years', () => {
    expect(calendarOf('lunar')).toBeNull();
    expect(calendarOf('constructor')).toBeNull();
    for (const day of [1e300, -1e12, Number.NaN]) expect(monthOfDay(calendar('noleap'), day).year).toBeNaN();
  });
});
