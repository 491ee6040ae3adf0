import type { SeriesData } from '../contract/series.ts';
import { InputError } from '../errors.ts';

export interface LeftOutYear {
  year: number;
  reason: string;
}

/** One value a year, in year order. Years that are not here are listed with the reason, not closed up. */
export interface AnnualSeries {
  name: string;
  unit: string;
  years: number[];
  values: number[];
  leftOut: LeftOutYear[];
  /** Years whose mean was formed from fewer than twelve months. */
  incomplete: { year: number; nMonths: number }[];
}

/**
 * Annual means of a series: the plain mean of a year's months, each month counting the same, for every year with at
 * least `minMonths` of them. An annual series passes through. Years inside the series' span without a value are listed
 * in `leftOut`, so that a gap cannot pass for two consecutive years.
 *
 * Assumes  months in time order, each at most once
 *
 * @param series     values in any unit, `null` where missing
 * @param minMonths  1–12; with fewer than 12 a year's mean leans towards the months that are there
 * @throws  InputError `unordered-series` when a time step repeats or goes back; `wrong-length` when the columns differ
 *          in length; `not-finite` for values that are not numbers
 */
export function annualMeans(series: SeriesData, minMonths: number): AnnualSeries {
  checkSteps(series);
  const { years, months, values } = series.values;
  const annual: AnnualSeries = {
    name: series.name,
    unit: series.unit,
    years: [],
    values: [],
    leftOut: [],
    incomplete: [],
  };
  let row = 0;
  const first = years[0];
  const last = years.at(-1);
  if (first === undefined || last === undefined) return annual;
  for (let year = first; year <= last; year++) {
    let sum = 0;
    let nPresent = 0;
    let nRows = 0;
    for (; row < years.length && years[row] === year; row++) {
      nRows++;
      const value = values[row];
      if (value === null || value === undefined) continue;
      sum += value;
      nPresent++;
    }
    if (nRows === 0) {
      annual.leftOut.push({ year, reason: `${series.name} has no row for this year` });
    } else if (months === null) {
      if (nPresent === 1) annual.values.push(sum);
      else annual.leftOut.push({ year, reason: `${series.name}: value missing` });
    } else if (nPresent >= minMonths) {
      annual.values.push(sum / nPresent);
      if (nPresent < 12) annual.incomplete.push({ year, nMonths: nPresent });
    } else {
      annual.leftOut.push({ year, reason: `${series.name}: ${nPresent} of 12 months present, ${minMonths} needed` });
    }
    if (annual.values.length > annual.years.length) annual.years.push(year);
  }
  return annual;
}

function checkSteps(series: SeriesData): void {
  const { years, months, values } = series.values;
  const where = `series ${series.name}`;
  if (values.length !== years.length || (months !== null && months.length !== years.length)) {
    throw new InputError({
      code: 'wrong-length',
      where,
      expected: `one value${months ? ' and one month' : ''} for each of ${years.length} time steps`,
      received: `${values.length} values${months ? ` and ${months.length} months` : ''}`,
    });
  }
  let previous = -Infinity;
  for (const [row, year] of years.entries()) {
    const month = months?.[row] ?? 1;
    const step = year * 12 + month;
    if (step <= previous) {
      throw new InputError({
        code: 'unordered-series',
        where,
        expected: 'time steps in order, each at most once',
        received: `${year}${months ? `-${String(month).padStart(2, '0')}` : ''} after a step that is not before it`,
        hint: 'Import the file again and decide which of the repeated rows counts.',
      });
    }
    previous = step;
    const value = values[row];
    if (value !== null && !Number.isFinite(value)) {
      throw new InputError({
        code: 'not-finite',
        where: `${where}, ${year}`,
        expected: 'a finite number, or a missing value marked as such',
        received: String(value),
      });
    }
  }
}
