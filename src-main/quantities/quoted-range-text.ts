import type { QuotedRange } from '../contract/claim.ts';
import { withUnit } from './notation.ts';

/** A range as it is printed in the source, with the level that is said: `2.5 – 4.0, said to be 66 %`. */
export function quotedRangeText({ low, high, levelPercent }: QuotedRange): string {
  const ends =
    low === null
      ? `at most ${printed(high ?? '')}`
      : high === null
        ? `at least ${printed(low)}`
        : `${printed(low)} – ${printed(high)}`;
  return levelPercent === null ? ends : `${ends}, said to be ${withUnit(String(levelPercent), '%')}`;
}

const printed = (digits: string) => digits.trim().replace(/^-/, '−');
