/**
 * Overlap of the absorption bands of methane and nitrous oxide: what both absorb is counted once.
 *
 * Model    f(M, N) = 0.47 ln[1 + 2.01e-5 (MN)^0.75 + 5.31e-15 M (MN)^1.52]; M and N in ppb
 *
 * @param ch4Ppb  ppb, positive
 * @param n2oPpb  ppb, positive
 * @returns  W/m²
 *
 * Differs   one widely used code has 5.32e-15; below 3e-6 W/m² at the concentrations of 2019
 * Source    IPCC 1990, Table 2.2; Myhre et al. 1998, Geophys. Res. Lett. 25, 2715, Table 3; IPCC TAR, Table 6.2
 * Checked   test/reference/climate/forcing.test.ts (B: a table computed elsewhere; coefficients second-hand)
 */
export function bandOverlap(ch4Ppb: number, n2oPpb: number): number {
  const product = ch4Ppb * n2oPpb;
  return 0.47 * Math.log1p(2.01e-5 * product ** 0.75 + 5.31e-15 * ch4Ppb * product ** 1.52);
}
