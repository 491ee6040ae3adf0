/** Concentrations of the three gases whose forcings overlap. */
export interface GasConcentrations {
  co2Ppm: number;
  ch4Ppb: number;
  n2oPpb: number;
}

/** What a change of those concentrations forces, gas by gas; positive downward. */
export interface GasForcing {
  co2Wm2: number;
  ch4Wm2: number;
  n2oWm2: number;
}

/** A published set of formulas. With `now` equal to `reference` every gas gives exactly 0. */
export type GasForcingFormula = (now: GasConcentrations, reference: GasConcentrations) => GasForcing;
