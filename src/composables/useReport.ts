import { computed, onScopeDispose, ref, shallowRef } from 'vue';
import type { CellInput, CellResult } from '#engine';
import type { Remark, RevisionDetail } from '#contract';
import { getCalculation } from 'src/api/calculations';
import { getRemarks } from 'src/api/remarks';
import { getRevisionContent } from 'src/api/revisions';
import { createEngineClient } from 'src/workers/engine-client';
import { backMatterBlocks } from './reportBackMatter';
import { bodyBlocks, numberCells } from './reportBlocks';
import { coverSummary } from './reportCover';

/** Everything that the report of one revision shows: loaded once, computed in the worker, not live. */
export function useReport(calculationId: string, letter: string | undefined) {
  const detail = shallowRef<RevisionDetail>();
  const cells = shallowRef<readonly CellInput[]>([]);
  const remarks = shallowRef<readonly Remark[]>([]);
  const results = shallowRef<ReadonlyMap<string, CellResult>>(new Map());
  const withRemarks = ref(false);
  const failure = ref<unknown>();
  const computing = ref(true);

  const engine = createEngineClient({
    onDelta(delta) {
      const next = new Map(results.value);
      for (const id of delta.removed) next.delete(id);
      for (const cell of delta.cells) next.set(cell.id, cell);
      results.value = next;
      computing.value = false;
    },
    onBusy: () => undefined,
    onFailure(error) {
      failure.value = error;
      computing.value = false;
    },
  });
  onScopeDispose(() => engine.dispose());

  async function load(): Promise<void> {
    failure.value = undefined;
    try {
      const loaded = await getCalculation(calculationId, letter);
      const [content, asked] = await Promise.all([
        getRevisionContent(loaded.revision.id),
        getRemarks(loaded.revision.id),
      ]);
      detail.value = loaded;
      cells.value = content.cells;
      remarks.value = asked;
      engine.update({ settings: content.settings, put: content.cells, order: content.cells.map((cell) => cell.id) });
      if (content.cells.length === 0) computing.value = false;
    } catch (error) {
      failure.value = error;
    }
  }

  const numbered = computed(() => numberCells(cells.value));
  const summary = computed(() => coverSummary(numbered.value, results.value));
  const blocks = computed(() =>
    detail.value === undefined || computing.value
      ? []
      : [
          ...bodyBlocks(numbered.value, results.value),
          ...backMatterBlocks({
            detail: detail.value,
            cells: numbered.value,
            results: results.value,
            remarks: remarks.value,
            withRemarks: withRemarks.value,
          }),
        ],
  );
  return { detail, blocks, summary, remarks, withRemarks, failure, computing, load };
}
