import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import {
  decimalsFor,
  decimalsOf,
  formatInterval,
  formatLevel,
  formatNumber,
  formatP,
  formatQuantity,
  formatShare,
  formatWithUncertainty,
  formatYear,
  formatYearList,
  formatYears,
  shortDigest,
} from '../../../src-main/quantities/notation.ts';

// A narrow no-break space is written as _ here, to be seen.
const seen = (text: string): string => text.replaceAll('\u202f', '_');

describe('formatNumber', () => {
  it.each([
    [1.8784, {}, '1.88'],
    [1.8784, { decimals: 1 }, '1.9'],
    [1.8784, 1, '1.9'],
    [-0.123, { decimals: 2 }, '−0.12'],
    [-0.001, { decimals: 2 }, '0.00'],
    [0.4, { withSign: true, decimals: 1 }, '+0.4'],
    [0, { withSign: true }, '0'],
    [410, {}, '410'],
    [1234.5, {}, '1230'],
    [1234.5, { decimals: 1 }, '1234.5'],
    [12_345, { decimals: 0 }, '12_345'],
    [1_234_567, { decimals: 0 }, '1_234_567'],
    [1.234e-5, {}, '1.23 × 10⁻⁵'],
    [6.02e23, {}, '6.02 × 10²³'],
    [-5.1e14, { significantDigits: 2 }, '−5.1 × 10¹⁴'],
    [0.0009996, {}, '0.00100'],
    [null, {}, '–'],
    [Infinity, {}, '∞'],
    [-Infinity, {}, '−∞'],
    [NaN, {}, 'not a number'],
  ])('%s with %j is %s', (value, format, text) => {
    expect(seen(formatNumber(value, format))).toBe(text);
  });
});

describe('formatQuantity', () => {
  it('puts a thin space before the unit, and shows no unit for plain numbers', () => {
    expect(seen(formatQuantity(3.708, 'W/m²'))).toBe('3.71_W/m²');
    expect(formatQuantity(0.5, '1')).toBe('0.500');
  });
});

describe('formatWithUncertainty', () => {
  it.each([
    [1.88, 0.23, '1.9 ± 0.2_K'],
    [1.8784, 0.134, '1.88 ± 0.13_K'],
    [1.8784, 0.16, '1.88 ± 0.16_K'],
    [1.8784, 0.0987, '1.88 ± 0.10_K'],
    [1.8784, 0.095, '1.88 ± 0.10_K'],
    [-1.16, 0.4, '−1.2 ± 0.4_K'],
    [1234, 23, '1230 ± 20_K'],
    [1234, 140, '1230 ± 140_K'],
    [0.5, 2.6, '1 ± 3_K'],
    [3, null, '3.00_K'],
    [3, 0, '3.00_K'],
  ])('%d with %d', (value, uncertainty, text) => {
    expect(seen(formatWithUncertainty(value, uncertainty, 'K'))).toBe(text);
  });

  it('tells how many decimals an uncertainty leaves', () => {
    expect([0.23, 0.134, 0.0987, 23, 2.6].map(decimalsFor)).toEqual([1, 2, 2, 0, 0]);
  });
});

describe('formatInterval', () => {
  it.each([
    [{ low: 1.6, high: 4.8 }, '1.6 – 4.8_K'],
    [{ low: 1.5703, high: 4.9668 }, '1.6 – 5.0_K'],
    [{ low: -0.1234, high: 0.0456 }, '−0.12 – 0.05_K'],
    [{ low: 1.63, high: null }, '1.6 – unbounded_K'],
    [{ low: null, high: 2.44 }, 'unbounded – 2.4_K'],
    [{ low: null, high: null }, 'unbounded – unbounded_K'],
    [{ low: 120.3, high: 480.2 }, '120 – 480_K'],
  ])('%j', (interval, text) => {
    expect(seen(formatInterval(interval, 'K'))).toBe(text);
  });

  it('takes the decimals it is given', () => {
    expect(formatInterval({ low: 1, high: 2 }, '', 2)).toBe('1.00 – 2.00');
  });
});

describe('small settings', () => {
  it('levels', () => {
    expect([90, 66, 95].map((level) => seen(formatLevel(level)))).toEqual(['5–95_%', '17–83_%', '2.5–97.5_%']);
  });

  it('p-values', () => {
    expect([0.0004, 0.0123, 0.0994, 0.05, 0.5, 0.9999].map(formatP)).toEqual([
      'p < 0.001',
      'p = 0.012',
      'p = 0.099',
      'p = 0.050',
      'p = 0.50',
      'p > 0.99',
    ]);
  });

  it('shares', () => {
    expect([formatShare(0.372), formatShare(0.0372, 1)].map(seen)).toEqual(['37_%', '3.7_%']);
  });

  it('years and lists of years', () => {
    expect(formatYear(-44)).toBe('−44');
    expect(formatYears({ start: 1959, end: 2019 })).toBe('1959–2019');
    expect(formatYears({ start: 1959, end: 1959 })).toBe('1959');
    expect(formatYearList([1972, 1963, 1970, 1971, 1999])).toBe('1963, 1970–1972, 1999');
    expect(formatYearList([])).toBe('');
  });

  it('digests', () => {
    expect(shortDigest(`77b0c1${'0'.repeat(54)}04e2`)).toBe('77b0c1…04e2');
    expect(shortDigest('77b0')).toBe('77b0');
  });
});

it('imports nothing, so that the screens can use it', () => {
  const source = readFileSync(new URL('../../../src-main/quantities/notation.ts', import.meta.url), 'utf8');
  expect(source).not.toMatch(/\bimport\b/);
});

describe('decimalsOf', () => {
  it.each([
    [[3, 2.5, 4], 1],
    [[0.08, 0, 0.18], 2],
    [[153, 101, null], 0],
    [[2.33136], 5],
    [[1 / 3], 6],
    [[0.1 + 0.2], 1],
    [[null], 0],
    [[], 0],
  ])('%j need %d', (values, decimals) => {
    expect(decimalsOf(values)).toBe(decimals);
  });
});
