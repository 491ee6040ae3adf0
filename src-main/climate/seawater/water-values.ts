import { InputError } from '../../errors.ts';
import { formatNumber } from '../../quantities/notation.ts';
import { zeroCelsiusK } from '../../quantities/solubility-units.ts';
import { finiteNumber } from '../../statistics/finite-values.ts';

/** No sea is outside these; numbers that are come from another scale. */
const lowestC = -5;
const highestC = 60;
const highestSalinity = 50;

/**
 * The door for the temperature of seawater: finite, and a number that can be degrees Celsius.
 *
 * @returns  °C
 * @throws   InputError `out-of-range` when not finite, `suspected-unit` below −5 or above 60, with what it looks like
 *
 * Checked  test/unit/climate/seawater/water-values.test.ts (C: each refusal and its hint)
 */
export function waterTemperatureC(caller: string, name: string, value: number): number {
  finiteNumber(caller, name, value);
  if (value >= lowestC && value <= highestC) return value;
  throw new InputError({
    code: 'suspected-unit',
    where: `${caller}, ${name}`,
    expected: `the temperature of seawater in °C, between ${lowestC} and ${highestC}`,
    received: String(value),
    hint: hintFor(value),
  });
}

function hintFor(value: number): string {
  if (value > 250 && value < zeroCelsiusK + highestC) {
    return `It looks like kelvin: ${value} K are ${formatNumber(value - zeroCelsiusK, 1)} °C.`;
  }
  if (value > highestC && value <= 140) {
    return `It looks like degrees Fahrenheit: ${value} °F are ${formatNumber((value - 32) / 1.8, 1)} °C.`;
  }
  if (value < lowestC) return 'Seawater freezes at −1.9 °C. A change of temperature goes into warmingK.';
  return 'Give the temperature of the water in °C.';
}

/**
 * The door for salinity: g of salt per kg of seawater, which practical salinity follows closely enough here.
 *
 * @throws  InputError `out-of-range` when negative, not finite or above 50
 *
 * Checked  test/unit/climate/seawater/water-values.test.ts (C: each refusal)
 */
export function waterSalinity(caller: string, value: number): number {
  return finiteNumber(caller, 'salinity', value, { atLeast: 0, atMost: highestSalinity });
}
