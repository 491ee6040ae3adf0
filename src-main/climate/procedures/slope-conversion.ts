import type { LogRegressionProcedure } from '../../contract/procedure.ts';
import type { ClaimUnit } from '../../contract/stated.ts';
import { InputError } from '../../errors.ts';
import { fahrenheitPerK } from '../../quantities/check-unit.ts';
import { formatNumber, formatQuantity } from '../../quantities/notation.ts';

export interface SlopeConversion {
  /** number = slope (K per e-folding) × factor */
  factor: number;
  unit: ClaimUnit;
  /** The conversion in words and figures, for a slope. */
  words: (slopeKPerEFolding: number) => string;
}

/**
 * How a slope on ln C becomes the number of a claim: times ln 2 per doubling, as it is per e-folding, and in Fahrenheit
 * degrees where the statement is in them.
 *
 * @throws InputError `unit-mismatch` when the statement's unit is not one of a sensitivity
 */
export function slopeConversion(
  conversion: LogRegressionProcedure['conversion'],
  statedUnit: ClaimUnit,
): SlopeConversion {
  const shown = (value: number): string => formatNumber(value, { significantDigits: 4 });
  if (!['K per doubling', 'K per e-folding', '°F per doubling'].includes(statedUnit)) {
    throw new InputError({
      code: 'unit-mismatch',
      where: 'procedure log-regression',
      expected: 'a statement in K per doubling, K per e-folding or °F per doubling',
      received: `a statement in ${statedUnit === '1' ? 'a plain number' : statedUnit}`,
      hint: 'Correct the unit of the statement, or choose another procedure.',
    });
  }
  if (conversion === 'per-e-folding') {
    return {
      factor: 1,
      unit: 'K per e-folding',
      words: (slope) => `${formatQuantity(slope, 'K per e-folding', { significantDigits: 4 })}: the slope itself`,
    };
  }
  if (statedUnit === '°F per doubling') {
    const factor = Math.LN2 * fahrenheitPerK;
    return {
      factor,
      unit: statedUnit,
      words: (slope) => `${shown(slope)} K × ln 2 × ${fahrenheitPerK} = ${shown(slope * factor)} °F per doubling`,
    };
  }
  return {
    factor: Math.LN2,
    unit: 'K per doubling',
    words: (slope) => `${shown(slope)} K × ln 2 = ${shown(slope * Math.LN2)} K per doubling`,
  };
}
