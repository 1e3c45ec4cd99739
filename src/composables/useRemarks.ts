import { computed, shallowRef, watch, type Ref } from 'vue';
import type { Remark } from '#contract';
import * as api from 'src/api/remarks';

/** The remarks of a revision: fetched, asked, answered, closed and reopened. */
export function useRemarks(revisionId: Readonly<Ref<string | undefined>>) {
  const remarks = shallowRef<readonly Remark[]>([]);
  const failure = shallowRef<unknown>();

  async function load(): Promise<void> {
    const id = revisionId.value;
    if (id === undefined) return;
    try {
      const fetched = await api.getRemarks(id);
      if (revisionId.value === id) remarks.value = fetched;
      failure.value = undefined;
    } catch (error) {
      failure.value = error;
    }
  }

  async function ask(cellId: string, text: string): Promise<void> {
    if (revisionId.value !== undefined) remarks.value = await api.askRemark(revisionId.value, { cellId, text });
  }
  async function answer(id: string, text: string): Promise<void> {
    remarks.value = await api.answerRemark(id, { text });
  }
  async function close(id: string): Promise<void> {
    remarks.value = await api.closeRemark(id);
  }
  async function reopen(id: string): Promise<void> {
    remarks.value = await api.reopenRemark(id);
  }

  const open = computed(() => remarks.value.filter((remark) => remark.state !== 'closed'));
  const closed = computed(() => remarks.value.filter((remark) => remark.state === 'closed'));

  watch(
    revisionId,
    () => {
      remarks.value = [];
      void load();
    },
    { immediate: true },
  );
  return { remarks, open, closed, failure, load, ask, answer, close, reopen };
}
