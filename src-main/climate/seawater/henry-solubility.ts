import {
  molPerLAtm,
  waterAirRatio,
  zeroCelsiusK,
  type MolPerLAtm,
  type MolPerM3Pa,
} from '../../quantities/solubility-units.ts';
import { finiteNumber } from '../../statistics/finite-values.ts';
import { waterTemperatureC } from './water-values.ts';

export const referenceK = 298.15;

export interface HenryConstant {
  /** At 298.15 K. */
  solubilityMolPerM3Pa: number;
  /** d ln H/d(1/T), K: minus the enthalpy of solution over the gas constant. */
  vantHoffK: number;
}

/** CO2 in pure water, as the compilation recommends it (second-hand). */
export const henryCo2: HenryConstant = { solubilityMolPerM3Pa: 3.3e-4, vantHoffK: 2400 };

export interface HenrySolubility {
  solubilityMolPerM3Pa: MolPerM3Pa;
  solubilityMolPerLAtm: MolPerLAtm;
  /** Concentration in water over concentration in air. */
  solubilityWaterAir: number;
  /** d ln H/dT, 1/K; negative. */
  dLnSolubilityPerK: number;
}

/**
 * Henry's law with van 't Hoff's temperature dependence: how much of a gas pure water holds under a given pressure of it.
 *
 * Model    H(T) = H° exp[B (1/T − 1/T°)], T° = 298.15 K, B = −ΔH/R constant; d ln H/dT = −B/T²
 * Assumes  pure water; a B that does not change with temperature. For CO2 it does: in Weiss's fit 2381 K at 25 °C and
 *          2614 K at 15 °C
 *
 * @param temperatureC  °C
 * @param constant      H° in mol m⁻³ Pa⁻¹ and B in K; those of CO2 unless given
 * @returns  solubility in three units; slope, 1/K
 * @throws   InputError `suspected-unit`, `out-of-range`
 *
 * Source    Sander 2015, Atmos. Chem. Phys. 15, 4399–4981, §2 and its table for CO2; values second-hand
 * Checked   test/reference/climate/seawater.test.ts (A: the compilation's other units of the same value; C: halving and
 *           slope by hand, with other constants too)
 */
export function henrySolubility(temperatureC: number, constant: HenryConstant = henryCo2): HenrySolubility {
  const temperatureK = waterTemperatureC('henrySolubility', 'temperatureC', temperatureC) + zeroCelsiusK;
  const atReference = finiteNumber('henrySolubility', 'solubilityMolPerM3Pa', constant.solubilityMolPerM3Pa, {
    above: 0,
  });
  const vantHoffK = finiteNumber('henrySolubility', 'vantHoffK', constant.vantHoffK);
  const solubility = (atReference * Math.exp(vantHoffK * (1 / temperatureK - 1 / referenceK))) as MolPerM3Pa;
  return {
    solubilityMolPerM3Pa: solubility,
    solubilityMolPerLAtm: molPerLAtm(solubility),
    solubilityWaterAir: waterAirRatio(solubility, temperatureK),
    dLnSolubilityPerK: -vantHoffK / temperatureK ** 2,
  };
}
