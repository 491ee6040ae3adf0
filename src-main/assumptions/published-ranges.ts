import type { PublishedValue } from '../contract/finding.ts';
import { likelihoods } from '../quantities/likelihoods.ts';
import { decimalsOf, formatNumber } from '../quantities/notation.ts';

/** A range that a publication gives, with the value it belongs to; an end of null is open. */
export interface PublishedRange {
  of: PublishedValue;
  low: number | null;
  high: number | null;
  /** null: the publication gives none. */
  levelPercent: number | null;
  words: string;
  /** A one-sided statement: its words name its end. */
  isOneSided: boolean;
}

/**
 * What a publication says of a value as ranges: its ranges, from narrow to wide, then its one-sided statements, open to
 * the other side. "Very unlikely above 6" is at most 6 with at least 90 %.
 */
export function publishedRanges(of: PublishedValue): PublishedRange[] {
  const ranges = of.ranges.map(({ interval, words }) => ({ of, ...interval, words, isOneSided: false }));
  const statements = of.limits.flatMap(({ term, side, value }): PublishedRange[] => {
    const meaning = likelihoods.find((likelihood) => likelihood.term === term);
    if (!meaning) return [];
    const { lowPercent, highPercent } = meaning;
    const isLikely = lowPercent >= 50;
    if (!isLikely && highPercent > 50) return [];
    const isLowerEnd = (side === 'above') === isLikely;
    return [
      {
        of,
        low: isLowerEnd ? value : null,
        high: isLowerEnd ? null : value,
        levelPercent: isLikely ? lowPercent : 100 - highPercent,
        words: `${term} ${side} ${formatNumber(value, { decimals: decimalsOf([value]) })}`,
        isOneSided: true,
      },
    ];
  });
  return [...ranges, ...statements];
}
