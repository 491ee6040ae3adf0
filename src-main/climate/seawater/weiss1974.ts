import { zeroCelsiusK, type MolPerKgAtm, type MolPerLAtm } from '../../quantities/solubility-units.ts';
import { waterSalinity, waterTemperatureC } from './water-values.ts';

interface Coefficients {
  a: readonly [number, number, number];
  b: readonly [number, number, number];
}

const perKg: Coefficients = { a: [-60.2409, 93.4517, 23.3585], b: [0.023517, -0.023656, 0.0047036] };
const perLitre: Coefficients = { a: [-58.0931, 90.5069, 22.294], b: [0.027766, -0.025888, 0.0050578] };

export interface WeissSolubility {
  solubilityMolPerKgAtm: MolPerKgAtm;
  solubilityMolPerLAtm: MolPerLAtm;
  /** d ln K0/dT of the solubility per kilogram, 1/K; negative. */
  dLnSolubilityPerK: number;
}

/**
 * Solubility of CO2 in seawater: how much of it, as CO2, a kilogram or a litre holds under one atmosphere of it.
 *
 * Model    ln K0 = A1 + A2 (100/T) + A3 ln(T/100) + S [B1 + B2 (T/100) + B3 (T/100)²]; T in K. Two sets of coefficients,
 *          per kilogram and per litre; the slope is the derivative of the first, written out
 * Assumes  −1 to 40 °C and S 0 to 40, the span of Weiss's tables (from memory; a public package states 45 for both)
 *
 * @param temperatureC  °C
 * @param salinity      g/kg
 * @returns  solubilities, mol per kg or L and atm of fugacity; slope, 1/K
 * @throws   InputError `suspected-unit`, `out-of-range`
 *
 * Differs   several public codes label the set per litre as per kilogram: 2.35 % at 25 °C and S 35
 * Source    Weiss 1974, Mar. Chem. 2, 203–215, eq. 12 and Table I; coefficients second-hand
 * Checked   test/reference/climate/seawater.test.ts (A: ln K0 = −3.5617 and 0.03515 as published; B: R's D and numbers
 *           computed elsewhere; C: the ratio of the two is the density of seawater)
 */
export function weiss1974(temperatureC: number, salinity: number): WeissSolubility {
  const temperatureK = waterTemperatureC('weiss1974', 'temperatureC', temperatureC) + zeroCelsiusK;
  waterSalinity('weiss1974', salinity);
  const [, a2, a3] = perKg.a;
  const [, b2, b3] = perKg.b;
  const t = temperatureK / 100;
  return {
    solubilityMolPerKgAtm: solubility(perKg, t, salinity) as MolPerKgAtm,
    solubilityMolPerLAtm: solubility(perLitre, t, salinity) as MolPerLAtm,
    dLnSolubilityPerK: (-a2 / t ** 2 + a3 / t + salinity * (b2 + 2 * b3 * t)) / 100,
  };
}

function solubility({ a: [a1, a2, a3], b: [b1, b2, b3] }: Coefficients, t: number, salinity: number): number {
  return Math.exp(a1 + a2 / t + a3 * Math.log(t) + salinity * (b1 + b2 * t + b3 * t * t));
}
