import { gasConstant, zeroCelsiusK } from '../../quantities/solubility-units.ts';
import { waterTemperatureC } from './water-values.ts';

/** J/mol: fitted to the measurements of Takahashi et al. 1993, or from the enthalpies of the reactions. */
const enthalpies = { fit: 28_995, enthalpy: 25_288 } as const;

/**
 * Isochemical effect of temperature on the CO2 pressure of seawater in van 't Hoff's form.
 *
 * Model    ln pCO2 = const − b/(R T), so d ln pCO2/dT = b/(R T²); b = 28 995 J/mol (`fit`) or 25 288 J/mol (`enthalpy`)
 * Assumes  dissolved inorganic carbon and alkalinity fixed; b the same at every temperature and composition
 *
 * @param temperatureC  °C
 * @returns  d ln pCO2/dT, 1/K
 * @throws   InputError `suspected-unit`, `out-of-range`
 *
 * Differs   least squares of ln pCO2 on 1/T gives b = 28 694 J/mol from the same eight points, of pCO2 itself 28 963
 * Source    Humphreys 2024, Ocean Sci. 20; coefficients second-hand, volume from memory
 * Checked   test/reference/climate/seawater.test.ts (A: refit of the points in R within 1.1 %; C: b/R by hand)
 */
export function humphreys2024(temperatureC: number, coefficient: keyof typeof enthalpies): number {
  const temperatureK = waterTemperatureC('humphreys2024', 'temperatureC', temperatureC) + zeroCelsiusK;
  return enthalpies[coefficient] / (gasConstant * temperatureK ** 2);
}
