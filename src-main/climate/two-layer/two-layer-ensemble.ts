import type { ResponseForcing, TwoLayerEnsembleInput, TwoLayerEnsembleValue } from '../../contract/climate-response.ts';
import { InputError } from '../../errors.ts';
import { finiteNumber, finiteValues } from '../../statistics/finite-values.ts';
import { quantilesWithUnbounded } from '../quantiles-with-unbounded.ts';
import { checkForcing } from './check-forcing.ts';
import { parameterCaveats } from './check-parameters.ts';
import { ensembleStates } from './ensemble-states.ts';
import { imbalanceWm2 } from './layer-state.ts';
import { linearResponse } from './linear-response.ts';
import { memberAt, memberColumn, memberColumns, type MemberColumns } from './member-columns.ts';
import { sensitivities } from './sensitivities.ts';

const USUAL_PROBABILITIES = [0.05, 0.17, 0.5, 0.83, 0.95];
const LATEST_YEAR = 1e6;
const CALLER = 'twoLayerEnsemble';

/**
 * Two-layer ensemble: the spread of warming and imbalance over many parameter sets under one forcing.
 *
 * Model    that of `twoLayer` for each member. The quantiles of a year are exact order statistics of all members in that
 *          year (type 7), each year for itself: no member need be at the same place from year to year
 * Assumes  members of equal weight
 *
 * Memory   all members are taken from one asked year to the next and ranked there, so it grows with the members (16 columns
 *          of 8 bytes, 128 MB for a million), not with the years. Ranking a year costs about as much as running the members
 *          through fifty: ask for the years that are wanted
 *
 * @param heatCapacity … efficacy  as `twoLayer`: one value for all, or [nMembers]
 * @param years          not falling; whole where the forcing is annual
 * @param probabilities  rising
 * @param doublingWm2    one for all, or [nMembers]
 * @param onProgress     called after each block of members with the share done; may throw to stop
 * @returns  the same digits however the work is cut into blocks, as members do not see each other and ranks do not depend
 *           on order. caveats as `twoLayer`
 * @throws   InputError wrong-length, unordered-years, unordered-probabilities, out-of-range, no-restoring-feedback
 *
 * Source   Geoffroy et al. 2013a, b, J. Climate 26, 1841–1857 and 1859–1876; Hyndman & Fan 1996, definition 7
 * Checked  test/reference/climate/two-layer-ensemble.test.ts (B: R's quantile; C: member by member as `twoLayer`)
 */
export function twoLayerEnsemble(
  input: TwoLayerEnsembleInput,
  onProgress?: (shareDone: number) => void,
): TwoLayerEnsembleValue {
  const { heatCapacity, deepHeatCapacity, exchange, feedback, efficacy = 1, forcing, doublingWm2 } = input;
  const columns = memberColumns(CALLER, { heatCapacity, deepHeatCapacity, exchange, feedback, efficacy });
  const nMembers = columns.feedback.length;
  checkForcing(CALLER, forcing);
  const years = checkedYears(input.years, forcing);
  const probabilities = inOrder('probabilities', input.probabilities ?? USUAL_PROBABILITIES, { atLeast: 0, atMost: 1 });
  const doubling = doublingWm2 === undefined ? null : checkedDoubling(doublingWm2, nMembers);

  const ranked = new Float64Array(nMembers);
  // Nothing is unbounded here, so there is a number for each probability.
  const quantiles = () => quantilesWithUnbounded(ranked, nMembers, probabilities).map((value) => value!);
  const states = ensembleStates(columns, forcing, years.at(-1)!, onProgress);
  const byYear = years.map((year) => {
    const forcingWm2 = states.moveTo(year);
    ranked.set(states.surfaceK);
    const surfaceK = quantiles();
    for (let m = 0; m < nMembers; m++) {
      const state = { surfaceK: states.surfaceK[m]!, deepK: states.deepK[m]! };
      ranked[m] = imbalanceWm2(memberAt(columns, m), forcingWm2, state);
    }
    return { surfaceK, imbalanceWm2: quantiles() };
  });
  const sensitivity = doubling ? sensitivityQuantiles(columns, doubling, ranked, quantiles) : null;
  return {
    nMembers,
    years,
    probabilities,
    surfaceK: byYear.map(({ surfaceK }) => surfaceK),
    imbalanceWm2: byYear.map(({ imbalanceWm2: imbalance }) => imbalance),
    ecsK: sensitivity?.ecsK ?? null,
    tcrK: sensitivity?.tcrK ?? null,
    caveats: parameterCaveats(columns),
  };
}

function sensitivityQuantiles(
  columns: MemberColumns,
  doublingWm2: Float64Array,
  ranked: Float64Array,
  quantiles: () => number[],
) {
  const tcr = new Float64Array(ranked.length);
  for (let m = 0; m < ranked.length; m++) {
    const { ecsK, tcrK } = sensitivities(linearResponse(memberAt(columns, m)), doublingWm2[m]!);
    ranked[m] = ecsK;
    tcr[m] = tcrK;
  }
  const ecsK = quantiles();
  ranked.set(tcr);
  return { ecsK, tcrK: quantiles() };
}

function checkedYears(given: readonly number[], forcing: ResponseForcing): number[] {
  const isAnnual = forcing.kind === 'annual';
  return inOrder('years', given, {
    atLeast: 0,
    atMost: isAnnual ? forcing.wm2.length : LATEST_YEAR,
    isWhole: isAnnual,
  });
}

function inOrder(name: string, given: readonly number[], bounds: Parameters<typeof finiteNumber>[3]): number[] {
  const values = [...finiteValues(CALLER, name, given)];
  values.forEach((value, i) => {
    finiteNumber(CALLER, `${name}[${i}]`, value, bounds);
    if (i === 0 || value >= values[i - 1]!) return;
    throw new InputError({
      code: `unordered-${name}`,
      where: `${CALLER}, ${name}[${i}]`,
      expected: `a number from ${values[i - 1]!} on`,
      received: String(value),
      hint: 'Give them in rising order.',
    });
  });
  return values;
}

function checkedDoubling(doublingWm2: number | readonly number[], nMembers: number): Float64Array {
  const column = memberColumn(CALLER, 'doublingWm2', doublingWm2, nMembers);
  return finiteValues(CALLER, 'doublingWm2', column, { sign: 'positive' });
}
