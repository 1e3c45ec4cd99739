import { computed, type Ref } from 'vue';
import type { SheetCell } from './sheetContext';
import type { SheetConnection } from './sheetConnection';
import { tickable } from './sheetContents';
import type { useRemarks } from './useRemarks';
import type { useTicks } from './useTicks';

const why = (failure: unknown) => (failure instanceof Error ? failure.message : 'the server did not answer');

/** What title block and state line say: ticks, what is kept, and what could not be fetched or computed. */
export function useSheetState(
  cells: Readonly<Ref<readonly SheetCell[]>>,
  connection: SheetConnection,
  remarks: ReturnType<typeof useRemarks>,
  ticks: ReturnType<typeof useTicks>,
) {
  const { line, engineFailure } = connection;

  const counted = computed(() => tickable(cells.value));
  const total = computed(() => counted.value.length);
  const ticked = computed(() => counted.value.filter((cell) => ticks.stateOf(cell.id) === 'ticked').length);

  const keptWords = computed(() => {
    const { kind, waiting, keptAt } = line.value;
    if (kind === 'offline' || kind === 'not kept') return 'not kept yet';
    if (waiting > 0) return 'being kept';
    return keptAt === undefined ? '' : 'all kept';
  });
  /** Nothing is signed while the server has not everything that is on the screen. */
  const notNow = computed(() => line.value.kind === 'offline' || line.value.waiting > 0);

  const problem = computed(() => {
    if (engineFailure.value !== undefined) return `The sheet could not be computed: ${why(engineFailure.value)}`;
    const failure = remarks.failure.value ?? ticks.failure.value;
    return failure === undefined ? '' : `Remarks and ticks could not be fetched: ${why(failure)}`;
  });
  function reload(): void {
    void remarks.load();
    void ticks.load();
  }
  return { total, ticked, keptWords, notNow, problem, reload };
}
