import type { SeriesValues } from '../contract/series.ts';

/** Span and counts of a series: present and missing values, and calendar steps inside the span without a row. */
export function countSteps({ years, months, values }: SeriesValues): {
  startYear: number;
  endYear: number;
  nPresent: number;
  nMissing: number;
  nAbsent: number;
} {
  const startYear = years[0] ?? 0;
  const endYear = years.at(-1) ?? 0;
  const nMissing = values.filter((value) => value === null).length;
  const nSteps = months
    ? (endYear - startYear) * 12 + (months.at(-1) ?? 0) - (months[0] ?? 0) + 1
    : endYear - startYear + 1;
  return { startYear, endYear, nPresent: values.length - nMissing, nMissing, nAbsent: nSteps - values.length };
}
