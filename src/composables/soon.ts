import { onScopeDispose } from 'vue';

/** Puts off a call for a moment, so that many wishes in a row become one; none comes after the scope's end. */
export function soon(run: () => unknown, milliseconds = 400): () => void {
  let waiting: ReturnType<typeof setTimeout> | undefined;
  onScopeDispose(() => clearTimeout(waiting));
  return () => {
    clearTimeout(waiting);
    waiting = setTimeout(run, milliseconds);
  };
}
