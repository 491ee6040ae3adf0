import { onScopeDispose, readonly, shallowRef, type ShallowRef } from 'vue';
import { host } from './host.ts';

/** True while the program behind this window does not answer. */
export function useHostAbsence(): Readonly<ShallowRef<boolean>> {
  const isAway = shallowRef(false);
  onScopeDispose(
    host().onAbsence((isAwayNow) => (isAway.value = isAwayNow)),
    true,
  );
  return readonly(isAway);
}
