import normalQuantile from '@stdlib/stats-base-dists-normal-quantile';
import { describe, expect, it } from 'vitest';
import { splitNormal, splitNormalAt } from '../../../src-main/statistics/split-normal.ts';
import { expectClose } from '../../helpers/close.ts';

const rounding = { rel: 1e-14, abs: 1e-14, why: 'rounding' };

describe('splitNormal', () => {
  it.each([
    { best: 2.2, low: 1.53, high: 2.91, levelPercent: 90 },
    { best: -1.1, low: -1.7, high: -0.4, levelPercent: 90 },
    { best: 3, low: 2.5, high: 4, levelPercent: 66 },
  ])('has the median and the central $levelPercent % that went in: $low to $high', (range) => {
    const spread = splitNormal(range);
    const at = (p: number) => splitNormalAt(spread, normalQuantile(p, 0, 1));
    const tail = (100 - range.levelPercent) / 200;
    expectClose(at(0.5), range.best, rounding);
    expectClose(at(tail), range.low, rounding);
    expectClose(at(1 - tail), range.high, rounding);
  });

  it('is a normal when the range is symmetric, and one value when it has no width', () => {
    const { centre, sdBelow, sdAbove } = splitNormal({ best: 0, low: -1.96, high: 1.96, levelPercent: 95 });
    expect(centre).toBe(0);
    expect(sdBelow).toBe(sdAbove);
    expectClose(sdAbove, 1.96 / 1.959963984540054, rounding);
    const exact = splitNormal({ best: 3.7, low: 3.7, high: 3.7, levelPercent: 90 });
    expect([-3, 0, 3].map((z) => splitNormalAt(exact, z))).toEqual([3.7, 3.7, 3.7]);
  });

  it.each([
    { range: { best: 1, low: 2, high: 3, levelPercent: 90 }, says: /a best value within its range/ },
    { range: { best: 4, low: 2, high: 3, levelPercent: 90 }, says: /a best value within its range/ },
    { range: { best: 1, low: 0, high: 2, levelPercent: 100 }, says: /levelPercent: .*below 100/ },
    { range: { best: 1, low: 0, high: 2, levelPercent: 0 }, says: /levelPercent: .*above 0/ },
    { range: { best: NaN, low: 0, high: 2, levelPercent: 90 }, says: /best: expected a finite number/ },
    { range: { best: 1, low: -Infinity, high: 2, levelPercent: 90 }, says: /low: expected a finite number/ },
  ])('refuses $range', ({ range, says }) => {
    expect(() => splitNormal(range)).toThrow(says);
  });
});
