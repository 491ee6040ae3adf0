import type { LayerMatrix, TwoLayerParameters } from './linear-response.ts';

/** Warming of both layers, K. */
export interface LayerState {
  surfaceK: number;
  deepK: number;
}

/** The state after a time in which a forcing was held. @param flow  times 0; @param integral  times 1, over that time */
export function advanced(
  { surfaceK, deepK }: LayerState,
  flow: LayerMatrix,
  integral: LayerMatrix,
  surfaceTendencyKPerYr: number,
): LayerState {
  return {
    surfaceK:
      flow.surfaceFromSurface * surfaceK +
      flow.surfaceFromDeep * deepK +
      integral.surfaceFromSurface * surfaceTendencyKPerYr,
    deepK:
      flow.deepFromSurface * surfaceK + flow.deepFromDeep * deepK + integral.deepFromSurface * surfaceTendencyKPerYr,
  };
}

/**
 * Top-of-atmosphere imbalance in a state: the heat that both layers together still take up.
 *
 * Model    N = F − λT − (ε − 1)γ(T − T0)
 *
 * Source   Geoffroy et al. 2013b, J. Climate 26, 1859–1876, equation 9 (number from memory)
 * Checked  test/reference/climate/two-layer.test.ts (C: tabulated; N = d(C T + C0 T0)/dt by integration)
 */
export function imbalanceWm2(
  { feedback, efficacy, exchange }: TwoLayerParameters,
  forcingWm2: number,
  { surfaceK, deepK }: LayerState,
): number {
  return forcingWm2 - feedback * surfaceK - (efficacy - 1) * exchange * (surfaceK - deepK);
}
