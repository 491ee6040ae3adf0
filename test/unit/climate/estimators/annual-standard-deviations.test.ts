import { describe, expect, it } from 'vitest';
import { annualStandardDeviations } from '../../../../src-main/climate/estimators/annual-standard-deviations.ts';
import type { SeriesValues } from '../../../../src-main/contract/series.ts';
import { annualSeries, monthlySeries } from '../../../helpers/claim-computation.ts';

const years = [1990, 1991, 1992];
const bounds = { lower: [0.9, 1.8, 2.7], upper: [1.1, 2.2, 3.3], boundsLevelPercent: 95 };
const record = (change: Partial<SeriesValues> = {}) => {
  const series = annualSeries('air', 'temperature-anomaly', 'K', years, [1, 2, 3]);
  return { ...series, values: { ...series.values, ...bounds, ...change } };
};

describe('annualStandardDeviations', () => {
  it('is the half-width over 1.96 at 95 %, over 1.645 at 90 %, over 1 at one standard deviation', () => {
    const at = (boundsLevelPercent: number) => annualStandardDeviations(record({ boundsLevelPercent }), years);
    expect(at(95)[0]).toBeCloseTo(0.1 / 1.959964, 8);
    expect(at(90)[1]).toBeCloseTo(0.2 / 1.644854, 7);
    expect(at(68.26894921370859)[2]).toBeCloseTo(0.3, 12);
  });

  it('gives the years asked for, in their order', () => {
    expect(annualStandardDeviations(record(), [1992, 1990])).toEqual([
      annualStandardDeviations(record(), years)[2],
      annualStandardDeviations(record(), years)[0],
    ]);
  });

  it.each([
    ['no limits', record({ lower: null, upper: null }), 'a record without limits'],
    ['limits without a level', record({ boundsLevelPercent: null }), 'limits without a level'],
    ['a year without limits', record({ lower: [0.9, null, 2.7] }), 'none in 1991'],
    [
      'limits of months',
      {
        ...monthlySeries('air', 'temperature-anomaly', 'K', [[1990, 1, 0.2]]),
        values: { ...record().values, months: [1, 1, 1] },
      },
      'limits of single months',
    ],
  ])('refuses %s', (_, series, sentence) => {
    expect(() => annualStandardDeviations(series, years)).toThrow(sentence);
  });

  it('refuses a year that the record has not', () => {
    expect(() => annualStandardDeviations(record(), [1990, 1999, 2001])).toThrow('none in 1999, 2001');
  });
});
