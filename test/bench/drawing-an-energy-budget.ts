import { energyBudget } from '../../src-main/climate/energy-budget.ts';
import type { BenchCase } from './bench-case.ts';
import { sameButForChance, standardErrors } from './comparison.ts';

const normal = (mean: number, sd: number) => ({ mean, sd });
const inputs = {
  warmingK: normal(0.75, 0.122),
  forcingWm2: normal(1.95, 0.353),
  uptakeWm2: normal(0.65, 0.164),
  doublingWm2: normal(3.44, 0.209),
};
const nDraws = 1_000_000;
/** Standard errors come from shorter runs, which are larger by the root of this. */
const share = 16;

/** A million draws of four normal inputs, and five quantiles each of the effective sensitivity and the transient response. */
export function caseOfEnergyBudget(): BenchCase {
  const quantiles = (draws: number, seed: number) => {
    const { effcs, tcr } = energyBudget({ ...inputs, draws, seed });
    return [effcs, tcr].flatMap(({ q05, q17, q50, q83, q95 }) => [q05, q17, q50, q83, q95].map((q) => q ?? Infinity));
  };
  const shortErrors = standardErrors(20, (seed) => quantiles(nDraws / share, seed));
  return {
    name: 'energy budget, 1,000,000 draws',
    own: () => quantiles(nDraws, 1),
    peers: [
      {
        name: 'numpy, all draws at once',
        work: { task: 'energy-budget' },
        atMost: 1,
        compare: sameButForChance(shortErrors.map((error) => error / Math.sqrt(share))),
      },
    ],
  };
}
