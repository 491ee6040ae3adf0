declare const unit: unique symbol;

/**
 * Solubilities of a gas, each in a type of its own: the compiler refuses one in place of another. Per litre and per
 * kilogram of seawater differ by its density, 2.35 % at 25 °C, too little to be seen in a result; public codes have
 * been found that label the one as the other.
 */
export type MolPerKgAtm = number & { readonly [unit]: 'mol kg⁻¹ atm⁻¹' };
export type MolPerLAtm = number & { readonly [unit]: 'mol L⁻¹ atm⁻¹' };
export type MolPerM3Pa = number & { readonly [unit]: 'mol m⁻³ Pa⁻¹' };

/** J mol⁻¹ K⁻¹; exact since the SI of 2019. */
export const gasConstant = 8.31446261815324;

/** 0 °C; exact. */
export const zeroCelsiusK = 273.15;

const pascalPerAtm = 101_325;
const litresPerM3 = 1000;

/** Henry's constant in the unit of older tables. */
export function molPerLAtm(solubilityMolPerM3Pa: MolPerM3Pa): MolPerLAtm {
  return ((solubilityMolPerM3Pa * pascalPerAtm) / litresPerM3) as MolPerLAtm;
}

/** The reverse of `molPerLAtm`. */
export function molPerM3Pa(solubilityMolPerLAtm: MolPerLAtm): MolPerM3Pa {
  return ((solubilityMolPerLAtm * litresPerM3) / pascalPerAtm) as MolPerM3Pa;
}

/**
 * Concentration in water over concentration in air: Hcc = H R T.
 *
 * @param temperatureK  absolute
 * @returns  dimensionless
 *
 * Source   Sander 2015, Atmos. Chem. Phys. 15, 4399, §2
 * Checked  test/unit/quantities/solubility-units.test.ts (C: CO2 at 25 °C, 0.81806)
 */
export function waterAirRatio(solubilityMolPerM3Pa: MolPerM3Pa, temperatureK: number): number {
  return solubilityMolPerM3Pa * gasConstant * temperatureK;
}
