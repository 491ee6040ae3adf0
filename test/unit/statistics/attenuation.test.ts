import { describe, expect, it } from 'vitest';
import { attenuation } from '../../../src-main/statistics/attenuation.ts';

const x = [1, 2, 4, 5, 7];
const y = [2, 1, 3, 5, 4];
const asked = { x, y, xErrorStandardDeviation: 0.5 };

describe('attenuation', () => {
  it('no reverse bound where x and y are uncorrelated', () => {
    const { slope, bounds } = attenuation({ ...asked, x: [-1, 0, 1], y: [1, -2, 1] });
    expect({ slope, bounds }).toEqual({ slope: 0, bounds: { direct: 0, reverse: null } });
  });

  it.each([
    [
      'errors as large as the spread',
      { xErrorStandardDeviation: 2.4 },
      'errors smaller than the standard deviation of x',
    ],
    ['a negative error', { xErrorStandardDeviation: -1 }, 'attenuation, xErrorStandardDeviation'],
    ['a constant predictor', { x: [2, 2, 2, 2, 2] }, 'attenuation, x'],
    ['a missing value', { y: y.with(2, NaN) }, 'attenuation, y[2]'],
    ['mismatched lengths', { y: y.slice(1) }, 'expected 5 values'],
    ['two rows', { x: [1, 2], y: [1, 3] }, 'at least 3 values'],
  ])('refuses %s', (_, change, sentence) => expect(() => attenuation({ ...asked, ...change })).toThrow(sentence));
});
