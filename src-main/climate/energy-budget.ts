import type { EnergyBudgetRequest } from '../contract/compute.ts';
import type { Caveat } from '../contract/primitives.ts';
import type { EnergyBudgetAnswer } from '../contract/result.ts';
import { NumericError } from '../errors.ts';
import { finiteNumber } from '../statistics/finite-values.ts';
import { generatorId, randomStream } from '../statistics/random-stream.ts';
import { quantilesWithUnbounded } from './quantiles-with-unbounded.ts';

/** Draws per random stream. Part of the numbers: changing it changes the digits of every stored result. */
const drawsPerBlock = 65_536;

const levels = [0.05, 0.17, 0.5, 0.83, 0.95] as const;

/**
 * Energy-budget sensitivity by Monte Carlo: the warming for doubled CO2 that follows from an observed warming, the
 * forcing behind it, and the heat that the planet still takes up.
 *
 * Model    EffCS = F2x ΔT / (ΔF − ΔN), TCR = F2x ΔT / ΔF, λ = (ΔF − ΔN)/ΔT; changes between two periods,
 *          F and N positive downward, λ > 0 restoring
 * Assumes  normal inputs, independent but for a correlation between ΔF and F2x; each block of 65 536 draws has its own
 *          random stream. Draws whose denominator is not positive count as unbounded above (+∞), never as negative
 *
 * @param request     ΔT in K; ΔF, ΔN and F2x in W/m², mean and standard deviation each; nDraws, seed
 * @param onProgress  called after each block with the share done; may throw to stop
 * @returns  quantiles (K per doubling), null where unbounded; central values from the means; caveats
 * @throws   InputError `out-of-range`; NumericError `no-warming` when the mean warming is zero
 *
 * Differs   a published range may rest on skewed inputs: a 5–95 % range that is not symmetric is not a normal one
 * Source    Gregory et al. 2002, J. Climate 15, 3117; Otto et al. 2013, Nat. Geosci. 6, 415; AR6 WG1 §7.5.2.1
 * Checked   test/reference/climate/energy-budget.test.ts (A: Otto 2013 and AR6 as published; C: closed forms)
 */
export function energyBudget(
  request: EnergyBudgetRequest,
  onProgress?: (shareDone: number) => void,
): EnergyBudgetAnswer {
  const { warmingK, forcingWm2, uptakeWm2, doublingWm2, draws: nDraws, seed } = request;
  const correlation = request.correlation ?? 0;
  checkInputs(request);
  const independentShare = Math.sqrt(1 - correlation * correlation);
  const effcs = new Float64Array(nDraws);
  const tcr = new Float64Array(nDraws);
  let nEffcs = 0;
  let nTcr = 0;
  let nDone = 0;
  for (let block = 0; nDone < nDraws; block++) {
    const stream = randomStream(seed, block);
    const blockEnd = Math.min(nDone + drawsPerBlock, nDraws);
    for (; nDone < blockEnd; nDone++) {
      const warming = warmingK.mean + warmingK.sd * stream.normal();
      const forcingNormal = stream.normal();
      const forcing = forcingWm2.mean + forcingWm2.sd * forcingNormal;
      const uptake = uptakeWm2.mean + uptakeWm2.sd * stream.normal();
      const doublingNormal = correlation * forcingNormal + independentShare * stream.normal();
      const response = (doublingWm2.mean + doublingWm2.sd * doublingNormal) * warming;
      if (forcing > uptake) effcs[nEffcs++] = response / (forcing - uptake);
      if (forcing > 0) tcr[nTcr++] = response / forcing;
    }
    onProgress?.(nDone / nDraws);
  }
  const shareUndefined = (nDraws - nEffcs) / nDraws;
  const shareUndefinedTcr = (nDraws - nTcr) / nDraws;
  const [e05, e17, e50, e83, e95] = quantilesWithUnbounded(effcs.subarray(0, nEffcs), nDraws, levels);
  const [t05, t17, t50, t83, t95] = quantilesWithUnbounded(tcr.subarray(0, nTcr), nDraws, levels);
  const netForcing = forcingWm2.mean - uptakeWm2.mean;
  const responseWm2K = doublingWm2.mean * warmingK.mean;
  return {
    effcs: { q05: e05, q17: e17, q50: e50, q83: e83, q95: e95 },
    tcr: { q05: t05, q17: t17, q50: t50, q83: t83, q95: t95 },
    central: {
      effcs: netForcing > 0 ? responseWm2K / netForcing : null,
      tcr: forcingWm2.mean > 0 ? responseWm2K / forcingWm2.mean : null,
      feedbackWm2PerK: netForcing / warmingK.mean,
    },
    shareUndefined,
    shareUndefinedTcr,
    random: { generator: generatorId, seed, nDraws },
    caveats: caveatsOf(request, shareUndefined, shareUndefinedTcr),
  };
}

function checkInputs({ warmingK, forcingWm2, uptakeWm2, doublingWm2, draws, correlation }: EnergyBudgetRequest): void {
  const inputs = { warmingK, forcingWm2, uptakeWm2, doublingWm2 };
  for (const [name, { mean, sd }] of Object.entries(inputs)) {
    finiteNumber('energyBudget', `${name}.mean`, mean);
    finiteNumber('energyBudget', `${name}.sd`, sd, { atLeast: 0 });
  }
  finiteNumber('energyBudget', 'doublingWm2.mean', doublingWm2.mean, { above: 0 });
  finiteNumber('energyBudget', 'draws', draws, { isWhole: true, atLeast: 1 });
  finiteNumber('energyBudget', 'correlation', correlation ?? 0, { atLeast: -1, atMost: 1 });
  if (warmingK.mean === 0) {
    throw new NumericError({
      code: 'no-warming',
      where: 'energyBudget, warmingK.mean',
      expected: 'a warming that is not zero, so that a feedback can be formed',
      received: '0',
      hint: 'Compare two periods between which the temperature changed.',
    });
  }
}

function caveatsOf(request: EnergyBudgetRequest, shareUndefined: number, shareUndefinedTcr: number): Caveat[] {
  const caveats: Caveat[] = [];
  const { forcingWm2, uptakeWm2, draws, warmingK } = request;
  if (forcingWm2.mean <= uptakeWm2.mean) {
    caveats.push({
      code: 'no-positive-net-forcing',
      detail: `The forcing (${forcingWm2.mean} W/m²) does not exceed the heat uptake (${uptakeWm2.mean} W/m²): the effective sensitivity has no finite central value.`,
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
  if (warmingK.mean < 1.645 * warmingK.sd) {
    caveats.push({
      code: 'warming-not-distinct',
      detail: 'The warming is not distinguishable from zero at its stated uncertainty; low quantiles may be negative.',
    });
  }
  if (draws < 10_000) {
    caveats.push({ code: 'few-draws', detail: `With ${draws} draws the outer quantiles are known only roughly.` });
  }
  return caveats;
}
