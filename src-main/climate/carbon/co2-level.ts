import { InputError } from '../../errors.ts';
import { finiteNumber } from '../../statistics/finite-values.ts';

/**
 * The door for a CO2 level: finite, positive, and a number that can be ppm.
 *
 * @returns  ppm
 * @throws   InputError `out-of-range`, `suspected-unit` below 50 or above 5000
 *
 * Checked   test/unit/climate/carbon/co2-level.test.ts (C: each refusal)
 */
export function co2Level(caller: string, name: string, ppm: number): number {
  finiteNumber(caller, name, ppm, { above: 0 });
  if (ppm >= 50 && ppm <= 5000) return ppm;
  throw new InputError({
    code: 'suspected-unit',
    where: `${caller}, ${name}`,
    expected: 'CO2 in ppm, between 50 and 5000',
    received: String(ppm),
    hint:
      ppm > 5000
        ? 'It looks like ppb: divide by 1000.'
        : 'It looks like per cent, a pressure in Pa or GtC per year: give the mole fraction in ppm.',
  });
}
