import { finiteNumber } from '../../statistics/finite-values.ts';

/** Two states of one seawater at one temperature and alkalinity. */
export interface CarbonStates {
  pco2Before: number;
  pco2After: number;
  dicBefore: number;
  dicAfter: number;
}

/**
 * Revelle factor: by how many per cent the CO2 pressure of seawater changes when its dissolved carbon changes by one.
 *
 * Model    R = (ΔpCO2/pCO2)/(ΔDIC/DIC), changes relative to the first state; about 8–9 in the tropics, 12–13 in high
 *          latitudes, 10 in the mean (Sabine et al. 2004, from memory)
 * Assumes  small changes; temperature, salinity and alkalinity fixed
 *
 * @param states  pCO2 in one unit, DIC in one unit, all positive
 * @throws   InputError `out-of-range`: a value that is not positive, or dissolved carbon that does not change
 *
 * Source    Revelle & Suess 1957, Tellus 9, 18–27
 * Checked   test/unit/climate/seawater/revelle-factor.test.ts (C: +10 % pCO2 for +1 % DIC is 10; there and back)
 */
export function revelleFactor({ pco2Before, pco2After, dicBefore, dicAfter }: CarbonStates): number {
  const positive = (name: string, value: number) => finiteNumber('revelleFactor', name, value, { above: 0 });
  positive('pco2After', pco2After);
  positive('dicAfter', dicAfter);
  const dicShare = dicAfter / positive('dicBefore', dicBefore) - 1;
  finiteNumber('revelleFactor', 'change of dic', Math.abs(dicShare), { above: 0 });
  return (pco2After / positive('pco2Before', pco2Before) - 1) / dicShare;
}

/** Share by which dissolved carbon changes when the pressure changes by a share of itself; see `revelleFactor`. */
export function dicShareOf(pco2Share: number, factor: number): number {
  return (
    finiteNumber('dicShareOf', 'pco2Share', pco2Share) / finiteNumber('dicShareOf', 'factor', factor, { above: 0 })
  );
}

/** The reverse of `dicShareOf`. */
export function pco2ShareOf(dicShare: number, factor: number): number {
  return (
    finiteNumber('pco2ShareOf', 'dicShare', dicShare) * finiteNumber('pco2ShareOf', 'factor', factor, { above: 0 })
  );
}
