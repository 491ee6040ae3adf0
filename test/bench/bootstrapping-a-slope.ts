import { movingBlockBootstrap } from '../../src-main/statistics/moving-block-bootstrap.ts';
import type { BenchCase } from './bench-case.ts';
import { sameButForChance, standardErrors } from './comparison.ts';
import { pythonRecord } from './python-peer.ts';

/** 10,000 new records of 61 years from blocks of five. */
export function caseOfBootstrapping(): BenchCase {
  const { co2Ppm, temperatureK } = pythonRecord('annual');
  const x = co2Ppm.map((ppm) => Math.log(ppm / co2Ppm[0]!));
  const y = temperatureK.map((value) => value - temperatureK[0]!);
  const quantiles = (seed: number) => {
    const bootstrap = movingBlockBootstrap({ x, y, intercept: true, blockLength: 5, draws: 10_000, seed });
    const { q025, q50, q975 } = bootstrap.quantiles;
    return [q025, q50, q975];
  };
  return {
    name: 'block bootstrap, 10,000 draws',
    own: () => quantiles(4),
    peers: [
      {
        name: 'numpy, all draws at once',
        work: { task: 'bootstrap' },
        atMost: 1,
        compare: sameButForChance(standardErrors(20, quantiles)),
      },
    ],
  };
}
