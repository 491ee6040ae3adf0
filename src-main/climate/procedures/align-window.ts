import type { Caveat, YearSpan } from '../../contract/primitives.ts';
import type { SeriesData } from '../../contract/series.ts';
import { InputError } from '../../errors.ts';
import { alignByYear, type AlignedSeries } from '../../quantities/align-by-year.ts';
import { annualMeans, type AnnualSeries, type LeftOutYear } from '../../quantities/annual-means.ts';
import { formatYear, formatYearList, formatYears } from '../../quantities/notation.ts';

export interface WindowedColumns {
  /** First and last year in use. */
  window: YearSpan;
  years: number[];
  /** Annual values by series, in the series' own unit. */
  columns: number[][];
  leftOut: LeftOutYear[];
  caveats: Caveat[];
}

/**
 * Annual values of the series in the years that a procedure uses: means of complete years, the years that all series
 * have, cut to the window. Gaps inside it, part years and means of incomplete years become caveats.
 *
 * @param window  null: every year that all series have
 * @throws InputError `window-not-covered` when a series has no value in the first or last year of the window;
 *         `window-reversed`; `no-common-years`
 */
export function alignWindow(
  seriesList: readonly SeriesData[],
  minMonths: number,
  window: YearSpan | null,
): WindowedColumns {
  if (window && window.start > window.end) {
    throw new InputError({
      code: 'window-reversed',
      where: 'window',
      expected: 'a first year that is not after the last',
      received: formatYears(window),
      hint: 'Put the earlier year first.',
    });
  }
  const annual = seriesList.map((series) => annualMeans(series, minMonths));
  const aligned = alignByYear(annual, window);
  if (window) checkWindowEnds(window, aligned, annual);
  const { years, columns, leftOut } = aligned;
  const used = { start: years[0] ?? NaN, end: years.at(-1) ?? NaN };
  return {
    window: used,
    years,
    columns,
    leftOut,
    caveats: [
      ...gapCaveats(used, leftOut),
      ...seriesList.flatMap((series, index) => yearCaveats(series, annual[index], years)),
    ],
  };
}

function checkWindowEnds(window: YearSpan, aligned: AlignedSeries, annual: readonly AnnualSeries[]): void {
  const missing = aligned.leftOut.filter(({ year }) => year === window.start || year === window.end);
  if (missing.length === 0) return;
  const usable = alignByYear(annual, null).years;
  throw new InputError({
    code: 'window-not-covered',
    where: `window ${formatYears(window)}`,
    expected: 'an annual value of every series in its first and its last year',
    received: missing.map(({ year, reason }) => `none in ${formatYear(year)} (${reason})`).join(' and '),
    hint: `Years that all series have: ${formatYearList(usable)}. Choose a window within them, or a lower number of months for an annual mean.`,
  });
}

function gapCaveats(used: YearSpan, leftOut: readonly LeftOutYear[]): Caveat[] {
  const gaps = leftOut.filter(({ year }) => year > used.start && year < used.end).map(({ year }) => year);
  if (gaps.length === 0) return [];
  return [
    {
      code: 'gap-in-window',
      detail: `No value in ${formatYearList(gaps)}. Lag-one correlation, Durbin–Watson and Newey–West errors take the years on either side of a gap for neighbours.`,
    },
  ];
}

function yearCaveats(series: SeriesData, annual: AnnualSeries | undefined, years: readonly number[]): Caveat[] {
  const inUse = new Set(years);
  const caveats: Caveat[] = [];
  const incomplete = (annual?.incomplete ?? []).filter(({ year }) => inUse.has(year));
  if (incomplete.length > 0) {
    const list = incomplete.map(({ year, nMonths }) => `${formatYear(year)} (${nMonths})`).join(', ');
    caveats.push({
      code: 'incomplete-year-means',
      detail: `${series.name}: means of fewer than twelve months in ${list}. Where there is a yearly cycle they lean towards the months that are there.`,
    });
  }
  if (series.step === 'year') {
    for (const { year, note } of series.partialYears.filter((part) => inUse.has(part.year))) {
      caveats.push({
        code: 'part-year',
        detail: `${series.name}, ${formatYear(year)}: ${note}. Leave the year out of the window, or say why it may stay.`,
      });
    }
  }
  return caveats;
}
