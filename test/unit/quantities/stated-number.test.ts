import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  agreementWithStated,
  decimalsPrinted,
  intervalsMeet,
  roundsToStated,
  significantDigitsPrinted,
  statedHalfUnit,
  statedInterval,
  statedValue,
} from '../../../src-main/quantities/stated-number.ts';
import { InputError } from '../../../src-main/errors.ts';

// A narrow no-break space is written as _ here, to be seen.
const seen = (text: string): string => text.replaceAll('\u202f', '_');

describe('statedValue', () => {
  it.each([
    ['2.0', 2],
    ['2,71', 2.71],
    ['−0.2', -0.2],
    ['-0.2', -0.2],
    ['+3', 3],
    ['.5', 0.5],
    ['3.', 3],
    ['1.2e-3', 0.0012],
    ['5E2', 500],
    ['6.02e23', 6.02e23],
    ['0', 0],
  ])('reads %s as %d', (text, value) => {
    expect(statedValue(text)).toBe(value);
  });

  it.each(['', 'two', '1.9 K', '1.2.3', '1e', '--1', 'NaN', 'Infinity', '0x10', '1 000', '1e999'])(
    'refuses “%s” and says what is expected',
    (text) => {
      expect(() => statedValue(text)).toThrow(InputError);
      expect(() => statedValue(text)).toThrow(/plain decimal number/);
    },
  );
});

describe('statedInterval', () => {
  // Half a unit of the last printed digit, by hand; equal to the double nearest the decimal.
  it.each([
    ['2.0', 1.95, 2.05],
    ['2.71', 2.705, 2.715],
    ['1,9', 1.85, 1.95],
    ['3', 2.5, 3.5],
    ['300', 299.5, 300.5],
    ['2.0e3', 1950, 2050],
    ['0.61', 0.605, 0.615],
    ['0', -0.5, 0.5],
    ['−2.0', -2.05, -1.95],
    ['1.2e-3', 0.00115, 0.00125],
  ])('of %s is %d to %d', (text, low, high) => {
    expect(statedInterval(text)).toEqual({ low, high });
  });

  it('holds exactly the numbers that print as these digits', () => {
    fc.assert(
      fc.property(fc.integer({ min: -99_999, max: 99_999 }), fc.integer({ min: 0, max: 4 }), (digits, decimals) => {
        const printed = (digits / 10 ** decimals).toFixed(decimals);
        const { low, high } = statedInterval(printed);
        const halfUnit = statedHalfUnit(printed);
        const nearlyInside = (high - low) * 0.499;
        const middle = statedValue(printed);
        expect(high - low).toBeCloseTo(2 * halfUnit, 9);
        expect(roundsToStated(printed, middle)).toBe(true);
        expect(roundsToStated(printed, middle + nearlyInside)).toBe(true);
        expect(roundsToStated(printed, middle - nearlyInside)).toBe(true);
        expect(roundsToStated(printed, middle + 1.002 * halfUnit)).toBe(false);
        expect(roundsToStated(printed, middle - 1.002 * halfUnit)).toBe(false);
      }),
    );
  });

  it('rounds halves away from zero on both sides of zero', () => {
    expect([roundsToStated('2.0', 1.95), roundsToStated('2.0', 2.05)]).toEqual([true, false]);
    expect([roundsToStated('-2.0', -1.95), roundsToStated('-2.0', -2.05)]).toEqual([true, false]);
  });
});

describe('digits printed', () => {
  it.each([
    ['1.90', 2, 3],
    ['0.05', 2, 1],
    ['300', 0, 3],
    ['2.0e3', 0, 2],
    ['1.2e-3', 4, 2],
    ['0', 0, 1],
  ])('of %s: %d decimals, %d significant', (text, decimals, significant) => {
    expect(decimalsPrinted(text)).toBe(decimals);
    expect(significantDigitsPrinted(text)).toBe(significant);
  });
});

describe('intervalsMeet', () => {
  it('does not take touching ends for a meeting', () => {
    expect(intervalsMeet({ low: 2.05, high: 2.15 }, '2.0')).toBe(false);
    expect(intervalsMeet({ low: 1.85, high: 1.95 }, '2.0')).toBe(false);
    expect(intervalsMeet({ low: 2.04, high: 2.15 }, '2.0')).toBe(true);
    expect(intervalsMeet({ low: 1.95, high: 1.95 }, '2.0')).toBe(true);
    expect(intervalsMeet({ low: 2.05, high: 2.05 }, '2.0')).toBe(false);
  });
});

describe('agreementWithStated', () => {
  const unit = 'K per doubling';

  it('says that a number is reproduced within rounding, with the digits it was held against', () => {
    const answer = agreementWithStated('1.9', 1.8784, { bound: 'equals', unit });
    expect(answer).toMatchObject({ isReproduced: true, statedInterval: { low: 1.85, high: 1.95 } });
    expect(answer.difference).toBeCloseTo(-0.0216, 12);
    expect(seen(answer.sentence)).toBe(
      'Reproduced within rounding: 1.88_K per doubling against the stated 1.9 (1.85 to 1.95).',
    );
  });

  it('says by how much a number is not reproduced, and on which side', () => {
    expect(seen(agreementWithStated('1.9', 2.3, { bound: 'equals', unit }).sentence)).toBe(
      'Not reproduced: 2.30_K per doubling is 0.40 above the stated 1.9 (1.85 to 1.95).',
    );
    expect(seen(agreementWithStated('−0.12', -0.2, { bound: 'equals', unit: 'W/m²' }).sentence)).toBe(
      'Not reproduced: −0.200_W/m² is 0.080 below the stated −0.12 (−0.125 to −0.115).',
    );
  });

  it.each([
    ['at most', 2.3, 'It exceeds “at most 1.9”.'],
    ['at most', 1.5, 'It stays within “at most 1.9”.'],
    ['at least', 2.3, 'It stays within “at least 1.9”.'],
    ['at least', 1.5, 'It falls short of “at least 1.9”.'],
  ] as const)(
    'compares a bound as the number it names, and adds where the value lies: %s 1.9, %d',
    (bound, value, end) => {
      const { isReproduced, sentence } = agreementWithStated('1.9', value, { bound, unit });
      expect(isReproduced).toBe(false);
      expect(sentence).toMatch(/^Not reproduced: .* the stated 1\.9 \(1\.85 to 1\.95\)\. /);
      expect(sentence.endsWith(end)).toBe(true);
    },
  );

  it('says nothing of a bound that is the number recomputed', () => {
    expect(agreementWithStated('1.9', 1.93, { bound: 'at most', unit }).sentence).toMatch(
      /^Reproduced .*\(1\.85 to 1\.95\)\.$/,
    );
  });

  it('takes the rounding of the inputs into account where there is one', () => {
    const context = { bound: 'equals', unit: '1' } as const;
    expect(agreementWithStated('1.9', 1.96, context).isReproduced).toBe(false);
    expect(
      agreementWithStated('1.9', 1.96, { ...context, computedInterval: { low: 1.94, high: 1.98 } }).isReproduced,
    ).toBe(true);
  });
});
