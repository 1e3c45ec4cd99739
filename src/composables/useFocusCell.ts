import { nextTick, ref, type Ref } from 'vue';
import type { SheetCell } from './sheetContext';

/** The element of a cell, for focus and for scrolling to it. */
export function cellElement(id: string): HTMLElement | null {
  return document.getElementById(`cell-${id}`);
}

/** Which cell of the sheet has the focus; the others are passed over by Tab (roving focus). */
export function useFocusCell(cells: Readonly<Ref<readonly SheetCell[]>>) {
  const focusedId = ref<string>();

  const indexOf = (id: string | undefined) => cells.value.findIndex((cell) => cell.id === id);

  /** The focus has come to a cell by itself (pointer, Tab). */
  function attend(id: string): void {
    focusedId.value = id;
  }

  /** Brings focus and sight to a cell. */
  async function focus(id: string): Promise<void> {
    focusedId.value = id;
    await nextTick();
    const element = cellElement(id);
    element?.focus({ preventScroll: true });
    element?.scrollIntoView({ block: 'nearest' });
  }

  function step(by: 1 | -1): void {
    const at = indexOf(focusedId.value);
    const target = cells.value[at < 0 ? 0 : at + by];
    if (target !== undefined) void focus(target.id);
  }

  /** To the head of this section, then of the one before; or to the next section. */
  function stepSection(by: 1 | -1): void {
    const at = Math.max(indexOf(focusedId.value), 0);
    const heads = cells.value.flatMap((cell, index) => (cell.kind === 'section' ? [index] : []));
    const target = by === 1 ? heads.find((index) => index > at) : heads.filter((index) => index < at).at(-1);
    const cell = target === undefined ? undefined : cells.value[target];
    if (cell !== undefined) void focus(cell.id);
  }

  return { focusedId, attend, focus, step, stepSection };
}
