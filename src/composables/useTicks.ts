import { shallowRef, watch, type Ref } from 'vue';
import type { Tick } from '#contract';
import type { CellResult } from '#engine';
import { ApiError } from 'src/api/api-error';
import * as api from 'src/api/ticks';
import type { TickState } from './sheetContext';

/** What has changed between what a tick stood for and what is there now, a sentence a value. */
export function changesBetween(
  before: Readonly<Record<string, string>>,
  now: Readonly<Record<string, string>>,
): string[] {
  const names = [...new Set([...Object.keys(before), ...Object.keys(now)])];
  return names.flatMap((name) => {
    const was = before[name];
    const is = now[name];
    if (was === is) return [];
    if (was === undefined) return [`${name} is used now: ${is ?? ''}`];
    return is === undefined ? [`${name} is no longer used`] : [`${name} was ${was}, is ${is}`];
  });
}

/** The ticks of a revision and whether each still stands for what the sheet says. */
export function useTicks(
  revisionId: Readonly<Ref<string | undefined>>,
  results: Readonly<Ref<ReadonlyMap<string, CellResult>>>,
) {
  const ticks = shallowRef<ReadonlyMap<string, Tick>>(new Map());
  const failure = shallowRef<unknown>();

  function put(all: readonly Tick[]): void {
    ticks.value = new Map(all.map((tick) => [tick.cellId, tick]));
  }

  async function load(): Promise<void> {
    const id = revisionId.value;
    if (id === undefined) return;
    try {
      const fetched = await api.getTicks(id);
      if (revisionId.value === id) put(fetched);
      failure.value = undefined;
    } catch (error) {
      failure.value = error;
    }
  }

  function stateOf(cellId: string): TickState {
    const tick = ticks.value.get(cellId);
    if (tick === undefined) return 'none';
    const result = results.value.get(cellId);
    // Until the sheet is computed a tick counts as it was given.
    return result === undefined || result.fingerprint === tick.fingerprint ? 'ticked' : 'changed';
  }

  function changesOf(cellId: string): string[] {
    const tick = ticks.value.get(cellId);
    const result = results.value.get(cellId);
    if (tick === undefined || result === undefined) return [];
    const values = changesBetween(tick.dependsOn, result.dependsOn);
    return values.length > 0 ? values : ['what the cell says'];
  }

  /** Ticks, ticks again what has changed, or takes a tick back. Throws ApiError; on a conflict it fetches first. */
  async function toggle(cellId: string): Promise<void> {
    const id = revisionId.value;
    const result = results.value.get(cellId);
    if (id === undefined || result === undefined) return;
    try {
      const ticked = stateOf(cellId) === 'ticked';
      put(
        ticked ? await api.removeTick(id, cellId) : await api.setTick(id, cellId, { fingerprint: result.fingerprint }),
      );
    } catch (error) {
      if (error instanceof ApiError && error.status === 409) await load();
      throw error;
    }
  }

  watch(
    revisionId,
    () => {
      ticks.value = new Map();
      void load();
    },
    { immediate: true },
  );
  return { ticks, failure, load, stateOf, changesOf, toggle };
}
