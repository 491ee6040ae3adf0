import { onScopeDispose, ref, watch, type Ref } from 'vue';

const storageKey = 'footing.margin';
/** Below this width the sheet needs the room: the margin lies over it, and stays shut until asked for (see App.vue). */
const wideEnough = '(min-width: 1280px)';

/** Whether the margin beside the sheet is open. What the reviewer chooses on a wide window is kept per machine. */
export function useMargin(): { isMarginOpen: Ref<boolean> } {
  const wide = matchMedia(wideEnough);
  const isWanted = () => wide.matches && localStorage.getItem(storageKey) !== 'shut';
  const isMarginOpen = ref(isWanted());
  const follow = () => (isMarginOpen.value = isWanted());
  wide.addEventListener('change', follow);
  onScopeDispose(() => wide.removeEventListener('change', follow));
  watch(isMarginOpen, (isOpen) => {
    if (wide.matches) localStorage.setItem(storageKey, isOpen ? 'open' : 'shut');
  });
  return { isMarginOpen };
}
