import type { ClaimComputation } from '../contract/compute.ts';
import type { AssumptionId, AssumptionOutcome, CatalogueEntry } from '../contract/result.ts';
import type { RungOffer } from './footing.ts';
import type { TestContext } from './test-context.ts';

/** Something the number needs in order to mean what is said, with the test of it. One file each. */
export interface Assumption extends CatalogueEntry {
  /** Whether a claim's number can stand on this at all. */
  applies: (computation: ClaimComputation) => boolean;
  /** @throws InputError, NumericError: what stands in the way of the test, for the outcome to say */
  test: (context: TestContext) => AssumptionOutcome;
  /** The change that this assumption makes on the ladder, or why it cannot make one; absent when it never does. */
  rung?: (context: TestContext) => RungOffer;
}

/** An outcome with what most tests leave empty filled in. */
export function outcome(
  id: AssumptionId,
  tested: Pick<AssumptionOutcome, 'test' | 'reading' | 'proposal' | 'sentence'> & Partial<AssumptionOutcome>,
): AssumptionOutcome {
  return {
    id,
    isTestable: true,
    missing: null,
    statistic: null,
    alternative: null,
    effect: null,
    weight: null,
    table: null,
    caveats: [],
    ...tested,
  };
}

/** The outcome of a test that cannot be made, and what would make it possible. */
export function untestable(
  { id, title }: Pick<CatalogueEntry, 'id' | 'title'>,
  missing: { reason: string; wouldNeed: string },
): AssumptionOutcome {
  return outcome(id, {
    isTestable: false,
    missing,
    test: 'not tested',
    reading: `${missing.reason} ${missing.wouldNeed}`,
    proposal: { mark: 'untested', reason: missing.reason },
    sentence: `“${title}” could not be tested. ${missing.reason}`,
  });
}
