import type { EnergyBudgetInputs } from '../contract/claim.ts';

const budget = 'IPCC AR6 WG1 (2021), chapter 7, §7.5.2.1: 1850–1900 to 2006–2019';

/**
 * The energy budget of AR6 §7.5.2.1, central values with 5–95 % half-widths, read in the publication. The forcing change is
 * printed as 1.53 to 2.91, which is not quite symmetric; half its width is given here.
 *
 * ±0.47 W/m² for a doubling is read in AR6 in two ways: ±12 %, the 5–95 % range, where it is derived (§7.3.2.1), and "one
 * standard deviation" where it is used (§7.5.1.1). The first is taken. With the second the half-width would be 0.77 W/m².
 */
export const publishedBudget: EnergyBudgetInputs = {
  warmingK: { mean: 1.03, halfWidth90: 0.2, source: budget },
  forcingWm2: { mean: 2.2, halfWidth90: 0.69, source: `${budget}; 1.53 to 2.91 taken as symmetric` },
  uptakeWm2: { mean: 0.59, halfWidth90: 0.35, source: budget },
  doublingWm2: {
    mean: 3.93,
    halfWidth90: 0.47,
    source: 'IPCC AR6 WG1 (2021), chapter 7, §7.3.2.1; ±0.47 read as 5–95 %',
  },
};
