import type { ResponseForcing } from '../../contract/climate-response.ts';
import { annualEnsemble, readStates, runYears } from './annual-ensemble.ts';
import { flowIntegral } from './flow-integral.ts';
import { linearResponse } from './linear-response.ts';
import { memberAt, type MemberColumns } from './member-columns.ts';

/** Where the members of an ensemble are at one time. */
export interface EnsembleStates {
  /** [nMembers] K. */
  surfaceK: Float64Array;
  deepK: Float64Array;
  /** Takes all members to a time, not before that of the last call. @returns the forcing then, W/m² */
  moveTo(year: number): number;
}

/**
 * The members of an ensemble under a forcing, to be asked from one year to the next.
 *
 * @param onProgress  called with the share done of the way to the last year; may throw to stop
 *
 * Checked  test/reference/climate/two-layer-ensemble.test.ts (C: member by member as `twoLayer`)
 */
export function ensembleStates(
  columns: MemberColumns,
  forcing: ResponseForcing,
  lastYear: number,
  onProgress?: (shareDone: number) => void,
): EnsembleStates {
  return forcing.kind === 'annual'
    ? annualStates(columns, Float64Array.from(forcing.wm2), lastYear, onProgress)
    : smoothStates(columns, forcing, lastYear, onProgress);
}

function annualStates(
  columns: MemberColumns,
  wm2: Float64Array,
  lastYear: number,
  onProgress?: (shareDone: number) => void,
): EnsembleStates {
  const ensemble = annualEnsemble(columns);
  const { nMembers } = ensemble;
  const [surfaceK, deepK] = [new Float64Array(nMembers), new Float64Array(nMembers)];
  let [here, nMemberYears] = [0, 0];
  const moveTo = (year: number) => {
    runYears(ensemble, wm2.subarray(here, year), (nMore) => {
      nMemberYears += nMore;
      if (lastYear > 0) onProgress?.(nMemberYears / (nMembers * lastYear));
    });
    here = year;
    readStates(ensemble, surfaceK, deepK);
    return wm2[Math.max(0, year - 1)]!;
  };
  return { surfaceK, deepK, moveTo };
}

/** Step and ramp: from the start to each year at once. */
function smoothStates(
  columns: MemberColumns,
  forcing: Exclude<ResponseForcing, { kind: 'annual' }>,
  lastYear: number,
  onProgress?: (shareDone: number) => void,
): EnsembleStates {
  const nMembers = columns.feedback.length;
  const [surfaceK, deepK] = [new Float64Array(nMembers), new Float64Array(nMembers)];
  const [times, unit] = forcing.kind === 'step' ? [1, forcing.wm2] : [2, forcing.wm2PerYr];
  const moveTo = (year: number) => {
    for (let m = 0; m < nMembers; m++) {
      const flow = flowIntegral(linearResponse(memberAt(columns, m)), times, year);
      surfaceK[m] = (flow.surfaceFromSurface * unit) / columns.heatCapacity[m]!;
      deepK[m] = (flow.deepFromSurface * unit) / columns.heatCapacity[m]!;
    }
    if (lastYear > 0) onProgress?.(year / lastYear);
    return forcing.kind === 'step' ? unit : unit * year;
  };
  return { surfaceK, deepK, moveTo };
}
