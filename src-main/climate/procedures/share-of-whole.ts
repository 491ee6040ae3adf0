import type { ClaimComputation } from '../../contract/compute.ts';
import type { AttributionProcedure } from '../../contract/procedure.ts';
import type { Recomputation } from '../../contract/result.ts';
import { NumericError } from '../../errors.ts';
import { inputText } from '../../quantities/input-text.ts';
import { formatQuantity, withUnit } from '../../quantities/notation.ts';
import { agreementWithStated } from '../../quantities/stated-number.ts';
import { splitNormal } from '../../statistics/split-normal.ts';
import { drawnRatio } from '../drawn-ratio.ts';
import { checkStatedUnit } from './stated-unit.ts';
import { unboundedDraws } from './unbounded-draws.ts';
import { withRoundedInputs } from './rounded-inputs.ts';

/**
 * A budget attribution, "x % of the warming is due to …": a part over the whole, both with their ranges.
 *
 * Model    100 · part/whole, in per cent. It may exceed 100 % where other parts are negative, as cooling aerosols are
 *
 * @returns  5–95 % by Monte Carlo; draws with a whole that is not positive count as unbounded
 * @throws   InputError `unit-mismatch`; NumericError `no-whole` for a central whole that is not above zero
 *
 * Source    definition
 * Checked   test/unit/climate/procedures/share-of-whole.test.ts (C: AR6 forcings, 2.16 of 2.72 W/m²)
 */
export function shareOfWhole(
  { statement, seed }: ClaimComputation,
  { part, whole, unit, correlation, draws }: AttributionProcedure,
): Recomputation {
  checkStatedUnit('attribution', statement.unit, '%');
  if (whole.best <= 0) {
    throw new NumericError({
      code: 'no-whole',
      where: 'procedure attribution',
      expected: 'a whole above zero',
      received: withUnit(String(whole.best), unit),
      hint: 'A share of something that is zero or negative has no meaning; give forcings or warmings over the same period.',
    });
  }
  const { q05, q95, shareUndefined } = drawnRatio({
    numerator: splitNormal(part),
    denominator: splitNormal(whole),
    correlation,
    nDraws: draws,
    seed,
  });
  const value = (100 * part.best) / whole.best;
  return {
    quantity: 'share',
    unit: '%',
    value,
    standardError: null,
    interval: { low: q05 === null ? null : 100 * q05, high: q95 === null ? null : 100 * q95, levelPercent: 90 },
    agreement: agreementWithStated(statement.value, value, {
      bound: statement.bound,
      unit: '%',
      computedInterval: withRoundedInputs([part.best, whole.best], (above = NaN, below = NaN) => (100 * above) / below),
    }),
    fit: null,
    conversion: `${withUnit(String(part.best), unit)} ÷ ${withUnit(String(whole.best), unit)} = ${formatQuantity(value, '%', { significantDigits: 3 })}`,
    working: [
      {
        caption: 'What goes in',
        columns: ['Quantity', 'Value and range'],
        rows: [
          ['part', inputText(part, unit)],
          ['whole', inputText(whole, unit)],
          ['correlation of the two', String(correlation).replace('-', '−')],
        ],
      },
    ],
    caveats: [
      ...unboundedDraws(shareUndefined, 'the whole is not above zero'),
      ...(value > 100
        ? [
            {
              code: 'more-than-the-whole',
              detail:
                'The part exceeds the whole: other parts have the opposite sign, so that shares do not add up to a cake.',
            },
          ]
        : []),
    ],
  };
}
