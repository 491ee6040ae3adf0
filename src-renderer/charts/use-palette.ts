import { onScopeDispose, shallowRef, type ShallowRef } from 'vue';
import { darkPalette, lightPalette, type Palette } from '../../src-main/figures/palette.ts';

/** The palette of the theme that the page shows; follows it. */
export function usePalette(): Readonly<ShallowRef<Palette>> {
  const root = document.documentElement;
  const current = () => (root.dataset.theme === 'dark' ? darkPalette : lightPalette);
  const palette = shallowRef(current());
  const observer = new MutationObserver(() => (palette.value = current()));
  observer.observe(root, { attributes: true, attributeFilter: ['data-theme'] });
  onScopeDispose(() => observer.disconnect());
  return palette;
}
