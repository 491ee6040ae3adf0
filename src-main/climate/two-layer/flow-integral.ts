import type { LayerMatrix, LinearResponse } from './linear-response.ts';
import { phi, phiDifference } from './phi-functions.ts';

/**
 * The flow of the two-layer model over a time, integrated from its start a number of times: exact, whatever the time.
 *
 * Model    A the model's matrix, E(t) = exp(At). times 0: E(t), what is left after t of a warming at the start; 1: ∫₀ᵗ E,
 *          whose first column over C is the response to a step of 1 W/m²; 2: the integral of that, the response to a ramp
 *          of 1 W/m² per year, or t times the mean over the time under a step. As e^(r₁t) I + [r₁, r₂]e^(rt) (A − r₁ I), r₁
 *          the fast rate: a sum without a negative term, so nothing cancels
 *
 * @param times  0, 1 or 2
 * @param timeYr  at least 0
 * @returns  dimensionless for 0, yr for 1, yr² for 2
 *
 * Source   Higham 2008, Functions of Matrices, §1.2 (Newton form of exp of a 2 × 2 matrix)
 * Checked  test/reference/climate/two-layer.test.ts (B: R's eigen, an integration of the equations)
 */
export function flowIntegral(response: LinearResponse, times: number, timeYr: number): LayerMatrix {
  const { fastRate, slowRate, surfaceExcess, deepExcess } = response;
  const { heatCapacity, deepHeatCapacity, exchange, efficacy } = response.parameters;
  const scale = timeYr ** times;
  const own = scale * phi(times, fastRate * timeYr);
  const shared = scale * timeYr * phiDifference(times, fastRate * timeYr, slowRate * timeYr);
  return {
    surfaceFromSurface: own + shared * surfaceExcess,
    surfaceFromDeep: (shared * efficacy * exchange) / heatCapacity,
    deepFromSurface: (shared * exchange) / deepHeatCapacity,
    deepFromDeep: own + shared * deepExcess,
  };
}
