import { onBeforeUnmount, onMounted } from 'vue';
import { usePreferencesStore } from 'src/stores/preferences';

export interface Shortcut {
  /** `F1`, `Ctrl+Enter`, `Shift+N`, `M`, `ArrowDown`; Ctrl also stands for the command key. */
  keys: string;
  run(event: KeyboardEvent): void;
  /** Also while the caret is in a field. Single letters never do. */
  whileWriting?: boolean;
  when?(): boolean;
}

const names: Readonly<Record<string, string>> = { Up: 'ArrowUp', Down: 'ArrowDown', Esc: 'Escape' };

/** The name of what was pressed, in the way shortcuts are written. */
export function pressedKeys(event: KeyboardEvent): string {
  const key = event.key.length === 1 ? event.key.toUpperCase() : event.key;
  return [event.ctrlKey || event.metaKey ? 'Ctrl' : '', event.altKey ? 'Alt' : '', event.shiftKey ? 'Shift' : '', key]
    .filter((part) => part !== '')
    .join('+');
}

function writtenAs(keys: string): string {
  return keys
    .split('+')
    .map((part) => names[part] ?? part)
    .join('+');
}

const isLetter = (keys: string) => /^(Shift\+)?[A-Z]$/.test(keys);

/** Whether the event comes from a place where letters are text. */
export function isWriting(event: KeyboardEvent): boolean {
  const target = event.target;
  if (!(target instanceof HTMLElement)) return false;
  return target.isContentEditable || ['INPUT', 'TEXTAREA', 'SELECT'].includes(target.tagName);
}

/** Keys of a page, for as long as it is there. Nothing acts while a dialog is open. */
export function useShortcuts(shortcuts: readonly Shortcut[]): void {
  const preferences = usePreferencesStore();
  const table = shortcuts.map((shortcut) => ({ ...shortcut, keys: writtenAs(shortcut.keys) }));

  function listen(event: KeyboardEvent): void {
    if (event.defaultPrevented || event.isComposing) return;
    const pressed = pressedKeys(event);
    const found = table.find(
      (shortcut) =>
        shortcut.keys === pressed &&
        (shortcut.when?.() ?? true) &&
        !(isLetter(pressed) && (!preferences.letterKeys || isWriting(event))) &&
        (shortcut.whileWriting === true || !isWriting(event)),
    );
    if (found === undefined || document.querySelector('.q-dialog') !== null) return;
    event.preventDefault();
    found.run(event);
  }

  onMounted(() => window.addEventListener('keydown', listen));
  onBeforeUnmount(() => window.removeEventListener('keydown', listen));
}
