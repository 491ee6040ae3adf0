import { effectScope, ref, watchEffect, type Ref } from 'vue';

export type ThemeChoice = 'light' | 'dark' | 'as the system';

const storageKey = 'footing.theme';

/** Light, dark, or as the system has it; kept per machine. Call `useTheme` once before mounting, so that the first paint is right. */
const choice = ref<ThemeChoice>('as the system');
let isFollowing = false;

export function useTheme(): { choice: Ref<ThemeChoice> } {
  // Detached: the theme outlives the part of the screen that happened to ask first.
  if (!isFollowing) effectScope(true).run(follow);
  return { choice };
}

function follow(): void {
  isFollowing = true;
  const stored = localStorage.getItem(storageKey);
  if (stored === 'light' || stored === 'dark') choice.value = stored;

  const system = matchMedia('(prefers-color-scheme: dark)');
  const isSystemDark = ref(system.matches);
  system.addEventListener('change', () => (isSystemDark.value = system.matches));

  watchEffect(() => {
    const isDark = choice.value === 'as the system' ? isSystemDark.value : choice.value === 'dark';
    document.documentElement.dataset.theme = isDark ? 'dark' : 'light';
    if (choice.value === 'as the system') localStorage.removeItem(storageKey);
    else localStorage.setItem(storageKey, choice.value);
  });
}
