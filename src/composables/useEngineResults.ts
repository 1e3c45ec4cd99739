import { onScopeDispose, ref, shallowRef } from 'vue';
import type { CellResult, NamedValue } from '#engine';
import type { CalculationDocument } from '#document';
import { createEngineClient } from 'src/workers/engine-client';

/** Results of a shared calculation, computed in a worker and kept up with every change. */
export function useEngineResults(document: CalculationDocument) {
  const results = shallowRef<ReadonlyMap<string, CellResult>>(new Map());
  const names = shallowRef<readonly NamedValue[]>([]);
  const busy = ref(false);
  const failure = shallowRef<unknown>();

  const engine = createEngineClient({
    onDelta(delta) {
      const next = new Map(results.value);
      for (const id of delta.removed) next.delete(id);
      for (const cell of delta.cells) next.set(cell.id, cell);
      results.value = next;
      names.value = delta.names;
      failure.value = undefined;
    },
    onBusy(now) {
      busy.value = now;
    },
    onFailure(error) {
      failure.value = error;
    },
  });
  const cells = document.cells();
  engine.update({ settings: document.settings(), put: cells, order: cells.map((cell) => cell.id) });
  const endObserving = document.observe((change) => engine.update(change));
  onScopeDispose(() => {
    endObserving();
    engine.dispose();
  });
  return { results, names, busy, failure };
}
