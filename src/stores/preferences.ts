import { ref, watch } from 'vue';
import { defineStore } from 'pinia';

export const themes = ['system', 'light', 'dark'] as const;
export type Theme = (typeof themes)[number];

const place = 'wallflux.preferences';

function read(): { theme: Theme; letterKeys: boolean } {
  try {
    const kept: unknown = JSON.parse(localStorage.getItem(place) ?? '{}');
    const { theme, letterKeys } = kept as { theme?: unknown; letterKeys?: unknown };
    return { theme: themes.find((name) => name === theme) ?? 'system', letterKeys: letterKeys !== false };
  } catch {
    // Storage is shut or holds something else: the defaults do.
    return { theme: 'system', letterKeys: true };
  }
}

/** What a person chose for this browser. */
export const usePreferencesStore = defineStore('preferences', () => {
  const kept = read();
  const theme = ref<Theme>(kept.theme);
  /** Single letters at a cell act (M, V, K, N); can be switched off (WCAG 2.1.4). */
  const letterKeys = ref(kept.letterKeys);

  watch([theme, letterKeys], () => {
    try {
      localStorage.setItem(place, JSON.stringify({ theme: theme.value, letterKeys: letterKeys.value }));
    } catch {
      // Storage is shut: the choice lasts as long as the window.
    }
  });
  return { theme, letterKeys };
});
