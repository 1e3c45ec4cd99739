import type { Ref } from 'vue';
import { useRouter } from 'vue-router';
import type { SheetCommands } from './sheetContext';
import type { useFocusCell } from './useFocusCell';
import { useShortcuts, type Shortcut } from './useShortcuts';

interface SheetKeys {
  focusing: ReturnType<typeof useFocusCell>;
  writingId: Readonly<Ref<string | undefined>>;
  commands: SheetCommands;
  finding: Ref<boolean>;
  stepOpen(by: 1 | -1): void;
  undo(): void;
  redo(): void;
  report(): { calculationId: string; letter: string } | undefined;
}

/** Whether the focus is at a cell itself, not in a control or an editor within it. */
function atCell(): boolean {
  return document.activeElement?.matches('[data-cell]') ?? false;
}
/** Also while nothing has the focus: Up and Down then begin at the first cell. */
function atCellOrNowhere(): boolean {
  const active = document.activeElement;
  return active === null || active === document.body || active.id === 'work' || atCell();
}

/** The keys of the sheet: at a cell, and anywhere on the page. */
export function useSheetKeys({
  focusing,
  writingId,
  commands,
  finding,
  stepOpen,
  undo,
  redo,
  report,
}: SheetKeys): void {
  const router = useRouter();
  const here = () => focusing.focusedId.value;
  const withCell = (act: (id: string) => void) => () => {
    const id = here();
    if (id !== undefined) act(id);
  };
  const cell = (keys: string, act: (id: string) => void): Shortcut => ({ keys, when: atCell, run: withCell(act) });
  const idle = () => writingId.value === undefined;

  useShortcuts([
    { keys: 'Up', when: atCellOrNowhere, run: () => focusing.step(-1) },
    { keys: 'Down', when: atCellOrNowhere, run: () => focusing.step(1) },
    { keys: 'Ctrl+Up', when: atCellOrNowhere, run: () => focusing.stepSection(-1) },
    { keys: 'Ctrl+Down', when: atCellOrNowhere, run: () => focusing.stepSection(1) },
    cell('Enter', commands.write),
    cell('Ctrl+Enter', commands.openPen),
    { keys: 'Insert', whileWriting: true, run: withCell(commands.openPen) },
    cell('M', commands.askRemark),
    cell('V', commands.markToVerify),
    cell('K', commands.toggleTick),
    { keys: 'N', when: atCellOrNowhere, run: () => stepOpen(1) },
    { keys: 'Shift+N', when: atCellOrNowhere, run: () => stepOpen(-1) },
    cell('Alt+Up', (id) => commands.move(id, -1)),
    cell('Alt+Down', (id) => commands.move(id, 1)),
    cell('Delete', commands.remove),
    { keys: 'Ctrl+Z', when: idle, run: undo },
    { keys: 'Ctrl+Shift+Z', when: idle, run: redo },
    { keys: 'Ctrl+F', whileWriting: true, run: () => (finding.value = true) },
    {
      keys: 'Ctrl+P',
      whileWriting: true,
      run: () => {
        const params = report();
        if (params !== undefined) void router.push({ name: 'report', params });
      },
    },
  ]);
}
