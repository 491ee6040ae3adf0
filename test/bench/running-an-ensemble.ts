import { twoLayerEnsemble } from '../../src-main/climate/two-layer/two-layer-ensemble.ts';
import { randomStream } from '../../src-main/statistics/random-stream.ts';
import type { BenchCase } from './bench-case.ts';
import { sameButForChance, standardErrors } from './comparison.ts';

const nMembers = 100_000;
const nYears = 274;
/** Standard errors come from smaller ensembles, which are larger by the root of this. */
const share = 16;

const wm2 = Array.from({ length: nYears }, (_, year) => 3.7 * (year / nYears) ** 2 - (year % 37 === 20 ? 2 : 0));

function members(n: number, seed: number) {
  const stream = randomStream(seed, 0);
  const between = (low: number, high: number) => Array.from({ length: n }, () => low + (high - low) * stream.uniform());
  return {
    heatCapacity: between(5, 10),
    deepHeatCapacity: between(60, 150),
    exchange: between(0.4, 1),
    feedback: between(0.6, 1.8),
    efficacy: between(1, 1.5),
  };
}

/** A hundred thousand two-layer members through 274 years of forcing, and three quantiles of the last year's warming. */
export function caseOfEnsemble(): BenchCase {
  const quantiles = (parameters: ReturnType<typeof members>) =>
    twoLayerEnsemble({
      ...parameters,
      forcing: { kind: 'annual', wm2 },
      years: [nYears],
      probabilities: [0.05, 0.5, 0.95],
    }).surfaceK[0] ?? [];
  const all = members(nMembers, 2);
  const shortErrors = standardErrors(20, (seed) => quantiles(members(nMembers / share, seed)));
  return {
    name: 'two-layer ensemble, 100,000 members, 274 years; 16 columns of 8 bytes for a member, whatever the years',
    own: () => quantiles(all),
    peers: [
      {
        name: 'numpy, all members at once',
        work: { task: 'ensemble' },
        atMost: 1,
        compare: sameButForChance(shortErrors.map((error) => error / Math.sqrt(share))),
      },
    ],
  };
}
