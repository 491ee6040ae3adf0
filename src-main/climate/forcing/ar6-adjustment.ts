import type { GasForcing } from './gas-forcing.ts';

/**
 * From stratospherically adjusted to effective forcing by AR6's assessed tropospheric adjustments: CO2 +5 % (± 5 %),
 * CH4 −14 % (± 15 %), N2O +7 % (± 13 %), 5–95 %. Central values only.
 *
 * @returns  W/m² by gas, effective radiative forcing
 *
 * Differs   assessed for the formulas of Meinshausen et al. 2020; on others the product is nobody's published number
 * Source    IPCC AR6 WG1, §7.3.2
 * Checked   test/reference/climate/forcing.test.ts (A: 3.93 for a doubling; 2.16, 0.54 and 0.21 for 1750–2019)
 */
export function ar6Adjustment({ co2Wm2, ch4Wm2, n2oWm2 }: GasForcing): GasForcing {
  return { co2Wm2: 1.05 * co2Wm2, ch4Wm2: 0.86 * ch4Wm2, n2oWm2: 1.07 * n2oWm2 };
}
