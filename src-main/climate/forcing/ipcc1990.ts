import type { GasConcentrations, GasForcing } from './gas-forcing.ts';
import { overlappedRoots } from './overlapped-roots.ts';

/**
 * Forcing by the formulas of the first IPCC assessment: superseded, but still quoted, and the source of "6.3 ln".
 *
 * Model    CO2: 6.3 ln(C/C0); CH4: 0.036 (√M − √M0) less overlap; N2O: 0.14 (√N − √N0) less overlap
 *
 * @returns  W/m² by gas; 0 where a gas is at its reference
 *
 * Differs   its CO2 forcing is 18 % above that of Myhre et al. 1998 for every ratio C/C0
 * Source    IPCC 1990, WG1, Table 2.2; 6.3 and 0.14 from memory, the ratio to 5.35 agrees with Myhre's abstract
 * Checked   test/reference/climate/forcing.test.ts (B: a table computed elsewhere; C: 6.3 ln 2)
 */
export function ipcc1990(now: GasConcentrations, reference: GasConcentrations): GasForcing {
  return overlappedRoots(now, reference, { co2: 6.3, ch4: 0.036, n2o: 0.14 });
}
