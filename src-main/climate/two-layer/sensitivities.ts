import { flowIntegral } from './flow-integral.ts';
import type { LinearResponse } from './linear-response.ts';

const DOUBLING_YEARS = 70;

/**
 * Sensitivities of a two-layer model: what a doubling of CO2 does in the end, and on the way.
 *
 * Model    ECS = F2x/λ; TCR the warming T(70) under a ramp of k W/m² per year: k = F2x/70, which is F4x/140 (`tcrK`), or
 *          k = F2x ln 1.01/ln 2, CO2 growing by exactly 1 % a year (`tcrOnePercentK`, 0.5 % more);
 *          F2x/(λ + εγ) in the limit of a deep ocean that has not warmed
 *
 * @param doublingWm2  F2x
 *
 * Differs  TCR is also defined as a mean over the years 61–80: under a ramp nearly T(70)
 * Source   Geoffroy et al. 2013a, J. Climate 26, 1841–1857; AR6 WG1, glossary (definition of TCR, from memory)
 * Checked  test/reference/climate/two-layer.test.ts (C: tabulated values)
 */
export function sensitivities(response: LinearResponse, doublingWm2: number) {
  const { heatCapacity, exchange, feedback, efficacy } = response.parameters;
  const perWm2PerYr = flowIntegral(response, 2, DOUBLING_YEARS).surfaceFromSurface / heatCapacity;
  return {
    ecsK: doublingWm2 / feedback,
    tcrK: (perWm2PerYr * doublingWm2) / DOUBLING_YEARS,
    tcrOnePercentK: (perWm2PerYr * doublingWm2 * Math.log(1.01)) / Math.LN2,
    tcrNoDeepWarmingK: doublingWm2 / (feedback + efficacy * exchange),
  };
}
