import type { ClaimComputation } from '../../contract/compute.ts';
import type { FeedbackProcedure } from '../../contract/procedure.ts';
import type { Recomputation } from '../../contract/result.ts';
import { NumericError } from '../../errors.ts';
import { inputText } from '../../quantities/input-text.ts';
import { formatQuantity } from '../../quantities/notation.ts';
import { perDoublingFactor } from '../../quantities/per-doubling-factor.ts';
import { agreementWithStated } from '../../quantities/stated-number.ts';
import { splitNormal } from '../../statistics/split-normal.ts';
import { drawnRatio } from '../drawn-ratio.ts';
import { checkStatedUnit } from './stated-unit.ts';
import { unboundedDraws } from './unbounded-draws.ts';
import { withRoundedInputs } from './rounded-inputs.ts';

/**
 * Feedback parameter and sensitivity, one from the other.
 *
 * Model    S = F2x/λ, λ = F2x/S; λ > 0 restoring, in W/m² per K. A range of λ that is symmetric gives one of S that is not
 *
 * @returns  5–95 % by Monte Carlo; draws with λ ≤ 0 count as unbounded
 * @throws   InputError `unit-mismatch`; NumericError `not-restoring` for a central λ or S that is not above zero
 *
 * Source    definition; on the skew Roe & Baker 2007, Science 318, 629–632
 * Checked   test/unit/climate/procedures/feedback-conversion.test.ts (A: AR6 α = −1.16, −1.81 to −0.51, and 3.93 W/m²)
 */
export function feedbackConversion(
  { statement, seed }: ClaimComputation,
  { gives, known, doublingWm2, draws }: FeedbackProcedure,
): Recomputation {
  const isSensitivity = gives === 'sensitivity';
  if (!isSensitivity) checkStatedUnit('feedback', statement.unit, 'W/m² per K');
  const factor = isSensitivity ? perDoublingFactor(statement.unit) : 1;
  if (known.best <= 0) {
    throw new NumericError({
      code: 'not-restoring',
      where: 'procedure feedback',
      expected: isSensitivity ? 'a feedback parameter above 0 W/m² per K' : 'a sensitivity above 0 K per doubling',
      received: String(known.best),
      hint: 'λ counts a restoring feedback as positive: AR6’s α = −1.16 is λ = 1.16.',
    });
  }
  const { q05, q95, shareUndefined } = drawnRatio({
    numerator: splitNormal(doublingWm2),
    denominator: splitNormal(known),
    correlation: 0,
    nDraws: draws,
    seed,
  });
  const value = (factor * doublingWm2.best) / known.best;
  const { unit } = statement;
  return {
    quantity: isSensitivity ? 'effective-climate-sensitivity' : 'climate-feedback',
    unit,
    value,
    standardError: null,
    interval: {
      low: q05 === null ? null : q05 * factor,
      high: q95 === null ? null : q95 * factor,
      levelPercent: 90,
    },
    agreement: agreementWithStated(statement.value, value, {
      bound: statement.bound,
      unit,
      computedInterval: withRoundedInputs(
        [doublingWm2.best, known.best],
        (doubling = NaN, divisor = NaN) => (factor * doubling) / divisor,
      ),
    }),
    fit: null,
    conversion: `${isSensitivity ? 'F2x / λ' : 'F2x / S'} = ${doublingWm2.best} ÷ ${known.best} = ${formatQuantity(value, unit, { significantDigits: 4 })}`,
    working: [
      {
        caption: 'What goes in',
        columns: ['Quantity', 'Value and range'],
        rows: [
          ['forcing of a doubling F2x', inputText(doublingWm2, 'W/m²')],
          isSensitivity
            ? ['feedback parameter λ', inputText(known, 'W/m² per K')]
            : ['sensitivity S', inputText(known, 'K per doubling')],
        ],
      },
    ],
    caveats: unboundedDraws(
      shareUndefined,
      isSensitivity ? 'the feedback is not restoring' : 'the sensitivity is not above zero',
    ),
  };
}
