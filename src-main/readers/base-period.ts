import type { YearSpan } from '../contract/primitives.ts';
import type { SeriesValues } from '../contract/series.ts';

const statedPeriod =
  /(?:base(?:line)?(?:[ _-]?period)?|reference(?:[ _-]?period| for annual cycle)?|climatology(?: from)?|relative to|rel\.? to|w\.?r\.?t\.?|with respect to|versus|vs\.?)[^\d\n]{0,40}?((?:1[5-9]|20)\d\d)\s*(?:-|–|—|−|to|through|until)\s*(?:[a-z]{3,9}\.?\s+)?((?:1[5-9]|20)\d\d)/gi;

const customaryPeriods: readonly YearSpan[] = [
  { start: 1850, end: 1900 },
  { start: 1901, end: 2000 },
  { start: 1951, end: 1980 },
  { start: 1961, end: 1990 },
  { start: 1971, end: 2000 },
  { start: 1981, end: 2010 },
  { start: 1991, end: 2020 },
];
/** An anomaly record printed to two decimals averages to zero over its base period within this, in its own unit. */
const zeroMean = 0.005;

/** Base periods that a text names: "base period: 1951-1980", "relative to the Jan 1951-Dec 1980 average". */
export function statedBasePeriods(text: string): YearSpan[] {
  const spans = [...text.matchAll(statedPeriod)]
    .map(([, start, end]) => ({ start: Number(start), end: Number(end) }))
    .filter(({ start, end }) => end > start);
  return spans.filter(
    (span, place) => spans.findIndex((other) => other.start === span.start && other.end === span.end) === place,
  );
}

/** The customary base period over which values average to zero; null when there is none, or values are missing there. */
export function zeroMeanPeriod(values: SeriesValues): YearSpan | null {
  const fitting = customaryPeriods
    .map((span) => ({ span, mean: meanOver(values, span) }))
    .filter(({ mean }) => mean !== null && Math.abs(mean) <= zeroMean);
  const [best] = fitting.toSorted((a, b) => Math.abs(a.mean ?? 0) - Math.abs(b.mean ?? 0));
  return best?.span ?? null;
}

/** Mean of the values over a span of which every step is there; else null. */
export function meanOver({ years, months, values }: SeriesValues, { start, end }: YearSpan): number | null {
  const inside = values.filter((_, place) => (years[place] ?? 0) >= start && (years[place] ?? 0) <= end);
  const present = inside.filter((value) => value !== null);
  const nSteps = (end - start + 1) * (months ? 12 : 1);
  return present.length < nSteps ? null : present.reduce((sum, value) => sum + value, 0) / nSteps;
}
