import type { ClaimComputation } from '../contract/compute.ts';
import type { AssumptionOutcome, AssumptionsAnswer } from '../contract/result.ts';
import { isFootingError } from '../errors.ts';
import { untestable, type Assumption } from './assumption.ts';
import { catalogue } from './catalogue.ts';
import { claimLadder } from './claim-ladder.ts';
import { testContext, type TestContext } from './test-context.ts';

/**
 * Tests every assumption that a claim's number can stand on, and climbs the ladder for a log-regression.
 *
 * @returns  outcomes by weight, the decisive first; within one weight by the size of the effect, then in the order of
 *           the catalogue. A test that cannot be made says why and what would make it possible
 * @throws   InputError, NumericError when the number itself cannot be recomputed
 */
export function testAssumptions(
  computation: ClaimComputation,
  onProgress?: (shareDone: number) => void,
): AssumptionsAnswer {
  const context = testContext(computation);
  const applicable = catalogue.filter(({ applies }) => applies(computation));
  const nSteps = applicable.length + 1;
  const outcomes = applicable.map((assumption, place) => {
    const tested = testOne(assumption, context);
    onProgress?.((place + 1) / nSteps);
    return tested;
  });
  const ladder = computation.procedure.kind === 'log-regression' ? claimLadder(context, catalogue) : null;
  onProgress?.(1);
  return { outcomes: outcomes.sort(byWeight), ladder };
}

/** What stands in the way of one test is no reason to withhold the others. */
function testOne(assumption: Assumption, context: TestContext): AssumptionOutcome {
  try {
    return assumption.test(context);
  } catch (error) {
    if (!isFootingError(error)) throw error;
    const { where, expected, received, hint } = error.fields;
    return untestable(assumption, {
      reason: `${where}: expected ${expected}, but found ${received}.`,
      wouldNeed: hint ?? 'Correct this input and test again.',
    });
  }
}

const rank = { decisive: 0, notable: 1, negligible: 2, none: 3 };

function byWeight(a: AssumptionOutcome, b: AssumptionOutcome): number {
  return rank[a.weight ?? 'none'] - rank[b.weight ?? 'none'] || Math.abs(b.effect ?? 0) - Math.abs(a.effect ?? 0);
}
