import { flowIntegral } from './flow-integral.ts';
import { advanced, imbalanceWm2, type LayerState } from './layer-state.ts';
import { linearResponse, type TwoLayerParameters } from './linear-response.ts';

/**
 * Means over each year of the warming and the imbalance of a two-layer model under annual forcing: what an annual record
 * is held against, since a mean lags the year's end by about half a year.
 *
 * Model    with E(s) the flow and F held in the year, the mean is ∫₀¹ E ds times the state at its start, and ∫₀¹ ∫₀ˢ E times
 *          F/C: exact
 * Assumes  balance at the start; λ may be 0 here
 *
 * @param wm2  [nYears]
 * @returns  [nYears] surfaceK, imbalanceWm2
 *
 * Checked  test/reference/climate/two-layer-fit.test.ts (B: R's eigen; the mean of an integration)
 */
export function yearlyResponse(
  parameters: TwoLayerParameters,
  wm2: Float64Array,
): { surfaceK: Float64Array; imbalanceWm2: Float64Array } {
  const response = linearResponse(parameters);
  const flow = flowIntegral(response, 0, 1);
  const once = flowIntegral(response, 1, 1);
  const twice = flowIntegral(response, 2, 1);
  const surfaceK = new Float64Array(wm2.length);
  const imbalance = new Float64Array(wm2.length);
  let state: LayerState = { surfaceK: 0, deepK: 0 };
  for (let year = 0; year < wm2.length; year++) {
    const push = wm2[year]! / parameters.heatCapacity;
    const mean = advanced(state, once, twice, push);
    surfaceK[year] = mean.surfaceK;
    imbalance[year] = imbalanceWm2(parameters, wm2[year]!, mean);
    state = advanced(state, flow, once, push);
  }
  return { surfaceK, imbalanceWm2: imbalance };
}
