import { describe, expect, it } from 'vitest';
import { parseNumber } from '../../../src-main/readers/parse-number.ts';

describe('parseNumber', () => {
  it.each([
    ['-.19', -0.19],
    ['.00', 0],
    ['5.', 5],
    ['+1.5', 1.5],
    ['−0.3', -0.3],
    ['-8.85525e-05', -8.85525e-5],
    ['1.0D+02', 100],
    ['0007', 7],
  ])('reads %s with a decimal point', (text, value) => {
    expect(parseNumber(text, '.')).toBe(value);
  });

  it.each([
    ['-0,19', -0.19],
    [',5', 0.5],
    ['12', 12],
    ['1,5e3', 1500],
  ])('reads %s with a decimal comma', (text, value) => {
    expect(parseNumber(text, ',')).toBe(value);
  });

  it.each(['', '-', '1,000', '1.2.3', '12a', 'NaN', 'Infinity', '1e999', '0x10', '1 000', '***'])(
    'finds no number with a decimal point in "%s"',
    (text) => {
      expect(parseNumber(text, '.')).toBeNull();
    },
  );

  it.each(['1.5', '1,', '1,000,000'])('finds no number with a decimal comma in "%s"', (text) => {
    expect(parseNumber(text, ',')).toBeNull();
  });
});
