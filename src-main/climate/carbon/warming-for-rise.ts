import { finiteNumber } from '../../statistics/finite-values.ts';
import { co2Level } from './co2-level.ts';

/**
 * The warming that would be needed to explain a rise of CO2 by outgassing alone.
 *
 * Model    ΔT = τ ln(C/C0), the reverse of `riseFromWarming`
 * Assumes  as there
 *
 * @param exchangeCoefficientK  τ, K, positive
 * @param fromPpm, toPpm        C0 and C, ppm
 * @returns  K; negative when CO2 fell
 * @throws   InputError `out-of-range`, `suspected-unit`
 *
 * Source    integral of d ln p/dT = 1/τ
 * Checked   test/reference/climate/exchange.test.ts (B: 9.91 K for 278 to 422.8 ppm, computed elsewhere; C)
 */
export function warmingForRise(exchangeCoefficientK: number, fromPpm: number, toPpm: number): number {
  finiteNumber('warmingForRise', 'exchangeCoefficientK', exchangeCoefficientK, { above: 0 });
  return (
    exchangeCoefficientK *
    Math.log(co2Level('warmingForRise', 'toPpm', toPpm) / co2Level('warmingForRise', 'fromPpm', fromPpm))
  );
}
