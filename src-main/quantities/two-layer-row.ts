/**
 * A climate model as the two-layer energy-balance model sees it, in the order of the published tables: effective forcing
 * of four times CO2 (W/m²), λ (W m⁻² K⁻¹, positive restores), equilibrium warming for four times CO2 (K), C of the surface
 * layer and C0 of the deep ocean (W yr m⁻² K⁻¹), γ (W m⁻² K⁻¹), ε.
 */
export type TwoLayerRow = readonly [
  model: string,
  quadruplingWm2: number,
  feedback: number,
  quadruplingK: number,
  heatCapacity: number,
  deepHeatCapacity: number,
  exchange: number,
  efficacy: number,
];
