import { zeroCelsiusK } from '../../quantities/solubility-units.ts';
import { finiteNumber } from '../../statistics/finite-values.ts';
import { waterTemperatureC } from '../seawater/water-values.ts';

export interface ExchangeCoefficient {
  dLnPco2PerK: number;
  /** α, K. */
  vantHoffK: number;
  /** τ, K. */
  exchangeCoefficientK: number;
  doublingK: number;
}

/**
 * Exchange coefficient: the warming that multiplies the CO2 pressure by e, and by 2.
 *
 * Model    ln p = const − α/T, so d ln p/dT = α/T0² and τ = T0²/α, the reciprocal of the slope; doubling τ ln 2
 * Assumes  the slope at T0 holds over the change
 *
 * @param dLnPco2PerK   1/K, positive: warm water gives CO2 off
 * @param temperatureC  T0 in °C; moves α only
 * @returns  slope, α, τ, τ ln 2
 * @throws   InputError `out-of-range`, `suspected-unit`
 *
 * Source    van ’t Hoff's equation; any text of physical chemistry
 * Checked   test/reference/climate/exchange.test.ts (B: nine cases computed elsewhere)
 */
export function exchangeCoefficient(dLnPco2PerK: number, temperatureC: number): ExchangeCoefficient {
  finiteNumber('exchangeCoefficient', 'dLnPco2PerK', dLnPco2PerK, { above: 0 });
  const temperatureK = waterTemperatureC('exchangeCoefficient', 'temperatureC', temperatureC) + zeroCelsiusK;
  return {
    dLnPco2PerK,
    vantHoffK: dLnPco2PerK * temperatureK ** 2,
    exchangeCoefficientK: 1 / dLnPco2PerK,
    doublingK: Math.LN2 / dLnPco2PerK,
  };
}
