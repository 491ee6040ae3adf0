import normalQuantile from '@stdlib/stats-base-dists-normal-quantile';
import type { EnergyBudgetAnswer, EnergyBudgetRequest, Spread } from '../contract/energy-budget.ts';
import type { Caveat } from '../contract/primitives.ts';
import { NumericError } from '../errors.ts';
import { fieller } from '../statistics/fieller.ts';
import { finiteNumber } from '../statistics/finite-values.ts';
import { generatorId, randomStream } from '../statistics/random-stream.ts';
import { splitNormal, splitNormalAt, type SplitNormal } from '../statistics/split-normal.ts';
import { quantilesWithUnbounded } from './quantiles-with-unbounded.ts';

/** Draws per random stream. Part of the numbers: changing it changes the digits of every stored result. */
const drawsPerBlock = 65_536;

/** Quantile of the normal distribution at 95 %: the ends of 5–95 %. */
const z95 = normalQuantile(0.95, 0, 1);

const levels = [0.05, 0.17, 0.5, 0.83, 0.95] as const;

/**
 * Energy-budget sensitivity by Monte Carlo: the warming for doubled CO2 that follows from an observed warming, the
 * forcing behind it, and the heat that the planet still takes up.
 *
 * Model    EffCS = F2x ΔT / (ΔF − ΔN), TCR = F2x ΔT / ΔF, λ = (ΔF − ΔN)/ΔT; changes between two periods,
 *          F and N positive downward, λ > 0 restoring. With a pattern effect α′ > 0, by which the feedback of the record is
 *          stronger than that of the settled climate: ECS = F2x / (λ − α′)
 * Assumes  inputs normal, or split normal from a range, independent but for a correlation between ΔF and F2x; each block
 *          of 65 536 draws has its own random stream. Draws whose denominator is not positive count as unbounded above
 *          (+∞), never as negative. The Fieller set takes the mean of the two spreads of a split normal
 *
 * @param request     ΔT in K; ΔF, ΔN and F2x in W/m², α′ in W/m² per K; nDraws, seed
 * @param onProgress  called after each block with the share done; may throw to stop
 * @returns  quantiles (K per doubling), null where unbounded; central values from the central inputs; caveats
 * @throws   InputError `out-of-range`, `range-order`; NumericError `no-warming` when the central warming is zero
 *
 * Differs   AR6 prints ECS = F2x/(−α + α′); its own figures (3.5 for α′ = 0.5) need the sign used here
 * Source    Gregory et al. 2002, J. Climate 15, 3117; Otto et al. 2013, Nat. Geosci. 6, 415; AR6 WG1 §7.5.2.1;
 *           Fieller 1954, J. R. Stat. Soc. B 16, 175
 * Checked   test/reference/climate/energy-budget.test.ts (A: Otto 2013 and AR6 as published; C: closed forms)
 */
export function energyBudget(
  request: EnergyBudgetRequest,
  onProgress?: (shareDone: number) => void,
): EnergyBudgetAnswer {
  const { draws: nDraws, seed, correlation = 0 } = request;
  const spreads = checkedSpreads(request);
  const { warming: warmings, forcing: forcings, uptake: uptakes, doubling: doublings, pattern: patterns } = spreads;
  const independentShare = Math.sqrt(1 - correlation * correlation);
  const effcs = new Float64Array(nDraws);
  const tcr = new Float64Array(nDraws);
  const ecs = new Float64Array(patterns ? nDraws : 0);
  let nEffcs = 0;
  let nTcr = 0;
  let nEcs = 0;
  let nDone = 0;
  for (let block = 0; nDone < nDraws; block++) {
    const stream = randomStream(seed, block);
    const blockEnd = Math.min(nDone + drawsPerBlock, nDraws);
    for (; nDone < blockEnd; nDone++) {
      const warming = splitNormalAt(warmings, stream.normal());
      const forcingNormal = stream.normal();
      const forcing = splitNormalAt(forcings, forcingNormal);
      const uptake = splitNormalAt(uptakes, stream.normal());
      const doublingNormal = correlation * forcingNormal + independentShare * stream.normal();
      const response = splitNormalAt(doublings, doublingNormal) * warming;
      if (forcing > uptake) effcs[nEffcs++] = response / (forcing - uptake);
      if (forcing > 0) tcr[nTcr++] = response / forcing;
      if (!patterns) continue;
      const settled = forcing - uptake - splitNormalAt(patterns, stream.normal()) * warming;
      if (settled > 0) ecs[nEcs++] = response / settled;
    }
    onProgress?.(nDone / nDraws);
  }
  const shares = {
    shareUndefined: (nDraws - nEffcs) / nDraws,
    shareUndefinedTcr: (nDraws - nTcr) / nDraws,
    shareUndefinedEcs: patterns ? (nDraws - nEcs) / nDraws : null,
  };
  return {
    effcs: quantilesOf(effcs.subarray(0, nEffcs), nDraws),
    tcr: quantilesOf(tcr.subarray(0, nTcr), nDraws),
    ecs: patterns ? quantilesOf(ecs.subarray(0, nEcs), nDraws) : null,
    central: centralValues(spreads),
    ...shares,
    fieller90: fiellerSets(spreads, correlation),
    random: { generator: generatorId, seed, nDraws },
    caveats: caveatsOf(spreads, nDraws, shares),
  };
}

interface Spreads {
  warming: SplitNormal;
  forcing: SplitNormal;
  uptake: SplitNormal;
  doubling: SplitNormal;
  pattern: SplitNormal | null;
}

function checkedSpreads(request: EnergyBudgetRequest): Spreads {
  const { warmingK, forcingWm2, uptakeWm2, doublingWm2, patternWm2PerK, draws, correlation } = request;
  const spreads = {
    warming: spreadOf('warmingK', warmingK),
    forcing: spreadOf('forcingWm2', forcingWm2),
    uptake: spreadOf('uptakeWm2', uptakeWm2),
    doubling: spreadOf('doublingWm2', doublingWm2),
    pattern: patternWm2PerK ? spreadOf('patternWm2PerK', patternWm2PerK) : null,
  };
  finiteNumber('energyBudget', 'doublingWm2', spreads.doubling.centre, { above: 0 });
  finiteNumber('energyBudget', 'draws', draws, { isWhole: true, atLeast: 1 });
  finiteNumber('energyBudget', 'correlation', correlation ?? 0, { atLeast: -1, atMost: 1 });
  if (spreads.warming.centre === 0) {
    throw new NumericError({
      code: 'no-warming',
      where: 'energyBudget, warmingK',
      expected: 'a warming that is not zero, so that a feedback can be formed',
      received: '0',
      hint: 'Compare two periods between which the temperature changed.',
    });
  }
  return spreads;
}

function spreadOf(name: string, given: Spread): SplitNormal {
  if (!('sd' in given)) return splitNormal(given);
  const { mean, sd } = given;
  finiteNumber('energyBudget', `${name}.mean`, mean);
  finiteNumber('energyBudget', `${name}.sd`, sd, { atLeast: 0 });
  return { centre: mean, sdBelow: sd, sdAbove: sd };
}

function quantilesOf(finite: Float64Array, nAll: number): EnergyBudgetAnswer['effcs'] {
  const [q05, q17, q50, q83, q95] = quantilesWithUnbounded(finite, nAll, levels);
  return { q05, q17, q50, q83, q95 };
}

function centralValues({ warming, forcing, uptake, doubling, pattern }: Spreads): EnergyBudgetAnswer['central'] {
  const net = forcing.centre - uptake.centre;
  const response = doubling.centre * warming.centre;
  const settled = pattern ? net - pattern.centre * warming.centre : 0;
  return {
    effcs: net > 0 ? response / net : null,
    tcr: forcing.centre > 0 ? response / forcing.centre : null,
    ecs: settled > 0 ? response / settled : null,
    feedbackWm2PerK: net / warming.centre,
  };
}

function fiellerSets(
  { warming, forcing, uptake, doubling }: Spreads,
  correlation: number,
): EnergyBudgetAnswer['fieller90'] {
  const sd = ({ sdBelow, sdAbove }: SplitNormal) => (sdBelow + sdAbove) / 2;
  const numerator = {
    numerator: doubling.centre * warming.centre,
    // Of a product of independent quantities, exactly.
    numeratorVariance:
      (doubling.centre * sd(warming)) ** 2 + (warming.centre * sd(doubling)) ** 2 + (sd(warming) * sd(doubling)) ** 2,
    covariance: warming.centre * correlation * sd(doubling) * sd(forcing),
  };
  const set = (denominator: number, denominatorVariance: number) =>
    denominator === 0
      ? null
      : { ...fieller({ ...numerator, denominator, denominatorVariance, multiple: z95 }), levelPercent: 90 };
  return {
    effcs: set(forcing.centre - uptake.centre, sd(forcing) ** 2 + sd(uptake) ** 2),
    tcr: set(forcing.centre, sd(forcing) ** 2),
  };
}

function caveatsOf(
  { forcing, uptake, warming }: Spreads,
  nDraws: number,
  shares: Pick<EnergyBudgetAnswer, 'shareUndefined' | 'shareUndefinedTcr' | 'shareUndefinedEcs'>,
): Caveat[] {
  const { shareUndefined, shareUndefinedTcr, shareUndefinedEcs } = shares;
  const caveats: Caveat[] = [];
  if (forcing.centre <= uptake.centre) {
    caveats.push({
      code: 'no-positive-net-forcing',
      detail: `The forcing (${forcing.centre} W/m²) does not exceed the heat uptake (${uptake.centre} W/m²): the effective sensitivity has no finite central value.`,
    });
  }
  if (shareUndefined > 0) {
    const percent = (100 * shareUndefined).toPrecision(2);
    caveats.push({
      code: 'unbounded-draws',
      detail: `In ${percent} % of the draws forcing does not exceed heat uptake; they count as unbounded above${shareUndefined >= 0.05 ? ', so the upper end of the 5–95 % range is unbounded' : ''}.`,
    });
  }
  if (shareUndefinedTcr > 0) {
    caveats.push({
      code: 'unbounded-draws-tcr',
      detail: `In ${(100 * shareUndefinedTcr).toPrecision(2)} % of the draws the forcing is not positive; they count as unbounded above in the transient response.`,
    });
  }
  if (shareUndefinedEcs) {
    caveats.push({
      code: 'unbounded-draws-ecs',
      detail: `In ${(100 * shareUndefinedEcs).toPrecision(2)} % of the draws no restoring feedback is left once the pattern effect is counted; they count as unbounded above.`,
    });
  }
  if (warming.centre < 1.645 * warming.sdBelow) {
    caveats.push({
      code: 'warming-not-distinct',
      detail: 'The warming is not distinguishable from zero at its stated uncertainty; low quantiles may be negative.',
    });
  }
  if (nDraws < 10_000) {
    caveats.push({ code: 'few-draws', detail: `With ${nDraws} draws the outer quantiles are known only roughly.` });
  }
  return caveats;
}
