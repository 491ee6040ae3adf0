import { shallowRef, type ShallowRef } from 'vue';
import type { ErrorAnswer } from '../../src-main/contract/requests.ts';
import { useClaimSheet } from './use-claim-sheet.ts';

type LongWork = 'claim.recompute' | 'claim.testAssumptions' | 'claim.derive';

/** A computation of this claim that the frame shows with its progress and a way to cancel it. */
export function useLongWork(name: LongWork): {
  error: Readonly<ShallowRef<ErrorAnswer | null>>;
  run: () => Promise<void>;
} {
  const { ask } = useClaimSheet();
  const error = shallowRef<ErrorAnswer | null>(null);
  const run = async () => {
    error.value = await ask(name, { jobId: crypto.randomUUID() });
  };
  return { error, run };
}
