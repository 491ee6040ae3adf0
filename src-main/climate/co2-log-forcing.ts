import { InputError } from '../errors.ts';

/** Coefficient of the simplified CO2 expression of Myhre et al. (1998), W/m². */
export const co2LogCoefficientWm2 = 5.35;

/**
 * Radiative forcing of a CO2 change by the simplified logarithmic expression.
 *
 * Model    F = 5.35 ln(C/C0), positive downward at the tropopause; F(C0) = 0
 *
 * @param co2Ppm           > 0
 * @param co2ReferencePpm  > 0
 * @returns W/m²
 * @throws  InputError `not-positive`
 *
 * Source   Myhre, Highwood, Shine & Stordal 1998, Geophys. Res. Lett. 25, 2715–2718, table 3
 * Checked  test/unit/climate/co2-log-forcing.test.ts (C: 5.35 ln 2 = 3.708). Later assessments have larger effective forcing
 */
export function co2LogForcing(co2Ppm: number, co2ReferencePpm: number): number {
  if (!(co2Ppm > 0 && co2ReferencePpm > 0 && Number.isFinite(co2Ppm) && Number.isFinite(co2ReferencePpm))) {
    throw new InputError({
      code: 'not-positive',
      where: 'CO2 forcing',
      expected: 'two CO2 concentrations above 0 ppm',
      received: `${co2Ppm} and ${co2ReferencePpm}`,
    });
  }
  return co2LogCoefficientWm2 * Math.log(co2Ppm / co2ReferencePpm);
}

/** Forcing of a CO2 doubling under the same expression: 5.35 ln 2, W/m². */
export const co2LogDoublingWm2 = co2LogCoefficientWm2 * Math.LN2;
