import { describe, expect, it } from 'vitest';
import { rebase } from '../../../src-main/quantities/rebase.ts';

const series = { name: 't', unit: 'K', years: [1990, 1991, 1993], values: [0.5, 1, 2], leftOut: [], incomplete: [] };

describe('rebase', () => {
  it('subtracts the mean of the baseline period', () => {
    const { series: rebased, offset } = rebase(series, { start: 1990, end: 1991 });
    expect(offset).toBe(0.75);
    expect(rebased.values).toEqual([-0.25, 0.25, 1.25]);
    expect(rebased.years).toEqual(series.years);
  });

  it('names the years that the period needs and the series lacks', () => {
    expect(() => rebase(series, { start: 1991, end: 1994 })).toThrow(/baseline 1991–1994.*no value in 1992, 1994/);
  });

  it('refuses a period that ends before it starts', () => {
    expect(() => rebase(series, { start: 1991, end: 1990 })).toThrow(/ends before it starts/);
  });
});
