import type { QuotedRange } from '../contract/claim.ts';
import { InputError } from '../errors.ts';
import { quotedRangeText } from './quoted-range-text.ts';
import { statedValue } from './stated-number.ts';

/**
 * A range that a source can have printed: at least one end, the lower one not above the upper.
 *
 * @throws InputError quoted-range-empty, quoted-range-order, not-a-number
 */
export function checkQuotedRange(where: string, range: QuotedRange): void {
  const { low, high } = range;
  if (low === null && high === null) {
    throw new InputError({
      code: 'quoted-range-empty',
      where,
      expected: 'at least one end of the range',
      received: 'none',
      hint: 'Give the end that is printed, or say that no range is quoted.',
    });
  }
  const ends = { low: low === null ? -Infinity : statedValue(low), high: high === null ? Infinity : statedValue(high) };
  if (ends.low > ends.high) {
    throw new InputError({
      code: 'quoted-range-order',
      where,
      expected: 'a lower end that is not above the upper one',
      received: quotedRangeText({ ...range, levelPercent: null }),
      hint: 'Exchange the two, or correct one.',
    });
  }
}
