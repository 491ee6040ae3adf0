import normalCdf from '@stdlib/stats-base-dists-normal-cdf';
import normalQuantile from '@stdlib/stats-base-dists-normal-quantile';
import { describe, expect, it } from 'vitest';
import { drawnRatio } from '../../../src-main/climate/drawn-ratio.ts';

const exactly = (centre: number) => ({ centre, sdBelow: 0, sdAbove: 0 });
const spread = (centre: number, sd: number) => ({ centre, sdBelow: sd, sdAbove: sd });
const nDraws = 100_000;
const common = { correlation: 0, nDraws, seed: 7 };

/** Bounds of 4.5 standard errors of an order statistic. */
function expectQuantiles(found: ReturnType<typeof drawnRatio>, quantile: (p: number) => number): void {
  for (const [name, p] of Object.entries({ q05: 0.05, q50: 0.5, q95: 0.95 } as const)) {
    const within = 4.5 * Math.sqrt((p * (1 - p)) / nDraws);
    const value = found[name as 'q05'];
    expect(value, name).toBeGreaterThan(quantile(p - within));
    expect(value, name).toBeLessThan(quantile(p + within));
  }
}
const z = (p: number) => normalQuantile(p, 0, 1);

describe('drawnRatio', () => {
  it('is normal over a known denominator, and the reciprocal of a normal under a known numerator', () => {
    expectQuantiles(
      drawnRatio({ ...common, numerator: spread(3, 0.5), denominator: exactly(2) }),
      (p) => (3 + 0.5 * z(p)) / 2,
    );
    expectQuantiles(
      drawnRatio({ ...common, numerator: exactly(3), denominator: spread(2, 0.3) }),
      (p) => 3 / (2 + 0.3 * z(1 - p)),
    );
  });

  it('is one number where both move in step in proportion', () => {
    const { q05, q95 } = drawnRatio({
      ...common,
      correlation: 1,
      numerator: spread(3, 0.3),
      denominator: spread(2, 0.2),
    });
    expect(q05).toBeCloseTo(1.5, 12);
    expect(q95).toBeCloseTo(1.5, 12);
  });

  it('counts a denominator that is not positive as unbounded above', () => {
    const { q05, q95, shareUndefined } = drawnRatio({
      ...common,
      numerator: exactly(3),
      denominator: spread(1, 0.8),
    });
    const share = normalCdf(0, 1, 0.8);
    expect(Math.abs(shareUndefined - share)).toBeLessThan(4.5 * Math.sqrt((share * (1 - share)) / nDraws));
    expect(q95).toBeNull();
    expect(q05).toBeGreaterThan(0);
  });

  it('says how far it is, and stops when told', () => {
    const shares: number[] = [];
    drawnRatio({ ...common, numerator: exactly(1), denominator: exactly(1) }, (share) => shares.push(share));
    expect(shares).toEqual([65_536 / nDraws, 1]);
  });
});
