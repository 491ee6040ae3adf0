import type { ClaimComputation } from '../../contract/compute.ts';
import type { Recomputation } from '../../contract/result.ts';
import { logRegression } from './log-regression.ts';
import { ratio } from './ratio.ts';
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
  }
}
