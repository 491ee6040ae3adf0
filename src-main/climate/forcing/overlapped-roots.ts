import { bandOverlap } from './band-overlap.ts';
import type { GasConcentrations, GasForcing } from './gas-forcing.ts';

export interface OverlappedRootsCoefficients {
  /** W/m² per unit of ln(C/C0). */
  co2: number;
  /** W/m² per √ppb. */
  ch4: number;
  n2o: number;
}

/**
 * Forcing in the form that IPCC 1990 and Myhre et al. 1998 share: a logarithm for CO2, square roots for CH4 and N2O, each
 * of the two less what it shares with the other's reference.
 *
 * Model    CO2: a ln(C/C0). CH4: b (√M − √M0) − [f(M, N0) − f(M0, N0)]. N2O: c (√N − √N0) − [f(M0, N) − f(M0, N0)]
 *
 * @returns  W/m², stratospherically adjusted
 *
 * Source    IPCC 1990, Table 2.2; Myhre et al. 1998, Table 3
 * Checked   through `ipcc1990` and `myhre1998`; C in test/unit/climate/forcing/formulas.test.ts
 */
export function overlappedRoots(
  { co2Ppm: c, ch4Ppb: m, n2oPpb: n }: GasConcentrations,
  { co2Ppm: c0, ch4Ppb: m0, n2oPpb: n0 }: GasConcentrations,
  coefficients: OverlappedRootsCoefficients,
): GasForcing {
  const shared = bandOverlap(m0, n0);
  return {
    co2Wm2: coefficients.co2 * Math.log(c / c0),
    ch4Wm2: coefficients.ch4 * (Math.sqrt(m) - Math.sqrt(m0)) - (bandOverlap(m, n0) - shared),
    n2oWm2: coefficients.n2o * (Math.sqrt(n) - Math.sqrt(n0)) - (bandOverlap(m0, n) - shared),
  };
}
