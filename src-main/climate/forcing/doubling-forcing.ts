import type { ForcingFormula } from '../../contract/forcing.ts';
import { ar6Adjustment } from './ar6-adjustment.ts';
import { forcingFormulas } from './forcing-formulas.ts';
import type { GasConcentrations } from './gas-forcing.ts';
import { meinshausenBase } from './meinshausen2020.ts';

/**
 * Forcing of a doubling of CO2 from a reference, the other gases unchanged: what turns a forcing into "per doubling".
 *
 * Model    F2x = F(2 C0) − F(C0), with F(C0) = 0
 *
 * @param formula     one of the four sets
 * @param adjustment  `ar6` for the effective forcing
 * @param reference   CO2 in ppm, CH4 and N2O in ppb; about 1750 unless given. Only ipcc1990 and myhre1998 do not depend on it
 * @returns  W/m² per doubling
 *
 * Source    see the formulas; AR6 WG1, §7.3.2: 3.75 adjusted and 3.93 effective
 * Checked   test/reference/climate/forcing.test.ts (A: 3.93; B: a table computed elsewhere; C: 5.35 ln 2 and 6.3 ln 2)
 */
export function doublingForcing(
  formula: ForcingFormula,
  adjustment: 'none' | 'ar6' = 'none',
  reference: Readonly<GasConcentrations> = meinshausenBase,
): number {
  const doubled = forcingFormulas[formula]({ ...reference, co2Ppm: 2 * reference.co2Ppm }, reference);
  return (adjustment === 'ar6' ? ar6Adjustment(doubled) : doubled).co2Wm2;
}
