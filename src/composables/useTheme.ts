import { watch } from 'vue';
import { Dark } from 'quasar';
import { storeToRefs } from 'pinia';
import { usePreferencesStore } from 'src/stores/preferences';

/** Light, dark, or as the system says: the choice of the person drives Quasar's dark class. */
export function useTheme() {
  const { theme } = storeToRefs(usePreferencesStore());
  watch(theme, (name) => Dark.set(name === 'system' ? 'auto' : name === 'dark'), { immediate: true });
  return { theme };
}
