/** Mass of carbon in the atmosphere per ppm of CO2, as the Global Carbon Budget uses it (second-hand). */
export const gtCPerPpm = 2.124;

/** Other factors in use for the same, and where the difference comes from. */
export const otherGtCPerPpm: readonly { gtCPerPpm: number; origin: string }[] = [
  { gtCPerPpm: 2.12, origin: 'older budgets, rounded' },
  { gtCPerPpm: 2.123, origin: 'older budgets' },
  { gtCPerPpm: 2.13, origin: 'from the mass of dry air, 5.1352e18 kg, as if CO2 were evenly mixed through all of it' },
];

/** Mass of CO2 per mass of carbon: 44.009/12.011, as the Global Carbon Budget uses it (second-hand). */
export const gtCO2PerGtC = 3.664;

/** The same from whole molar masses, as many texts have it; 0.07 % larger. */
export const gtCO2PerGtCWholeMasses = 44 / 12;

/**
 * Carbon in the atmosphere for a mole fraction of CO2, or for a change of it.
 *
 * @param ppm     mole fraction in dry air, global mean
 * @param factor  GtC per ppm
 * @returns  GtC
 *
 * Source   Friedlingstein et al. 2025, Earth Syst. Sci. Data 17, 965; factor second-hand
 * Checked  test/unit/quantities/carbon-units.test.ts (C: from the mass of dry air within 0.3 %; there and back)
 */
export function gtCFromPpm(ppm: number, factor: number = gtCPerPpm): number {
  return ppm * factor;
}

/** The reverse of `gtCFromPpm`. */
export function ppmFromGtC(gtC: number, factor: number = gtCPerPpm): number {
  return gtC / factor;
}

/**
 * Mass of CO2 that contains a mass of carbon.
 *
 * @param factor  `gtCO2PerGtC` or `gtCO2PerGtCWholeMasses`
 * @returns  GtCO2
 */
export function gtCO2FromGtC(gtC: number, factor: number = gtCO2PerGtC): number {
  return gtC * factor;
}

/** The reverse of `gtCO2FromGtC`. */
export function gtCFromGtCO2(gtCO2: number, factor: number = gtCO2PerGtC): number {
  return gtCO2 / factor;
}
