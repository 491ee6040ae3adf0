import normalQuantile from '@stdlib/stats-base-dists-normal-quantile';
import { describe, expect, it } from 'vitest';
import { fieller } from '../../../src-main/statistics/fieller.ts';
import { randomStream } from '../../../src-main/statistics/random-stream.ts';
import { expectClose } from '../../helpers/close.ts';

const rounding = { rel: 1e-12, abs: 1e-12, why: 'rounding' };
const z90 = normalQuantile(0.95, 0, 1);

describe('fieller', () => {
  it('has ends at which the ratio is just compatible with the two means', () => {
    const ratio = {
      numerator: 4.05,
      denominator: 1.61,
      numeratorVariance: 0.31,
      denominatorVariance: 0.12,
      covariance: 0.04,
      multiple: z90,
    };
    const { low, high } = fieller(ratio);
    for (const end of [low ?? NaN, high ?? NaN]) {
      const distance = Math.abs(ratio.numerator - end * ratio.denominator);
      const sd = Math.sqrt(
        ratio.numeratorVariance - 2 * end * ratio.covariance + end * end * ratio.denominatorVariance,
      );
      expectClose(distance / sd, z90, rounding);
    }
    expect(low).toBeLessThan(4.05 / 1.61);
    expect(high).toBeGreaterThan(4.05 / 1.61);
  });

  it('is the interval of the numerator when the denominator is known', () => {
    const known = {
      numerator: 3,
      denominator: 2,
      numeratorVariance: 0.25,
      denominatorVariance: 0,
      covariance: 0,
      multiple: z90,
    };
    const { low, high } = fieller(known);
    expectClose(low, (3 - z90 * 0.5) / 2, rounding);
    expectClose(high, (3 + z90 * 0.5) / 2, rounding);
  });

  it('is open towards infinity, on the side of the estimate, when the denominator may be zero', () => {
    const weak = {
      numerator: 3,
      denominator: 1,
      numeratorVariance: 0.04,
      denominatorVariance: 1,
      covariance: 0,
      multiple: z90,
    };
    const above = fieller(weak);
    expect(above.high).toBeNull();
    expect(above.low).toBeGreaterThan(0);
    expect(above.low).toBeLessThan(3);
    const below = fieller({ ...weak, numerator: -3 });
    expect(below.low).toBeNull();
    expectClose(below.high, -(above.low ?? NaN), rounding);
  });

  it('is the whole line when both may be zero', () => {
    const vague = {
      numerator: 0.1,
      denominator: 0.1,
      numeratorVariance: 1,
      denominatorVariance: 1,
      covariance: 0,
      multiple: z90,
    };
    expect(fieller(vague)).toEqual({ low: null, high: null });
  });

  it('covers the true ratio as often as it says', () => {
    const nTrials = 4000;
    const truth = { numerator: 3, denominator: 1 };
    const stream = randomStream(31, 0);
    let nCovering = 0;
    for (let trial = 0; trial < nTrials; trial++) {
      const shared = stream.normal();
      const numerator = truth.numerator + 0.4 * shared + 0.3 * stream.normal();
      const denominator = truth.denominator + 0.2 * shared + 0.2 * stream.normal();
      const { low, high } = fieller({
        numerator,
        denominator,
        numeratorVariance: 0.25,
        denominatorVariance: 0.08,
        covariance: 0.08,
        multiple: z90,
      });
      if ((low === null || low <= 3) && (high === null || high >= 3)) nCovering++;
    }
    const bound = 4.5 * Math.sqrt((0.9 * 0.1) / nTrials);
    expectClose(nCovering / nTrials, 0.9, { rel: 0, abs: bound, why: '4.5 binomial standard errors' });
  });

  it.each([
    { change: { denominator: 0 }, says: /denominator: .*above 0/ },
    { change: { numeratorVariance: -1 }, says: /numeratorVariance/ },
    { change: { covariance: NaN }, says: /covariance: expected a finite number/ },
  ])('refuses $change', ({ change, says }) => {
    const ratio = {
      numerator: 3,
      denominator: 2,
      numeratorVariance: 1,
      denominatorVariance: 1,
      covariance: 0,
      multiple: z90,
    };
    expect(() => fieller({ ...ratio, ...change })).toThrow(says);
  });
});
