import { describe, expect, it } from 'vitest';
import { NumericError } from '../../../src-main/errors.ts';
import { heteroskedasticCovariance } from '../../../src-main/statistics/heteroskedastic-covariance.ts';
import { leastSquares } from '../../../src-main/statistics/least-squares.ts';
import { expectClose } from '../../helpers/close.ts';

const rounding = { rel: 1e-14, abs: 1e-15, why: 'a short exact calculation in doubles' };

describe('heteroskedasticCovariance', () => {
  // Through the origin: x = 1, 2, 2; y = 2, 1, 3: b = 10/9, e = 8/9, −11/9, 7/9; h = 1/9, 4/9, 4/9; Σx² = 9.
  const fit = leastSquares({ columns: [[1, 2, 2]], y: [2, 1, 3] });
  const scores = [8 / 9, -22 / 9, 14 / 9];
  const leverage = [1 / 9, 4 / 9, 4 / 9];
  const covariance = (factor: (h: number) => number) =>
    scores.reduce((total, s, i) => total + s ** 2 * factor(leverage[i]!), 0) / 81;

  it('is the published formula of each kind, by hand', () => {
    expectClose(heteroskedasticCovariance(fit, 'hc0'), [covariance(() => 1)], rounding);
    expectClose(heteroskedasticCovariance(fit, 'hc1'), [covariance(() => 3 / 2)], rounding);
    expectClose(heteroskedasticCovariance(fit, 'hc2'), [covariance((h) => 1 / (1 - h))], rounding);
    expectClose(heteroskedasticCovariance(fit, 'hc3'), [covariance((h) => 1 / (1 - h) ** 2)], rounding);
  });

  it('refuses hc2 and hc3 where a row leaves nothing to the others', () => {
    const alone = leastSquares({
      columns: [
        [1, 1, 1, 0],
        [0, 0, 0, 1],
      ],
      y: [1, 2, 4, 5],
    });
    expect(() => heteroskedasticCovariance(alone, 'hc3')).toThrow(NumericError);
    expect(() => heteroskedasticCovariance(alone, 'hc2')).toThrow('row 3');
    expect(heteroskedasticCovariance(alone, 'hc1')[3]).toBe(0);
  });
});
