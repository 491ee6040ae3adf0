import type { ClaimComputation } from '../../contract/compute.ts';
import type { Recomputation } from '../../contract/result.ts';
import { logRegression } from './log-regression.ts';
import { budgetSensitivity } from './budget-sensitivity.ts';
import { feedbackConversion } from './feedback-conversion.ts';
import { forcingChange } from './forcing-change.ts';
import { gregorySensitivity } from './gregory-sensitivity.ts';
import { outgassing } from './outgassing.ts';
import { ratio } from './ratio.ts';
import { shareOfWhole } from './share-of-whole.ts';
import { trend } from './trend.ts';

/**
 * Runs the procedure of a claim on its series and holds the result against the number as stated.
 *
 * @throws InputError and NumericError of the procedure in question
 */
export function recompute(computation: ClaimComputation): Recomputation {
  const { procedure } = computation;
  switch (procedure.kind) {
    case 'log-regression':
      return logRegression(computation, procedure);
    case 'trend':
      return trend(computation, procedure);
    case 'ratio':
      return ratio(computation, procedure);
    case 'energy-budget':
      return budgetSensitivity(computation, procedure);
    case 'forcing':
      return forcingChange(computation, procedure);
    case 'feedback':
      return feedbackConversion(computation, procedure);
    case 'attribution':
      return shareOfWhole(computation, procedure);
    case 'outgassing':
      return outgassing(computation, procedure);
    case 'gregory':
      return gregorySensitivity(computation, procedure);
  }
}
