import { flowIntegral } from './flow-integral.ts';
import { linearResponse } from './linear-response.ts';
import { phiDifference } from './phi-functions.ts';
import { memberAt, type MemberColumns } from './member-columns.ts';

/** Members between two reports of progress: a few milliseconds. */
const BLOCK_MEMBERS = 4096;

/**
 * An ensemble under annual forcing, and where its members have got to: eight numbers for each member, whatever the number
 * of years. [nMembers] each.
 */
export interface AnnualEnsemble {
  nMembers: number;
  /** What a year leaves of the fast and of the slow part: e^(−1/τ_f), e^(−1/τ_s). */
  fastShare: Float64Array;
  slowShare: Float64Array;
  /** Forcing as the fast part remembers it, and the fast part as the slow one does, W/m². */
  fastMemory: Float64Array;
  slowMemory: Float64Array;
  /** K per W/m² of each memory, in both layers. */
  surfaceFromFast: Float64Array;
  surfaceFromSlow: Float64Array;
  deepFromFast: Float64Array;
  deepFromSlow: Float64Array;
}

/**
 * An ensemble of two-layer models in balance, ready to be run.
 *
 * Model    With E = exp(A), g a year's response to 1 W/m², and e₁ ≤ e₂ the eigenvalues of E, the state after each year is
 *          g m₁ + (E − e₁ I)g m₂ with m₁ ← e₁ m₁ + F, m₂ ← e₂ m₂ + (m₁ before): by Cayley–Hamilton, also where e₁ = e₂. Two
 *          products a year instead of six, and none of the terms is negative
 *
 * Source   Newton form of a function of a matrix: Higham 2008, Functions of Matrices, §1.2
 * Checked  test/reference/climate/two-layer-ensemble.test.ts (C: member by member as `twoLayer`)
 */
export function annualEnsemble(columns: MemberColumns): AnnualEnsemble {
  const nMembers = columns.feedback.length;
  const column = () => new Float64Array(nMembers);
  const ensemble: AnnualEnsemble = {
    nMembers,
    fastShare: column(),
    slowShare: column(),
    fastMemory: column(),
    slowMemory: column(),
    surfaceFromFast: column(),
    surfaceFromSlow: column(),
    deepFromFast: column(),
    deepFromSlow: column(),
  };
  for (let m = 0; m < nMembers; m++) {
    const response = linearResponse(memberAt(columns, m));
    const { fastRate, slowRate, surfaceExcess, deepExcess, parameters } = response;
    const { heatCapacity, deepHeatCapacity, exchange, efficacy } = parameters;
    const year = flowIntegral(response, 1, 1);
    const surface = year.surfaceFromSurface / heatCapacity;
    const deep = year.deepFromSurface / heatCapacity;
    // E − e₁ I is this number times the model's matrix less r₁ I: formed so, nothing cancels.
    const divided = phiDifference(0, fastRate, slowRate);
    ensemble.fastShare[m] = Math.exp(fastRate);
    ensemble.slowShare[m] = Math.exp(slowRate);
    ensemble.surfaceFromFast[m] = surface;
    ensemble.deepFromFast[m] = deep;
    ensemble.surfaceFromSlow[m] = divided * (surfaceExcess * surface + ((efficacy * exchange) / heatCapacity) * deep);
    ensemble.deepFromSlow[m] = divided * ((exchange / deepHeatCapacity) * surface + deepExcess * deep);
  }
  return ensemble;
}

/**
 * Runs an ensemble on through some years, each with its forcing held: exact, as `flowIntegral`. No member sees another, so
 * the digits do not depend on how the members are shared out.
 *
 * @param ensemble    **moved on in place**
 * @param wm2         [nYears] forcing of each year
 * @param onProgress  called after each block of members with the number of member-years done; may throw to stop
 *
 * Checked  test/reference/climate/two-layer-ensemble.test.ts (C: member by member as `twoLayer`)
 */
export function runYears(
  ensemble: AnnualEnsemble,
  wm2: Float64Array,
  onProgress?: (nMemberYears: number) => void,
): void {
  for (let start = 0; start < ensemble.nMembers; start += BLOCK_MEMBERS) {
    const end = Math.min(start + BLOCK_MEMBERS, ensemble.nMembers);
    // In pairs: each product waits for the one of the year before, and two members fill the wait. The last of an odd
    // number is run twice, from the same start.
    for (let m = start; m < end; m += 2) runPair(ensemble, m, Math.min(m + 1, end - 1), wm2);
    onProgress?.((end - start) * wm2.length);
  }
}

function runPair(
  { fastShare, slowShare, fastMemory, slowMemory }: AnnualEnsemble,
  a: number,
  b: number,
  wm2: Float64Array,
) {
  const [fastShareA, slowShareA, fastShareB, slowShareB] = [fastShare[a]!, slowShare[a]!, fastShare[b]!, slowShare[b]!];
  let [fastA, slowA, fastB, slowB] = [fastMemory[a]!, slowMemory[a]!, fastMemory[b]!, slowMemory[b]!];
  for (let year = 0; year < wm2.length; year++) {
    const forcing = wm2[year]!;
    slowA = slowShareA * slowA + fastA;
    slowB = slowShareB * slowB + fastB;
    fastA = fastShareA * fastA + forcing;
    fastB = fastShareB * fastB + forcing;
  }
  [fastMemory[a], slowMemory[a], fastMemory[b], slowMemory[b]] = [fastA, slowA, fastB, slowB];
}

/** Warming of the members at the end of the last year that was run. @param surfaceK, deepK  [nMembers] **filled** */
export function readStates(ensemble: AnnualEnsemble, surfaceK: Float64Array, deepK: Float64Array): void {
  const { fastMemory, slowMemory, surfaceFromFast, surfaceFromSlow, deepFromFast, deepFromSlow } = ensemble;
  for (let m = 0; m < ensemble.nMembers; m++) {
    surfaceK[m] = surfaceFromFast[m]! * fastMemory[m]! + surfaceFromSlow[m]! * slowMemory[m]!;
    deepK[m] = deepFromFast[m]! * fastMemory[m]! + deepFromSlow[m]! * slowMemory[m]!;
  }
}
