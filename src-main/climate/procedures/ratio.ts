import type { RatioProcedure } from '../../contract/procedure.ts';
import type { ClaimComputation } from '../../contract/compute.ts';
import type { Recomputation } from '../../contract/result.ts';
import { NumericError } from '../../errors.ts';
import { formatNumber, formatQuantity, withUnit } from '../../quantities/notation.ts';
import {
  agreementWithStated,
  statedInterval,
  statedValue,
  type RoundingInterval,
} from '../../quantities/stated-number.ts';

/**
 * A number that a source computes from two stated numbers: numerator over denominator, with the interval that their
 * printed digits leave open.
 *
 * Model    q = n/d; the interval of q has the quotients of the ends of the two rounding intervals as its ends
 *
 * @throws  InputError `not-a-number`; NumericError `zero-denominator` when the denominator may be zero within rounding,
 *          `out-of-range` when the ratio or its interval is beyond the largest number
 *
 * Source   interval arithmetic on rounded numbers: common practice
 * Checked  test/unit/climate/procedures/ratio.test.ts (C: by hand)
 */
export function ratio({ statement }: ClaimComputation, { numerator, denominator }: RatioProcedure): Recomputation {
  const below = statedInterval(denominator.value);
  if (below.low <= 0 && below.high >= 0) {
    throw new NumericError({
      code: 'zero-denominator',
      where: 'procedure ratio, denominator',
      expected: 'a number that is not zero within its rounding',
      received: denominator.value,
      hint: 'Give the denominator with the digits that the source prints.',
    });
  }
  const value = statedValue(numerator.value) / statedValue(denominator.value);
  const computedInterval = quotientInterval(statedInterval(numerator.value), below);
  if (![value, computedInterval.low, computedInterval.high].every(Number.isFinite)) {
    throw new NumericError({
      code: 'out-of-range',
      where: 'procedure ratio',
      expected: 'a ratio, rounding included, within the range of numbers',
      received: `${numerator.value} over ${denominator.value}`,
      hint: 'Give both numbers in units in which they are of ordinary size.',
    });
  }
  const { unit } = statement;
  const parts = [numerator, denominator].map((part) => withUnit(part.value.replace('-', '−'), part.unit)).join(' ÷ ');
  const [low, high] = [computedInterval.low, computedInterval.high].map((end) =>
    formatNumber(end, { significantDigits: 4 }),
  );
  return {
    quantity: 'ratio',
    unit,
    value,
    standardError: null,
    interval: null,
    agreement: agreementWithStated(statement.value, value, { bound: statement.bound, unit, computedInterval }),
    fit: null,
    conversion: `${parts} = ${formatQuantity(value, unit, { significantDigits: 4 })}; between ${low} and ${high} when both are taken with their rounding`,
    working: [],
    caveats: [
      {
        code: 'units-not-computed',
        detail: `The units ${numerator.unit || '1'} and ${denominator.unit || '1'} are shown, not computed with: check that their ratio is in ${unit === '1' ? 'a plain number' : unit}.`,
      },
    ],
  };
}

/** The ends of n/d over two intervals, the second without zero. */
function quotientInterval(n: RoundingInterval, d: RoundingInterval): RoundingInterval {
  const corners = [n.low / d.low, n.low / d.high, n.high / d.low, n.high / d.high];
  return { low: Math.min(...corners), high: Math.max(...corners) };
}
