import { onScopeDispose, ref, watch, type Ref } from 'vue';
import type { PersonHere, SheetCell } from './sheetContext';

/** Readers' software is told of others at most this often, in ms. */
const pause = 10_000;

/** Who writes where, as a sentence for readers' software. */
export function useAnnouncements(
  people: Readonly<Ref<readonly PersonHere[]>>,
  cells: Readonly<Ref<readonly SheetCell[]>>,
) {
  const words = ref('');
  let said = 0;
  let waiting: ReturnType<typeof setTimeout> | undefined;

  function sentence(): string {
    return people.value
      .filter((person) => !person.me && person.writing)
      .map((person) => {
        const number = cells.value.find((cell) => cell.id === person.cellId)?.number;
        return number === undefined ? '' : `${person.name} writes in cell ${number}.`;
      })
      .filter((part) => part !== '')
      .join(' ');
  }
  function say(): void {
    waiting = undefined;
    said = Date.now();
    words.value = sentence();
  }
  watch(people, () => {
    if (waiting !== undefined || sentence() === words.value) return;
    waiting = setTimeout(say, Math.max(0, said + pause - Date.now()));
  });
  onScopeDispose(() => clearTimeout(waiting));
  return words;
}
