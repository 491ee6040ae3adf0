import type { GasConcentrations, GasForcing } from './gas-forcing.ts';

const [a1, b1, c1, d1] = [-2.4785e-7, 7.5906e-4, -2.1492e-3, 5.2488];
const [a2, b2, c2, d2] = [-3.4197e-4, 2.5455e-4, -2.4357e-4, 0.12173];
const [a3, b3, d3] = [-8.9603e-5, -1.2462e-4, 0.045194];

/** Concentrations to which the formulas were fitted, of about 1750. */
export const meinshausenBase: Readonly<GasConcentrations> = { co2Ppm: 277.15, ch4Ppb: 731.41, n2oPpb: 273.87 };

/**
 * Forcing by the formulas of Meinshausen et al. 2020, the refit of Etminan's that IPCC AR6 adopted (Table 7.SM.1).
 *
 * Model    CO2: (α′ − 2.1492e-3 √N) ln(C/C0)
 *          CH4: (−8.9603e-5 √M − 1.2462e-4 √N + 0.045194) (√M − √M0)
 *          N2O: (−3.4197e-4 √C + 2.5455e-4 √N − 2.4357e-4 √M + 0.12173) (√N − √N0)
 *          α′ as in `meinshausenAlpha`
 * Assumes  the brackets hold the current concentrations, not means as in Etminan et al. 2016
 *
 * @returns  W/m² by gas, stratospherically adjusted; not antisymmetric: below the reference α′ stays as it is there
 *
 * Source    Meinshausen et al. 2020, Geosci. Model Dev. 13, 3571–3605, Table 3; coefficients second-hand
 * Checked   test/reference/climate/forcing.test.ts (A: AR6's 3.93, 2.16, 0.54 and 0.21; B: a table computed elsewhere)
 */
export function meinshausen2020(
  { co2Ppm: c, ch4Ppb: m, n2oPpb: n }: GasConcentrations,
  { co2Ppm: c0, ch4Ppb: m0, n2oPpb: n0 }: GasConcentrations,
): GasForcing {
  const [rootC, rootM, rootN] = [Math.sqrt(c), Math.sqrt(m), Math.sqrt(n)];
  return {
    co2Wm2: (meinshausenAlpha(c, c0) + c1 * rootN) * Math.log(c / c0),
    ch4Wm2: (a3 * rootM + b3 * rootN + d3) * (rootM - Math.sqrt(m0)),
    n2oWm2: (a2 * rootC + b2 * rootN + c2 * rootM + d2) * (rootN - Math.sqrt(n0)),
  };
}

/**
 * α′ of the CO2 formula, W/m² per unit of ln(C/C0), without the overlap with N2O: 5.2488 up to C0, then a parabola in
 * C − C0, held at its top from `meinshausenTopPpm` on so that it never bends down.
 *
 * Checked   test/unit/climate/forcing/formulas.test.ts (C: both joints, and 5.829970147 at the top)
 */
export function meinshausenAlpha(co2Ppm: number, co2RefPpm: number): number {
  if (co2Ppm <= co2RefPpm) return d1;
  if (co2Ppm > meinshausenTopPpm(co2RefPpm)) return d1 - (b1 * b1) / (4 * a1);
  const change = co2Ppm - co2RefPpm;
  return d1 + (a1 * change + b1) * change;
}

/** CO2 concentration from which α′ is held: C0 − b1/(2 a1), 1808 ppm for a reference of 277.15 ppm. */
export function meinshausenTopPpm(co2RefPpm: number): number {
  return co2RefPpm - b1 / (2 * a1);
}
