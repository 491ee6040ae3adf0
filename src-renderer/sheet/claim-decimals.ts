import type { ClaimView } from '../../src-main/contract/project.ts';
import { decimalsFor } from '../../src-main/quantities/notation.ts';

/** Decimals that suit the numbers of a claim: what the error of the recomputed one lets show, or one more than was printed. */
export function claimDecimals({ claim, recomputation }: Pick<ClaimView, 'claim' | 'recomputation'>): number {
  const error = recomputation?.answer.standardError;
  if (error) return decimalsFor(error);
  return (/[.,](\d*)/.exec(claim.statement.value)?.[1]?.length ?? 0) + 1;
}
