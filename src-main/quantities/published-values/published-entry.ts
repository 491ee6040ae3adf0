import type { LikelihoodTerm, PublishedValue } from '../../contract/finding.ts';

export const ar6 = 'IPCC AR6 WG1 (2021)';
export const ar5 = 'IPCC AR5 WG1 (2013)';
export const ar4 = 'IPCC AR4 WG1 (2007)';
export const tar = 'IPCC TAR WG1 (2001)';
export const far = 'IPCC FAR WG1 (1990)';
export const igcc = 'Indicators of Global Climate Change, 2024 update';

type Range = PublishedValue['ranges'][number];
type Limit = PublishedValue['limits'][number];
type Optional = 'subject' | 'best' | 'ranges' | 'limits' | 'remark';

/** A row of the table; what a publication does not give may be left out. */
export function publishedEntry(entry: Omit<PublishedValue, Optional> & Partial<PublishedValue>): PublishedValue {
  return { subject: '', best: null, ranges: [], limits: [], remark: null, ...entry };
}

/** The central 66 per cent, in the report's calibrated language. */
export function likely(low: number, high: number): Range {
  return { interval: { low, high, levelPercent: 66 }, words: 'likely (66 %)' };
}

/** The central 90 per cent. */
export function veryLikely(low: number, high: number): Range {
  return { interval: { low, high, levelPercent: 90 }, words: 'very likely (5–95 %)' };
}

/** A 5–95 % range that the publication gives without a likelihood word; null: no upper bound. */
export function range90(low: number, high: number | null): Range {
  return { interval: { low, high, levelPercent: 90 }, words: '5–95 % range' };
}

/** One standard deviation to either side. */
export function standardDeviation(low: number, high: number): Range {
  return { interval: { low, high, levelPercent: 68.3 }, words: '± one standard deviation (68 %)' };
}

/** A range that the publication gives without a level. */
export function rangeWithoutLevel(low: number, high: number, words: string): Range {
  return { interval: { low, high, levelPercent: null }, words };
}

export function above(value: number, term: LikelihoodTerm): Limit {
  return { term, side: 'above', value };
}

export function below(value: number, term: LikelihoodTerm): Limit {
  return { term, side: 'below', value };
}
