import type { YearSpan } from '../contract/primitives.ts';
import { InputError } from '../errors.ts';
import type { AnnualSeries, LeftOutYear } from './annual-means.ts';
import { formatYears } from './notation.ts';

/** The years that all series have, and the values of each series in those years. */
export interface AlignedSeries {
  years: number[];
  /** One column per series, in the order given. */
  columns: number[][];
  /** Years within the span asked for that could not be used, with what is missing. */
  leftOut: LeftOutYear[];
}

/**
 * Brings annual series onto the years that all of them have. Within `window` (or, without one, within the years that
 * the spans of all series share) every year that cannot be used is listed with the reason.
 *
 * @throws InputError `no-common-years` when nothing is left
 */
export function alignByYear(seriesList: readonly AnnualSeries[], window: YearSpan | null): AlignedSeries {
  const lookups = seriesList.map(({ years, values }) => new Map(years.map((year, row) => [year, values[row] ?? NaN])));
  const reasons = seriesList.map(({ leftOut }) => new Map(leftOut.map(({ year, reason }) => [year, reason])));
  const span = window ?? sharedSpan(seriesList);
  const aligned: AlignedSeries = { years: [], columns: seriesList.map(() => []), leftOut: [] };
  for (let year = span.start; year <= span.end; year++) {
    const lacking = seriesList.flatMap((series, index) =>
      lookups[index]?.has(year) ? [] : [reasons[index]?.get(year) ?? outsideReason(series)],
    );
    if (lacking.length > 0) {
      aligned.leftOut.push({ year, reason: lacking.join('; ') });
      continue;
    }
    aligned.years.push(year);
    aligned.columns.forEach((column, index) => column.push(lookups[index]?.get(year) ?? NaN));
  }
  if (aligned.years.length === 0) {
    throw new InputError({
      code: 'no-common-years',
      where: seriesList.map(({ name }) => name).join(' and '),
      expected: `years that all of them have${window ? ` within ${formatYears(window)}` : ''}`,
      received: seriesList.map((series) => `${series.name} ${spanText(series)}`).join(', '),
      hint: 'Choose series that overlap, or a lower number of months for an annual mean.',
    });
  }
  return aligned;
}

/** Years that lie within the span of every series, whether or not they could be used. */
function sharedSpan(seriesList: readonly AnnualSeries[]): YearSpan {
  const spans = seriesList.map(({ years, leftOut }) =>
    [...years, ...leftOut.map(({ year }) => year)].sort((a, b) => a - b),
  );
  return {
    start: Math.max(...spans.map((years) => years[0] ?? Infinity)),
    end: Math.min(...spans.map((years) => years.at(-1) ?? -Infinity)),
  };
}

function outsideReason(series: AnnualSeries): string {
  return `${series.name} covers ${spanText(series)}`;
}

function spanText({ years }: AnnualSeries): string {
  const start = years[0];
  const end = years.at(-1);
  return start === undefined || end === undefined ? 'no complete year' : formatYears({ start, end });
}
