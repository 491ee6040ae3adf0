import type { YearSpan } from '../contract/primitives.ts';
import { InputError } from '../errors.ts';
import type { AnnualSeries } from './annual-means.ts';
import { formatYearList, formatYears } from './notation.ts';

/**
 * Re-bases an annual series: subtracts its mean over the baseline period, so that the values count from there.
 *
 * @returns the series, and the offset that was subtracted (in the series' unit)
 * @throws  InputError `baseline-not-covered` when a year of the period has no value
 */
export function rebase(series: AnnualSeries, baseline: YearSpan): { series: AnnualSeries; offset: number } {
  const valueOf = new Map(series.years.map((year, row) => [year, series.values[row] ?? NaN]));
  const missing: number[] = [];
  let sum = 0;
  for (let year = baseline.start; year <= baseline.end; year++) {
    const value = valueOf.get(year);
    if (value === undefined) missing.push(year);
    else sum += value;
  }
  const nYears = baseline.end - baseline.start + 1;
  if (nYears < 1 || missing.length > 0) {
    throw new InputError({
      code: 'baseline-not-covered',
      where: `series ${series.name}, baseline ${formatYears(baseline)}`,
      expected: 'a value in every year of the baseline period',
      received: nYears < 1 ? 'a period that ends before it starts' : `no value in ${formatYearList(missing)}`,
      hint: 'Choose a period that the series covers.',
    });
  }
  const offset = sum / nYears;
  return { series: { ...series, values: series.values.map((value) => value - offset) }, offset };
}
