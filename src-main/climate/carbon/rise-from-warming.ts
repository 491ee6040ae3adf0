import { finiteNumber } from '../../statistics/finite-values.ts';
import { co2Level } from './co2-level.ts';

export interface CarbonRise {
  toPpm: number;
  risePpm: number;
  /** C0 ΔT/τ: what the slope at the start gives without compounding. */
  risePpmBySlope: number;
}

/**
 * The rise of CO2 that a warming gives: "one degree adds so many ppm".
 *
 * Model    C = C0 exp(ΔT/τ)
 * Assumes  the whole atmosphere follows the pressure of a surface water whose carbon is not drawn down: an upper bound
 *
 * @param exchangeCoefficientK  τ, K, positive
 * @param fromPpm               C0, ppm
 * @param warmingK              ΔT, K; negative for a cooling
 * @returns  ppm
 * @throws   InputError `out-of-range`, `suspected-unit`
 *
 * Source    integral of d ln p/dT = 1/τ
 * Checked   test/reference/climate/exchange.test.ts (B: +12.1 ppm at 280 and +18.1 at 420, computed elsewhere; C)
 */
export function riseFromWarming(exchangeCoefficientK: number, fromPpm: number, warmingK: number): CarbonRise {
  finiteNumber('riseFromWarming', 'exchangeCoefficientK', exchangeCoefficientK, { above: 0 });
  co2Level('riseFromWarming', 'fromPpm', fromPpm);
  finiteNumber('riseFromWarming', 'warmingK', warmingK);
  const risePpm = fromPpm * Math.expm1(warmingK / exchangeCoefficientK);
  return { toPpm: fromPpm + risePpm, risePpm, risePpmBySlope: (fromPpm * warmingK) / exchangeCoefficientK };
}
