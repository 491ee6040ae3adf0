import type { QuotedRange } from '../contract/claim.ts';
import { decimalsOf, formatNumber } from '../quantities/notation.ts';
import { roundsToStated, statedValue } from '../quantities/stated-number.ts';
import type { PublishedRange } from './published-ranges.ts';

/** Whether both published ends round to the quoted digits; an end that is left out stands for an open one. */
export function hasEndsOf(quoted: QuotedRange, { low, high }: PublishedRange): boolean {
  return isSameEnd(quoted.low, low) && isSameEnd(quoted.high, high);
}

/** Whether a single quoted end is an end of a range that has two. */
export function isEndOf(quoted: QuotedRange, { low, high }: PublishedRange): boolean {
  if (low === null || high === null) return false;
  return quoted.low === null ? isSameEnd(quoted.high, high) : quoted.high === null && isSameEnd(quoted.low, low);
}

function isSameEnd(digits: string | null, end: number | null): boolean {
  return digits === null || end === null ? digits === end : roundsToStated(digits, end);
}

/** 66 and 67 both say two chances in three; 66 and one standard deviation (68.3) are told apart. */
const levelMarginPercent = 1;

/**
 * How the level that the source says relates to the published one. An end of a central range alone is passed with half
 * of what lies outside: "at most 5" of a 5–95 % range may be said to be 90 % or 95 %.
 */
export function levelRelation(
  quoted: QuotedRange,
  range: PublishedRange,
): 'same' | 'not said' | 'not published' | 'other' {
  const { levelPercent: said } = quoted;
  const { levelPercent: published } = range;
  if (said === null) return 'not said';
  if (published === null) return 'not published';
  const allowed = isEndOf(quoted, range) ? [published, (100 + published) / 2] : [published];
  return allowed.some((level) => Math.abs(said - level) <= levelMarginPercent) ? 'same' : 'other';
}

/** Quoted minus published; 0 within the rounding of the quoted digits, null where either has no such end. */
export function endDifference(digits: string | null, end: number | null): number | null {
  if (digits === null || end === null) return null;
  return isSameEnd(digits, end) ? 0 : Number((statedValue(digits) - end).toPrecision(12));
}

/** How far the ends of a range that was quoted have been moved by rounding, in all. */
export function roundingShift(quoted: QuotedRange, range: PublishedRange): number {
  return (['low', 'high'] as const).reduce((total, end) => {
    const [digits, published] = [quoted[end], range[end]];
    return digits === null || published === null ? total : total + Math.abs(statedValue(digits) - published);
  }, 0);
}

/** The range of the level that is said, else the one whose ends are the least off; null where no end can be compared. */
export function nearestRange(quoted: QuotedRange, ranges: readonly PublishedRange[]): PublishedRange | null {
  const distances = ranges.flatMap((range) => {
    const differences = [endDifference(quoted.low, range.low), endDifference(quoted.high, range.high)];
    const known = differences.filter((difference) => difference !== null);
    const total = known.reduce((sum, difference) => sum + Math.abs(difference), 0);
    const nOpen = [quoted.low, quoted.high].filter((end) => end !== null).length - known.length;
    return known.length === 0 ? [] : [{ range, nOpen, isOfLevel: levelRelation(quoted, range) === 'same', total }];
  });
  const [nearest] = distances.sort(
    (a, b) => a.nOpen - b.nOpen || Number(b.isOfLevel) - Number(a.isOfLevel) || a.total - b.total,
  );
  return nearest?.range ?? null;
}

/** `the lower end is 0.5 too low and the upper end agrees`. */
export function distanceWords(quoted: QuotedRange, range: PublishedRange): string {
  return (['low', 'high'] as const)
    .filter((end) => quoted[end] !== null)
    .map((end) => {
      const name = end === 'low' ? 'the lower end' : 'the upper end';
      const difference = endDifference(quoted[end], range[end]);
      if (difference === null) return `${name} has no counterpart`;
      if (difference === 0) return `${name} agrees`;
      const size = formatNumber(Math.abs(difference), { decimals: decimalsOf([difference]) });
      return `${name} is ${size} too ${difference > 0 ? 'high' : 'low'}`;
    })
    .join(' and ');
}
