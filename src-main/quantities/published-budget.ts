import type { EnergyBudgetInputs } from '../contract/claim.ts';

const budget = 'IPCC AR6 WG1 (2021), chapter 7, §7.5.2.1: 1850–1900 to 2006–2019';

/**
 * The energy budget of AR6 §7.5.2.1, central values with 5–95 % ranges, read in the publication.
 *
 * ±0.47 W/m² for a doubling is read in AR6 in two ways: ±12 %, the 5–95 % range, where it is derived (§7.3.2.1), and "one
 * standard deviation" where it is used (§7.5.1.1). The first is taken. With the second the 5–95 % range would be ±0.77 W/m².
 */
export const publishedBudget: EnergyBudgetInputs = {
  warmingK: { best: 1.03, low: 0.83, high: 1.23, levelPercent: 90, source: budget },
  forcingWm2: { best: 2.2, low: 1.53, high: 2.91, levelPercent: 90, source: budget },
  uptakeWm2: { best: 0.59, low: 0.24, high: 0.94, levelPercent: 90, source: budget },
  doublingWm2: {
    best: 3.93,
    low: 3.46,
    high: 4.4,
    levelPercent: 90,
    source: 'IPCC AR6 WG1 (2021), chapter 7, §7.3.2.1; ±0.47 read as 5–95 %',
  },
};
