import { onScopeDispose, shallowRef, type ShallowRef } from 'vue';
import type { RequestName } from '../../src-main/contract/request-names.ts';
import type { Answer, ErrorAnswer, RequestAnswer, RequestInput } from '../../src-main/contract/requests.ts';
import { request } from './request.ts';

export interface RequestState<Name extends RequestName> {
  /** The newest good answer; null before the first. */
  value: Readonly<ShallowRef<RequestAnswer<Name> | null>>;
  /** What went wrong with the newest asking; null when nothing did. */
  error: Readonly<ShallowRef<ErrorAnswer | null>>;
  isRunning: Readonly<ShallowRef<boolean>>;
  /** Asks again. Resolves with this asking's own answer, even when a newer one has overtaken it. */
  run(input: RequestInput<Name>): Promise<Answer<Name>>;
}

/** One request as state for a screen. Askings are numbered: a late answer never overwrites a newer one. */
export function useRequest<Name extends RequestName>(name: Name): RequestState<Name> {
  const value: ShallowRef<RequestAnswer<Name> | null> = shallowRef(null);
  const error = shallowRef<ErrorAnswer | null>(null);
  const isRunning = shallowRef(false);
  let newest = 0;

  // NaN equals nothing: when the screen is gone, no answer is the newest.
  onScopeDispose(() => (newest = NaN), true);

  async function run(input: RequestInput<Name>): Promise<Answer<Name>> {
    const number = (newest += 1);
    isRunning.value = true;
    const answer = await request(name, input);
    if (number === newest) {
      isRunning.value = false;
      error.value = answer.ok ? null : answer.error;
      if (answer.ok) value.value = answer.value;
    }
    return answer;
  }

  return { value, error, isRunning, run };
}
