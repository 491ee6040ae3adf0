import { describe, expect, it } from 'vitest';
import { heavier, isWithinBound, weighAlternative, weighShift } from '../../../src-main/assumptions/weigh.ts';
import { statement } from '../../helpers/claim-computation.ts';

const claim = (value: string, tolerance = { notableShare: 0.1, decisiveShare: 0.25 }) => ({
  statement: { ...statement, value, bound: 'equals' as const },
  tolerance,
});

describe('weighShift', () => {
  it.each([
    // 10 % and 25 % of 2.00 are 0.2 and 0.5.
    ['2.00', 0.199, 'negligible'],
    ['2.00', 0.2, 'notable'],
    ['2.00', -0.499, 'notable'],
    ['2.00', -0.5, 'decisive'],
    // Half the last digit of "0.2" is 0.05, more than 10 % of it and as much as 25 %.
    ['0.2', 0.049, 'negligible'],
    ['0.2', 0.05, 'decisive'],
    // Half the last digit of "1" is 0.5, more than 25 % of it.
    ['1', 0.3, 'negligible'],
    ['1', 0.5, 'decisive'],
    // Half the last digit of "3" is 0.5, more than 10 % of it; 25 % of it is 0.75.
    ['3', 0.45, 'negligible'],
    ['3', 0.5, 'notable'],
    ['3', 0.75, 'decisive'],
    ['-2.00', 0.5, 'decisive'],
  ])('stated %s, shifted by %f: %s', (value, shift, weight) => {
    expect(weighShift(claim(value), shift)).toBe(weight);
  });

  it('goes by the tolerance of the review', () => {
    const strict = { notableShare: 0.02, decisiveShare: 0.05 };
    expect(weighShift(claim('2.00', strict), 0.05)).toBe('notable');
    expect(weighShift(claim('2.00', strict), 0.1)).toBe('decisive');
    expect(weighShift(claim('2.00', { notableShare: 0.5, decisiveShare: 1 }), 0.9)).toBe('negligible');
  });
});

describe('weighAlternative', () => {
  const bounded = (bound: 'at most' | 'at least') => ({ ...claim('1.9'), statement: { ...statement, bound } });

  it('is decisive when a stated bound is crossed, within the rounding of the bound', () => {
    expect(weighAlternative(bounded('at most'), 1.88, 1.94)).toBe('negligible');
    expect(weighAlternative(bounded('at most'), 1.88, 1.96)).toBe('decisive');
    expect(weighAlternative(bounded('at most'), 2.0, 1.9)).toBe('decisive');
    expect(weighAlternative(bounded('at least'), 1.9, 1.84)).toBe('decisive');
    expect(weighAlternative(bounded('at least'), 1.9, 1.86)).toBe('negligible');
  });

  it('goes by the shift where no bound is crossed', () => {
    expect(weighAlternative(bounded('at most'), 2.1, 2.3)).toBe('notable');
    expect(weighAlternative(claim('1.9'), 1.88, 1.96)).toBe('negligible');
  });
});

describe('isWithinBound', () => {
  it('holds for every value of a number that is no bound', () => {
    expect(isWithinBound(claim('1.9'), 99)).toBe(true);
  });
});

describe('heavier', () => {
  it('takes the weightier of two', () => {
    expect(heavier('notable', 'negligible')).toBe('notable');
    expect(heavier('notable', 'decisive')).toBe('decisive');
  });
});
