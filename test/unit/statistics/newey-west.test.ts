import { describe, expect, it } from 'vitest';
import { heteroskedasticCovariance } from '../../../src-main/statistics/heteroskedastic-covariance.ts';
import { leastSquares } from '../../../src-main/statistics/least-squares.ts';
import { neweyWest } from '../../../src-main/statistics/newey-west.ts';
import { expectClose } from '../../helpers/close.ts';

const rounding = { rel: 1e-14, abs: 1e-16, why: 'a short exact calculation in doubles' };

describe('neweyWest', () => {
  // Through the origin: x = 1, 2, 2; y = 2, 1, 3: scores 8/9, −22/9, 14/9; Σx² = 9.
  const fit = leastSquares({ columns: [[1, 2, 2]], y: [2, 1, 3] });
  const gamma = [(8 ** 2 + 22 ** 2 + 14 ** 2) / 81, (-8 * 22 - 22 * 14) / 81, (8 * 14) / 81] as const;

  it('weights lag j by 1 − j/(L + 1), by hand', () => {
    expectClose(neweyWest(fit, { lag: 1, smallSample: false }), [(gamma[0] + 2 * 0.5 * gamma[1]) / 81], rounding);
    const two = (gamma[0] + 2 * ((2 / 3) * gamma[1] + (1 / 3) * gamma[2])) / 81;
    expectClose(neweyWest(fit, { lag: 2, smallSample: false }), [two], rounding);
    expectClose(neweyWest(fit, { lag: 2, smallSample: true }), [two * (3 / 2)], rounding);
  });

  it('is hc0 at lag 0, and hc1 with the small-sample factor', () => {
    expectClose(neweyWest(fit, { lag: 0, smallSample: false }), heteroskedasticCovariance(fit, 'hc0'), rounding);
    expectClose(neweyWest(fit, { lag: 0, smallSample: true }), heteroskedasticCovariance(fit, 'hc1'), rounding);
  });

  it('refuses a lag that the series does not have', () => {
    for (const lag of [-1, 1.5, 3, NaN]) {
      expect(() => neweyWest(fit, { lag, smallSample: false })).toThrow('neweyWest, lag: expected a whole number');
    }
  });
});
