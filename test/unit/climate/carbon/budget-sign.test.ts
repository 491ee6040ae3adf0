import { expect, it } from 'vitest';
import { budgetSign } from '../../../../src-main/climate/carbon/budget-sign.ts';

it('counts sinks and sources, names the exceptions by year, and says it', () => {
  expect(budgetSign([-2, 1, 0, -3], [1990, 1991, 1992, 1993])).toEqual({
    nSinkYears: 2,
    nSourceYears: 1,
    nYears: 4,
    exceptions: [1991, 1992],
    statement: 'Nature is a net sink in 2 of 4 years. On average it takes up 1.0 GtC per year.',
  });
});

it('numbers rows from 0 without years', () => {
  expect(budgetSign([-2, 5]).exceptions).toEqual([1]);
});

it('says when nature gives off, or neither', () => {
  expect(budgetSign([1.24]).statement).toBe(
    'Nature is a net sink in 0 of 1 year. On average it gives off 1.2 GtC per year.',
  );
  expect(budgetSign([1, -1]).statement).toContain('its net flux is zero');
});

it('refuses no years at all', () => {
  expect(() => budgetSign([])).toThrow(expect.objectContaining({ name: 'InputError' }));
});
