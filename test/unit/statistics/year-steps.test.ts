import { describe, expect, it } from 'vitest';
import { gapsClosedUp, missingYears, yearSteps } from '../../../src-main/statistics/year-steps.ts';

describe('yearSteps', () => {
  it('level C: distances from the row before, by hand', () => {
    expect([...yearSteps('test', [1958, 1959, 1962, 1963, 1965], 5)]).toEqual([1, 1, 3, 1, 2]);
    expect([...yearSteps('test', undefined, 3)]).toEqual([1, 1, 1]);
  });

  it.each([
    ['a repeated year', [1958, 1958, 1959], 'a year after 1958'],
    ['years out of order', [1958, 1957, 1959], 'a year after 1958'],
    ['half a year', [1958, 1958.5, 1959], 'test, years[1]: expected a whole number'],
    ['a missing year number', [1958, NaN, 1959], 'test, years[1]'],
    ['fewer years than rows', [1958, 1959], 'expected 3 values'],
  ])('refuses %s', (_, years, sentence) => expect(() => yearSteps('test', years, 3)).toThrow(sentence));
});

describe('gapsClosedUp', () => {
  it('counts the missing years and their gaps; silent where there are none', () => {
    expect(gapsClosedUp('test', [1958, 1959, 1962, 1964], 4, 'Newey–West errors')).toEqual([
      {
        code: 'gaps-closed-up',
        detail:
          '3 years are missing in 2 gaps. Newey–West errors take the years on either side of a gap for neighbours.',
      },
    ]);
    expect(gapsClosedUp('test', [1958, 1960], 2, 'They')[0]?.detail).toMatch(/^1 year is missing in 1 gap\. They take/);
    expect(gapsClosedUp('test', [1958, 1959, 1960], 3, 'They')).toEqual([]);
    expect(gapsClosedUp('test', undefined, 3, 'They')).toEqual([]);
  });
});

describe('missingYears', () => {
  it('is null where every year has its row', () => {
    expect(missingYears('test', [1958, 1959], 2)).toBeNull();
    expect(missingYears('test', undefined, 2)).toBeNull();
    expect(missingYears('test', [1958, 1961], 2)).toBe('2 years are missing in 1 gap.');
  });
});
