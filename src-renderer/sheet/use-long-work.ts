import { shallowRef, type ShallowRef } from 'vue';
import type { ErrorAnswer, RequestInput } from '../../src-main/contract/requests.ts';
import { useSession } from '../state/use-session.ts';
import { useClaimSheet } from './use-claim-sheet.ts';

const results = {
  'claim.derive': 'derivation',
  'claim.recompute': 'recomputation',
  'claim.testAssumptions': 'assumptions',
  'claim.sweep': 'sweep',
  'claim.compareEstimators': 'estimators',
} as const;
type LongWork = keyof typeof results;

/** A computation of this claim that the frame shows with its progress and a way to cancel it. */
export function useLongWork<Name extends LongWork>(
  name: Name,
  inputs: () => Omit<RequestInput<Name>, 'claimId' | 'jobId'>,
): { error: Readonly<ShallowRef<ErrorAnswer | null>>; run: () => Promise<void> } {
  const { view, ask } = useClaimSheet();
  const { notice } = useSession();
  const error = shallowRef<ErrorAnswer | null>(null);
  const resultId = () => view.value?.[results[name]]?.result.id;

  const run = async () => {
    const before = resultId();
    error.value = await ask(name, { jobId: crypto.randomUUID(), ...inputs() } as Omit<RequestInput<Name>, 'claimId'>);
    // Nothing is stored twice, so nothing on the sheet would show that the work was done.
    if (!error.value && before !== undefined && before === resultId())
      notice.value = { text: 'Computed again: the same to the last digit.', canUndo: false };
  };
  return { error, run };
}
