import type { XyFigure } from '../contract/figure.ts';
import type { Series, SeriesValues } from '../contract/series.ts';

/** A series over time, with its limits as a band where the provider gives them. */
export function seriesFigure(
  series: Series,
  { years, months, values, lower, upper, boundsLevelPercent }: SeriesValues,
): XyFigure {
  const x = years.map((year, place) => (months ? year + ((months[place] ?? 1) - 0.5) / 12 : year));
  const level = boundsLevelPercent === null ? '' : ` (${Number(boundsLevelPercent.toFixed(1))} %)`;
  const band = { label: `provider’s limits${level}`, mark: 'band' as const, x, role: 'data' as const };
  const baseline = series.baseline ? `, relative to ${series.baseline.start}–${series.baseline.end}` : '';
  return {
    kind: 'xy',
    name: series.name,
    title: series.label,
    caption: `${series.label}, ${series.startYear}–${series.endYear}, by ${series.step}${baseline}.`,
    digests: [series.valuesDigest],
    xLabel: 'Year',
    yLabel: `${series.label}${series.unit ? ` (${series.unit})` : ''}`,
    isXYears: true,
    marks: [
      ...(lower && upper ? [{ ...band, y: lower, y2: upper }] : []),
      { label: series.label, mark: 'line', x, y: values, y2: null, role: 'data' },
    ],
  };
}
