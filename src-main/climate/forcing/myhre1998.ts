import type { GasConcentrations, GasForcing } from './gas-forcing.ts';
import { overlappedRoots } from './overlapped-roots.ts';

/**
 * Forcing by the formulas of Myhre et al. 1998, those of the third and fourth IPCC assessments: the source of "5.35 ln" and
 * of 3.7 W/m² for a doubling.
 *
 * Model    CO2: 5.35 ln(C/C0); CH4: 0.036 (√M − √M0) less overlap; N2O: 0.12 (√N − √N0) less overlap
 *
 * @returns  W/m² by gas, stratospherically adjusted; 0 where a gas is at its reference
 *
 * Differs   the logarithm is natural: with log10 the CO2 forcing comes out 2.30 times too small
 * Source    Myhre et al. 1998, Geophys. Res. Lett. 25, 2715–2718, Table 3; IPCC TAR, Table 6.2; coefficients second-hand
 * Checked   test/reference/climate/forcing.test.ts (A: the forcings of TAR, from memory; B: a table computed
 *           elsewhere; C: 5.35 ln 2 and 5.35 ln 4)
 */
export function myhre1998(now: GasConcentrations, reference: GasConcentrations): GasForcing {
  return overlappedRoots(now, reference, { co2: 5.35, ch4: 0.036, n2o: 0.12 });
}
