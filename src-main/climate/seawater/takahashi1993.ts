import { waterTemperatureC } from './water-values.ts';

/**
 * Isochemical effect of temperature on the CO2 pressure of seawater: how fast pCO2 rises when one and the same water,
 * nothing added or taken away, is warmed.
 *
 * Model    linear: d ln pCO2/dT = 0.0423; quadratic: ln pCO2 = 0.0433 T − 4.35e-5 T² + const, so 0.0433 − 8.7e-5 T; T in °C
 * Assumes  dissolved inorganic carbon and alkalinity fixed; measured on one water of the North Atlantic, S 35.38,
 *          2074 µmol/kg, from 2.1 to 24.5 °C
 *
 * @param temperatureC  °C
 * @returns  d ln pCO2/dT, 1/K
 * @throws   InputError `suspected-unit`, `out-of-range`
 *
 * Differs   least squares on the eight points of Table A1 gives 0.04218 ± 0.00017 where the paper rounds to 0.0423
 * Source    Takahashi et al. 1993, Global Biogeochem. Cycles 7, 843–878, Table A1; coefficients and points second-hand
 * Checked   test/reference/climate/seawater.test.ts (A: refit of the published points by R's lm)
 */
export function takahashi1993(temperatureC: number, form: 'linear' | 'quadratic'): number {
  waterTemperatureC('takahashi1993', 'temperatureC', temperatureC);
  return form === 'linear' ? 0.0423 : 0.0433 - 2 * 4.35e-5 * temperatureC;
}
