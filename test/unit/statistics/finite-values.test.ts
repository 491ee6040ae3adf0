import { describe, expect, it } from 'vitest';
import { isFootingError } from '../../../src-main/errors.ts';
import { finiteNumber, finiteValues } from '../../../src-main/statistics/finite-values.ts';

function codeOf(action: () => unknown): string {
  try {
    action();
  } catch (error) {
    if (isFootingError(error)) return error.fields.code;
    throw error;
  }
  return 'none';
}

describe('finiteValues', () => {
  it('hands the values back, a Float64Array as it is', () => {
    expect(finiteValues('f', 'x', [1, 2])).toEqual(Float64Array.of(1, 2));
    const given = Float64Array.of(3, 4);
    expect(finiteValues('f', 'x', given)).toBe(given);
  });

  it.each([
    ['not-finite', [1, NaN], {}],
    ['not-finite', [-Infinity], {}],
    ['too-large', [2e150], {}],
    ['too-few-values', [], {}],
    ['too-few-values', [1, 2], { atLeast: 3 }],
    ['wrong-length', [1, 2], { length: 3 }],
    ['not-positive', [1, 0], { sign: 'positive' }],
    ['negative', [0, -1], { sign: 'non-negative' }],
    ['none', [0, 1], { sign: 'non-negative', length: 2 }],
    ['none', [-1e150], {}],
  ] as const)('%s for %j with %j', (code, values, requirement) => {
    expect(codeOf(() => finiteValues('f', 'x', values, requirement))).toBe(code);
  });

  it('refuses a missing value hidden in a plain array', () => {
    expect(codeOf(() => finiteValues('f', 'x', JSON.parse('["a", 1]') as number[]))).toBe('not-finite');
    expect(codeOf(() => finiteValues('f', 'x', [1, undefined as unknown as number]))).toBe('not-finite');
  });

  it('names the caller, the place, what came, and the way out', () => {
    expect(() => finiteValues('theilSen', 'y', [1, 2, NaN])).toThrow(
      'theilSen, y[2]: expected a finite number, but found NaN. Leave missing values out first, as a step of its own that says which they are.',
    );
  });
});

describe('finiteNumber', () => {
  it('names the way out: its caller’s, or the bounds', () => {
    const sentence = (requirement: Parameters<typeof finiteNumber>[3]) => () =>
      finiteNumber('f', 'lag', 2.5, requirement);
    expect(sentence({ isWhole: true, atMost: 9 })).toThrow(/2\.5\. Give a whole number within these bounds\.$/);
    expect(sentence({ isWhole: true })).toThrow(/Give a whole number\.$/);
    expect(sentence({ above: 3, hint: 'Take a longer series.' })).toThrow(/2\.5\. Take a longer series\.$/);
  });

  it.each([
    ['none', 3, { isWhole: true, atLeast: 3, atMost: 3 }],
    ['out-of-range', 2.5, { isWhole: true }],
    ['out-of-range', 0, { above: 0 }],
    ['out-of-range', 1, { below: 1 }],
    ['out-of-range', 2, { atMost: 1 }],
    ['out-of-range', -1, { atLeast: 0 }],
    ['out-of-range', NaN, {}],
    ['out-of-range', Infinity, {}],
  ] as const)('%s for %d with %j', (code, value, requirement) => {
    expect(codeOf(() => finiteNumber('f', 'lag', value, requirement))).toBe(code);
  });

  it('says what it wanted', () => {
    expect(() => finiteNumber('neweyWest', 'lag', 40, { isWhole: true, atLeast: 0, atMost: 30 })).toThrow(
      'neweyWest, lag: expected a whole number at least 0 and at most 30, but found 40.',
    );
  });
});
