/** Parameters of the two-layer model, by the names and in the units of the compute request. */
export interface TwoLayerParameters {
  /** C, W yr m⁻² K⁻¹. */
  heatCapacity: number;
  /** C0, W yr m⁻² K⁻¹. */
  deepHeatCapacity: number;
  /** γ, W m⁻² K⁻¹. */
  exchange: number;
  /** λ, W m⁻² K⁻¹; positive restores. */
  feedback: number;
  /** ε, of the heat uptake by the deep layer; 1 in part I of the paper. */
  efficacy: number;
}

/** The model as a linear system: what its solutions are made of. */
export interface LinearResponse {
  parameters: TwoLayerParameters;
  /** Eigenvalues −1/τ_f ≤ −1/τ_s ≤ 0, per year. */
  fastRate: number;
  slowRate: number;
  /** √δ, their distance. */
  spread: number;
  /** Diagonal of the matrix less the fast rate: surface and deep layer. Neither is negative; their sum is √δ. */
  surfaceExcess: number;
  deepExcess: number;
}

/** Warming of both layers that is left, or made, by one unit in each. */
export interface LayerMatrix {
  surfaceFromSurface: number;
  surfaceFromDeep: number;
  deepFromSurface: number;
  deepFromDeep: number;
}

/**
 * Rates of the two-layer energy-balance model: how fast a surface layer and the deep ocean below it follow a forcing.
 *
 * Model    C dT/dt = F − λT − εγ(T − T0), C0 dT0/dt = γ(T − T0); with b = (λ + εγ)/C + γ/C0, b* = (λ + εγ)/C − γ/C0 and
 *          δ = b*² + 4εγ²/(C C0) the rates are −(b ± √δ)/2. The smaller of two nearly cancelling numbers is formed from
 *          the product of both, so that γ → 0, equal rates and ε = 0 need no case of their own
 *
 * @param parameters  C, C0 > 0; γ, λ, ε ≥ 0; not checked here
 *
 * Source   Geoffroy et al. 2013a, J. Climate 26, 1841–1857, table 1; with efficacy 2013b, J. Climate 26, 1859–1876;
 *          after Held et al. 2010, J. Climate 23, 2418–2427 (forms second-hand)
 * Checked  test/reference/climate/two-layer.test.ts (B: R's eigen, an integration of the equations; C: tabulated modes)
 */
export function linearResponse(parameters: TwoLayerParameters): LinearResponse {
  const { heatCapacity, deepHeatCapacity, exchange, feedback, efficacy } = parameters;
  const surfaceLoss = (feedback + efficacy * exchange) / heatCapacity;
  const deepLoss = exchange / deepHeatCapacity;
  const difference = surfaceLoss - deepLoss;
  const coupling = ((efficacy * exchange) / heatCapacity) * deepLoss;
  const spread = Math.hypot(difference, 2 * Math.sqrt(coupling));
  const larger = (Math.abs(difference) + spread) / 2;
  const smaller = larger === 0 ? 0 : coupling / larger;
  const fastRate = -(surfaceLoss + deepLoss + spread) / 2;
  return {
    parameters,
    fastRate,
    slowRate: fastRate === 0 ? 0 : ((feedback / heatCapacity) * deepLoss) / fastRate,
    spread,
    surfaceExcess: difference >= 0 ? smaller : larger,
    deepExcess: difference >= 0 ? larger : smaller,
  };
}
