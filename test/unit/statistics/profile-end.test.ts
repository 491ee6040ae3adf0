import { describe, expect, it } from 'vitest';
import { profileEnd } from '../../../src-main/statistics/profile-end.ts';
import { expectClose } from '../../helpers/close.ts';

const fall = 1.959963984540054 ** 2 / 2;
const near = { rel: 1e-7, abs: 0, why: 'the crossing is found to 1e-9 in √(2·fall)' };

describe('profileEnd', () => {
  it('on a parabola is the estimate ± 1.96 standard deviations', () => {
    const profile = (value: number) => 40 - ((value - 3) / 0.4) ** 2 / 2;
    const ask = (stations: number[]) => profileEnd({ profile, estimate: 3, top: 40, fall, stations });
    expectClose(ask([2.9, 2.5, 2, 1]), 3 - 1.959963984540054 * 0.4, near);
    expectClose(ask([10]), 3 + 1.959963984540054 * 0.4, near);
  });

  it('on a Poisson likelihood solves k ln(μ/k) − (μ − k) = −fall on both sides', () => {
    const profile = (mu: number) => 5 * Math.log(mu) - mu;
    const ask = (stations: number[]) => profileEnd({ profile, estimate: 5, top: profile(5), fall, stations })!;
    for (const end of [ask([4, 2, 0.01]), ask([6, 20])]) {
      expectClose(5 * Math.log(end / 5) - (end - 5), -fall, { rel: 1e-7, abs: 0, why: 'the defining equation' });
    }
    expect(ask([4, 2, 0.01])).toBeLessThan(5);
    expect(ask([6, 20])).toBeGreaterThan(5);
  });

  it('is null where the likelihood has not fallen far enough at the last station', () => {
    const profile = (value: number) => -Math.min(1.9, (value - 1) ** 2);
    expect(profileEnd({ profile, estimate: 1, top: 0, fall, stations: [2, 5, 100] })).toBeNull();
    expect(profileEnd({ profile, estimate: 1, top: 0, fall: 1.89, stations: [2, 5, 100] })).not.toBeNull();
  });
});
