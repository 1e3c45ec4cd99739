import { onScopeDispose, ref, type Ref } from 'vue';

/** Whether the browser has a line. */
export function useOnline(): Ref<boolean> {
  const online = ref(navigator.onLine);
  const look = () => {
    online.value = navigator.onLine;
  };
  window.addEventListener('online', look);
  window.addEventListener('offline', look);
  onScopeDispose(() => {
    window.removeEventListener('online', look);
    window.removeEventListener('offline', look);
  });
  return online;
}
