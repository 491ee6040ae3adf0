import normalQuantile from '@stdlib/stats-base-dists-normal-quantile';
import type { SeriesData } from '../../contract/series.ts';
import { InputError } from '../../errors.ts';
import { formatYearList } from '../../quantities/notation.ts';

/**
 * Standard deviations of the annual values of a series, from the limits that its provider gives.
 *
 * Model    sd = (upper − lower)/(2 z), z the standard normal quantile of the limits' level
 * Assumes  normal errors with limits about the value; annual limits, since how the errors of months go together into
 *          that of a year is not in a file of monthly limits
 *
 * @param years  years to give it for
 * @returns  [nYears] in the unit of the series
 * @throws   InputError no-limits when there are none, monthly ones, ones of no stated level, or none in some year
 *
 * Checked   test/unit/climate/estimators/annual-standard-deviations.test.ts (C: ±1.96 sd at 95 %)
 */
export function annualStandardDeviations({ name, step, values }: SeriesData, years: readonly number[]): number[] {
  const refuse = (received: string) =>
    new InputError({
      code: 'no-limits',
      where: `series ${name}`,
      expected: 'annual values with limits of a stated level',
      received,
      hint: 'Import an annual record that carries limits.',
    });
  const { lower, upper, boundsLevelPercent } = values;
  if (!lower || !upper) throw refuse('a record without limits');
  if (step !== 'year') throw refuse('limits of single months, whose errors do not add up to that of a year');
  if (boundsLevelPercent === null) throw refuse('limits without a level');
  const half = 2 * normalQuantile(0.5 + boundsLevelPercent / 200, 0, 1);
  const deviations = new Map(
    values.years.map((year, row) => [year, deviationOf(lower[row] ?? null, upper[row] ?? null, half)]),
  );
  const lacking = years.filter((year) => (deviations.get(year) ?? null) === null);
  if (lacking.length > 0) throw refuse(`none in ${formatYearList(lacking)}`);
  return years.map((year) => deviations.get(year) ?? NaN);
}

function deviationOf(lower: number | null, upper: number | null, half: number): number | null {
  return lower === null || upper === null ? null : (upper - lower) / half;
}
