import { computed, ref, shallowRef, watch, type Ref } from 'vue';
import { Notify } from 'quasar';
import type { CellResult } from '#engine';
import { openItems } from './sheetContents';
import type { SheetConnection } from './sheetConnection';
import { provideSheet, type SheetCell, type SheetContext } from './sheetContext';
import { numberCells } from './reportBlocks';
import { useCellCommands } from './useCellCommands';
import { useFocusCell } from './useFocusCell';
import type { useRemarks } from './useRemarks';
import { changedCells, type useRevision } from './useRevision';
import type { useTicks } from './useTicks';

/** Below this the engine counts as idle: nothing on the sheet flickers. */
const patience = 300;

export interface SheetParts {
  revision: ReturnType<typeof useRevision>;
  connection: SheetConnection;
  remarks: ReturnType<typeof useRemarks>;
  ticks: ReturnType<typeof useTicks>;
}

function useWorking(busy: Readonly<Ref<boolean>>): Readonly<Ref<boolean>> {
  const working = ref(false);
  let timer: ReturnType<typeof setTimeout> | undefined;
  watch(busy, (now) => {
    clearTimeout(timer);
    if (!now) working.value = false;
    else timer = setTimeout(() => (working.value = busy.value), patience);
  });
  return working;
}

/** Cells that a cell uses directly, and all that follow from it. */
function trace(id: string | undefined, results: ReadonlyMap<string, CellResult>) {
  const none = { uses: new Set<string>(), follows: new Set<string>() };
  const own = id === undefined ? undefined : results.get(id);
  if (id === undefined || own === undefined) return none;
  const definer = new Map(
    [...results.values()].flatMap((cell) => cell.defines.map((name) => [name, cell.id] as const)),
  );
  const base = (name: string) => definer.get(name) ?? definer.get(name.split('.')[0] ?? name);
  const uses = new Set(own.uses.flatMap((name) => base(name) ?? []));
  const follows = new Set<string>();
  const open = [id];
  for (let current = open.pop(); current !== undefined; current = open.pop()) {
    for (const cell of results.values()) {
      if (cell.id === id || follows.has(cell.id)) continue;
      if (cell.uses.some((name) => base(name) === current)) {
        follows.add(cell.id);
        open.push(cell.id);
      }
    }
  }
  uses.delete(id);
  return { uses, follows };
}

/** Joins revision, shared document, remarks and ticks into what the parts of the sheet share. */
export function useSheet({ revision, connection, remarks, ticks }: SheetParts) {
  const { results, names } = connection;

  const cells = computed<readonly SheetCell[]>(() => {
    let item = 0;
    return numberCells(connection.cells.value).map(({ cell, number }) => ({
      ...cell,
      number,
      tbvNumber: (cell.settings.tbv ?? '') === '' ? undefined : (item += 1),
    }));
  });
  const writable = computed(() => {
    const { kind } = connection.line.value;
    return revision.acts.value.has('content.write') && kind !== 'refused' && kind !== 'waiting';
  });
  const changed = computed<ReadonlySet<string>>(() =>
    revision.before.value === undefined ? new Set() : changedCells(revision.before.value, cells.value),
  );

  const focusing = useFocusCell(cells);
  const askingAt = ref<string>();
  const pointed = shallowRef<{ id: string; pinned: boolean }>();

  async function toggleTick(id: string): Promise<void> {
    if (!revision.acts.value.has('tick.set')) return;
    try {
      await ticks.toggle(id);
    } catch (error) {
      const why = error instanceof Error ? error.message : 'the server did not answer';
      Notify.create({ message: `Not ticked: ${why}`, classes: 'wf-notice caution', timeout: 6000 });
    }
  }
  function askRemark(id: string): void {
    const cell = cells.value.find((each) => each.id === id);
    if (revision.acts.value.has('remark.ask') && cell?.kind !== 'section') askingAt.value = id;
  }

  const acting = useCellCommands({
    connection,
    cells,
    writable,
    focusing,
    askRemark,
    toggleTick: (id) => void toggleTick(id),
  });

  watch(focusing.focusedId, (id) => connection.tell(id, acting.writingId.value === id && id !== undefined));
  watch(writable, (now) => {
    if (!now) acting.commands.leave();
  });
  // A cell that somebody else took away can be neither written nor have the focus.
  watch(cells, (all) => {
    const has = (id: string | undefined) => id === undefined || all.some((cell) => cell.id === id);
    if (!has(acting.writingId.value)) acting.commands.leave();
    if (!has(askingAt.value)) askingAt.value = undefined;
  });

  const traced = computed(() => trace(pointed.value?.id, results.value));
  function point(id: string | undefined, pin = false): void {
    if (pointed.value?.pinned === true && !pin) {
      if (id === undefined || id === pointed.value.id) return;
    }
    pointed.value = id === undefined ? undefined : { id, pinned: pin };
  }
  const definer = computed(
    () => new Map([...results.value.values()].flatMap((cell) => cell.defines.map((name) => [name, cell.id] as const))),
  );
  function cellOfName(name: string): SheetCell | undefined {
    const id = definer.value.get(name) ?? definer.value.get(name.split('.')[0] ?? name);
    return cells.value.find((cell) => cell.id === id);
  }

  const context: SheetContext = {
    letter: computed(() => revision.detail.value?.revision.letter ?? ''),
    cells,
    results,
    names,
    acts: revision.acts,
    writable,
    working: useWorking(connection.busy),
    changed,
    people: connection.people,
    focusedId: focusing.focusedId,
    writingId: acting.writingId,
    traced,
    remarks: remarks.remarks,
    ticks: ticks.ticks,
    tickStateOf: ticks.stateOf,
    changesSinceTick: ticks.changesOf,
    cellOfName,
    point,
    attend: focusing.attend,
    commands: acting.commands,
    shared: {
      textOf: (id) => connection.document.value?.source(id),
      get awareness() {
        return connection.awareness;
      },
      get undoManager() {
        return connection.undoManager;
      },
    },
    registerEditor: acting.registerEditor,
  };
  provideSheet(context);

  /** Cells with something open, in sheet order; for a checker also those that are not ticked. */
  const open = computed(() =>
    openItems(
      cells.value,
      results.value,
      remarks.remarks.value,
      (id) => revision.acts.value.has('tick.set') && ticks.stateOf(id) !== 'ticked',
    ),
  );
  function stepOpen(by: 1 | -1): void {
    const order = cells.value.map((cell) => cell.id);
    const here = order.indexOf(focusing.focusedId.value ?? '');
    const ahead = open.value.filter((id) => (order.indexOf(id) - here) * by > 0);
    const target = by === 1 ? (ahead[0] ?? open.value[0]) : (ahead.at(-1) ?? open.value.at(-1));
    if (target !== undefined) void focusing.focus(target);
  }

  return { ...acting, context, cells, writable, focusing, askingAt, stepOpen, changed };
}
