import type { SeriesValues } from '../contract/series.ts';

export interface PartialYear {
  year: number;
  note: string;
}

/** The years of a monthly series of which fewer than twelve months have a value, in order. None for an annual series. */
export function partialYears({ years, months, values }: SeriesValues): PartialYear[] {
  if (months === null) return [];
  const nPresent = new Map<number, number>();
  years.forEach((year, place) => {
    nPresent.set(year, (nPresent.get(year) ?? 0) + (values[place] === null ? 0 : 1));
  });
  return [...nPresent].filter(([, n]) => n < 12).map(([year, n]) => ({ year, note: `${n} of 12 months have a value` }));
}
