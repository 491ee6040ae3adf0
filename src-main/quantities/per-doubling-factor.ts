import type { ClaimUnit } from '../contract/stated.ts';
import { InputError } from '../errors.ts';
import { fahrenheitPerK } from './check-unit.ts';

/**
 * Turns K per doubling into the unit of a sensitivity.
 *
 * @throws InputError `unit-mismatch` for a unit that is not one of a sensitivity
 */
export function perDoublingFactor(unit: ClaimUnit): number {
  switch (unit) {
    case 'K per doubling':
      return 1;
    case '°F per doubling':
      return fahrenheitPerK;
    case 'K per e-folding':
      return 1 / Math.LN2;
    default:
      throw new InputError({
        code: 'unit-mismatch',
        where: 'sensitivity',
        expected: 'a number in K per doubling, °F per doubling or K per e-folding',
        received: `one in ${unit === '1' ? 'no unit' : unit}`,
        hint: 'Correct the unit of the statement.',
      });
  }
}
