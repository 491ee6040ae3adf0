import { describe, expect, it } from 'vitest';
import { calendarRows } from '../../../src-main/statistics/calendar-rows.ts';

const columns = [new Float64Array([1, 2, 3]), new Float64Array([4, 5, 6])];

describe('calendarRows', () => {
  it('puts rows in their years and zero where there is none, by hand', () => {
    const rows = calendarRows('test', columns, [1990, 1992, 1995]);
    expect(rows.map((row) => [...row])).toEqual([
      [1, 0, 2, 0, 0, 3],
      [4, 0, 5, 0, 0, 6],
    ]);
  });

  it('leaves consecutive rows as they are', () => {
    expect(calendarRows('test', columns, [1990, 1991, 1992])).toBe(columns);
    expect(calendarRows('test', columns, undefined)).toBe(columns);
  });

  it('refuses years that do not fit the rows', () => {
    expect(() => calendarRows('test', columns, [1990, 1992])).toThrow('test, years: expected 3 values');
    expect(() => calendarRows('test', columns, [1990, 1992, 1991])).toThrow(
      'test, years[2]: expected a year after 1992',
    );
  });
});
