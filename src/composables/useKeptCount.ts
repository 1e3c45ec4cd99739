import { computed, ref } from 'vue';

/** Counts own changes that the server has not kept yet, from what was sent and what it says it kept. */
export function useKeptCount() {
  /** Written while there was no line; goes over with the first exchange when it comes back. */
  const offline = ref(0);
  /** Messages sent on this line, and how many of them are kept: the server counts the same ones. */
  const sent = ref(0);
  const kept = ref(0);
  const keptAt = ref<number>();
  const joined = ref(0);
  const waiting = computed(() => offline.value + Math.max(0, sent.value - kept.value));

  return {
    waiting,
    /** When the server last kept everything, in ms. */
    keptAt,
    /** How many changes joined when the line last came back. */
    joined,
    written(online: boolean) {
      if (online) sent.value += 1;
      else offline.value += 1;
    },
    lineOpened() {
      sent.value = 0;
      kept.value = 0;
    },
    /** What was on its way when the line broke may be lost there; the first exchange sends it again. */
    lineBroke() {
      offline.value += Math.max(0, sent.value - kept.value);
      sent.value = 0;
      kept.value = 0;
    },
    told(updates: number, first: boolean, at: number) {
      kept.value = updates;
      if (first && offline.value > 0) {
        joined.value = offline.value;
        offline.value = 0;
      }
      if (waiting.value === 0) keptAt.value = at;
    },
  };
}
