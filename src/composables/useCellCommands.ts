import { computed, nextTick, ref, type Ref } from 'vue';
import { Notify } from 'quasar';
import type { CellKind, CellSettings } from '#engine';
import type { SheetConnection } from './sheetConnection';
import type { SheetCell, SheetCommands } from './sheetContext';
import { fluidBegin } from './sourceSymbols';
import { freeName } from './penLine';
import { cellElement, type useFocusCell } from './useFocusCell';

interface Surroundings {
  connection: SheetConnection;
  cells: Readonly<Ref<readonly SheetCell[]>>;
  writable: Readonly<Ref<boolean>>;
  focusing: ReturnType<typeof useFocusCell>;
  askRemark(id: string): void;
  toggleTick(id: string): void;
}

/** What a new cell begins with when nothing else is said. */
function beginning(kind: CellKind, cells: readonly SheetCell[]): { source: string; settings: CellSettings } {
  if (kind === 'fluid')
    return { source: fluidBegin.state, settings: { name: freeName(cells, 'w'), substance: 'water', mode: 'state' } };
  if (kind === 'relation') return { source: '', settings: { name: freeName(cells, 'rel') } };
  return { source: '', settings: {} };
}

/** The acts on cells, and the two modes of the sheet: at a cell, and writing. */
export function useCellCommands({ connection, cells, writable, focusing, askRemark, toggleTick }: Surroundings) {
  const writingId = ref<string>();
  /** After which cell a pen line is opened; undefined = only the one at the end. */
  const penAfter = ref<string | null>();
  const choosing = ref<{ replace: string } | { after: string | null }>();
  const verifying = ref<string>();
  let editorInsert: ((text: string) => void) | undefined;

  const document = () => (writable.value ? connection.document.value : undefined);
  const at = (id: string) => cells.value.findIndex((cell) => cell.id === id);
  const cellOf = (id: string) => cells.value.find((cell) => cell.id === id);
  const penAtEnd = computed(() => penAfter.value === undefined);

  function write(id: string): void {
    if (document() === undefined || cellOf(id) === undefined) return;
    if (writingId.value === id) {
      cellElement(id)?.querySelector<HTMLElement>('.cm-content')?.focus();
      return;
    }
    penAfter.value = undefined;
    focusing.attend(id);
    writingId.value = id;
    connection.tell(id, true);
  }
  function leave(): void {
    const id = writingId.value;
    if (id === undefined) return;
    writingId.value = undefined;
    connection.tell(id, false);
    void nextTick(() => (focusing.focusedId.value === id ? focusing.focus(id) : undefined));
  }
  async function openPen(after: string | null): Promise<void> {
    if (document() === undefined) return;
    if (writingId.value !== undefined) connection.tell(writingId.value, false);
    writingId.value = undefined;
    const last = cells.value.at(-1)?.id ?? null;
    // An empty sheet has no pen line at its end: there it is opened on top.
    penAfter.value = last !== null && after === last ? undefined : after;
    await nextTick();
    const pens = [...window.document.querySelectorAll<HTMLElement>('[data-pen]')];
    const pen = penAfter.value === undefined ? pens.at(-1) : pens[0];
    pen?.querySelector('input')?.focus();
    pen?.scrollIntoView({ block: 'nearest' });
  }
  function closePen(): void {
    const after = penAfter.value;
    penAfter.value = undefined;
    const back = after ?? focusing.focusedId.value ?? cells.value.at(-1)?.id;
    if (back !== undefined && back !== null) void focusing.focus(back);
  }

  function insert(kind: CellKind, after: string | null, source?: string, settings?: CellSettings): string | undefined {
    const begin = beginning(kind, cells.value);
    return document()?.insertCell({
      kind,
      after,
      source: source ?? begin.source,
      settings: { ...begin.settings, ...settings },
    });
  }
  /** A word on the pen line: a new cell of that kind, open for writing; a relation is chosen first. */
  function beginKind(kind: CellKind, after: string | null): void {
    if (kind === 'relation') {
      choosing.value = { after };
      return;
    }
    const id = insert(kind, after);
    if (id !== undefined) void nextTick(() => write(id));
  }

  function move(id: string, by: -1 | 1): void {
    const index = at(id);
    const after = by === 1 ? cells.value[index + 1]?.id : cells.value[index - 2]?.id;
    if (index < 0 || (by === 1 && after === undefined) || (by === -1 && index === 0)) return;
    document()?.moveCell(id, after ?? null);
    void focusing.focus(id);
  }
  function moveAfter(id: string, after: string | null): void {
    document()?.moveCell(id, after);
    void focusing.focus(id);
  }
  function duplicate(id: string): void {
    const copy = document()?.duplicateCell(id);
    if (copy !== undefined) void nextTick(() => focusing.focus(copy));
  }
  function remove(id: string): void {
    const shared = document();
    const cell = cellOf(id);
    if (shared === undefined || cell === undefined) return;
    const next = cells.value[at(id) + 1] ?? cells.value[at(id) - 1];
    if (writingId.value === id) leave();
    connection.undoManager?.stopCapturing();
    shared.removeCell(id);
    connection.undoManager?.stopCapturing();
    if (next !== undefined) void focusing.focus(next.id);
    Notify.create({
      message: `Cell ${cell.number} is deleted.`,
      classes: 'wf-notice',
      timeout: 8000,
      actions: [{ label: 'Undo', noCaps: true, color: 'primary', handler: () => connection.undo() }],
    });
  }
  function replaceSource(id: string, from: number, to: number, text: string): void {
    const shared = document();
    const source = shared?.source(id);
    if (shared === undefined || source === undefined || to > source.length) return;
    shared.transact(() => {
      source.delete(from, to - from);
      source.insert(from, text);
    });
  }
  function insertName(name: string): void {
    if (editorInsert !== undefined) {
      editorInsert(name);
      return;
    }
    void navigator.clipboard?.writeText(name).then(
      () =>
        Notify.create({ message: `${name} is copied; put it where you write.`, classes: 'wf-notice', timeout: 3000 }),
      () => undefined,
    );
  }

  const commands: SheetCommands = {
    focus: (id) => void focusing.focus(id),
    write,
    leave,
    openPen: (after) => void openPen(after),
    closePen,
    insert,
    move,
    moveAfter,
    duplicate,
    remove,
    setSetting: (id, key, value) => document()?.setCellSetting(id, key, value),
    replaceSource,
    markToVerify: (id) => (verifying.value = writable.value ? id : undefined),
    chooseRelation: (id) => (choosing.value = writable.value ? { replace: id } : undefined),
    insertName,
    askRemark,
    toggleTick,
  };
  const registerEditor = (insertText: ((text: string) => void) | undefined) => (editorInsert = insertText);
  return { commands, writingId, penAfter, penAtEnd, choosing, verifying, beginKind, registerEditor };
}
