import type { GasConcentrations, GasForcing } from './gas-forcing.ts';

/**
 * Forcing by the formulas of Etminan et al. 2016, which count the shortwave absorption of methane.
 *
 * Model    C̄, M̄, N̄: means of current and reference value
 *          CO2: [−2.4e-7 (C − C0)² + 7.2e-4 |C − C0| − 2.1e-4 N̄ + 5.36] ln(C/C0)
 *          CH4: [−1.3e-6 M̄ − 8.2e-6 N̄ + 0.043] (√M − √M0)
 *          N2O: [−8.0e-6 C̄ + 4.2e-6 N̄ − 4.9e-6 M̄ + 0.117] (√N − √N0)
 * Assumes  180–2000 ppm CO2, 340–3500 ppb CH4, 200–525 ppb N2O; above 2000 ppm the fit bends down
 *
 * @returns  W/m² by gas, stratospherically adjusted; exchanging now and reference changes the sign only
 *
 * Source    Etminan et al. 2016, Geophys. Res. Lett. 43, 12614–12623, Table 1; coefficients and ranges second-hand
 * Checked   test/reference/climate/forcing.test.ts (B: a table computed elsewhere; A: methane 1750–2011, 0.61 W/m²)
 */
export function etminan2016(
  { co2Ppm: c, ch4Ppb: m, n2oPpb: n }: GasConcentrations,
  { co2Ppm: c0, ch4Ppb: m0, n2oPpb: n0 }: GasConcentrations,
): GasForcing {
  const [cMean, mMean, nMean] = [(c + c0) / 2, (m + m0) / 2, (n + n0) / 2];
  const change = Math.abs(c - c0);
  return {
    co2Wm2: (-2.4e-7 * change * change + 7.2e-4 * change - 2.1e-4 * nMean + 5.36) * Math.log(c / c0),
    ch4Wm2: (-1.3e-6 * mMean - 8.2e-6 * nMean + 0.043) * (Math.sqrt(m) - Math.sqrt(m0)),
    n2oWm2: (-8e-6 * cMean + 4.2e-6 * nMean - 4.9e-6 * mMean + 0.117) * (Math.sqrt(n) - Math.sqrt(n0)),
  };
}
