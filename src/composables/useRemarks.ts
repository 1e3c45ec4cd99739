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

  function put(remark: Remark): void {
    const others = remarks.value.filter(({ id }) => id !== remark.id);
    remarks.value = [...others, remark].sort((a, b) => a.number - b.number);
  }

  async function ask(cellId: string, text: string): Promise<void> {
    if (revisionId.value !== undefined) put(await api.askRemark(revisionId.value, { cellId, text }));
  }
  const answer = async (id: string, text: string) => put(await api.answerRemark(id, { text }));
  const close = async (id: string) => put(await api.closeRemark(id));
  const reopen = async (id: string) => put(await api.reopenRemark(id));

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
