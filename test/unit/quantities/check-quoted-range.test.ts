import { describe, expect, it } from 'vitest';
import { checkQuotedRange } from '../../../src-main/quantities/check-quoted-range.ts';
import { quotedRangeText } from '../../../src-main/quantities/quoted-range-text.ts';

const range = (low: string | null, high: string | null, levelPercent: number | null = null) => ({
  low,
  high,
  levelPercent,
});

describe('checkQuotedRange', () => {
  it.each([range('2.5', '4'), range('1,5', null), range(null, '6'), range('−0.5', '0.5'), range('3', '3')])(
    'takes %o',
    (printed) => {
      expect(() => checkQuotedRange('here', printed)).not.toThrow();
    },
  );

  it.each([
    [range(null, null), 'quoted-range-empty'],
    [range('4', '2.5'), 'quoted-range-order'],
    [range('−0.5', '−1'), 'quoted-range-order'],
    [range('about 2', '4'), 'not-a-number'],
  ])('refuses %o', (printed, code) => {
    expect(() => checkQuotedRange('here', printed)).toThrow(
      expect.objectContaining({ fields: expect.objectContaining({ code }) as object }),
    );
  });
});

describe('quotedRangeText', () => {
  it('keeps the printed digits, and the level as it is said', () => {
    expect(quotedRangeText(range('2.50', '4', 66))).toBe('2.50 – 4, said to be 66\u202f%');
    expect(quotedRangeText(range('-0.5', '0.5'))).toBe('−0.5 – 0.5');
    expect(quotedRangeText(range('1.5', null))).toBe('at least 1.5');
    expect(quotedRangeText(range(null, '6', 90))).toBe('at most 6, said to be 90\u202f%');
  });
});
