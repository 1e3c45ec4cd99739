import { computed, ref, shallowRef } from 'vue';
import { ApiError } from 'src/api/api-error';

/**
 * One call to the server with its state: `busy`, `data`, and `failure` with sentences by field. A
 * second `run` before the first has answered makes the first one's answer not count.
 */
export function useApiCall<Arguments extends unknown[], Data>(call: (...args: Arguments) => Promise<Data>) {
  const data = shallowRef<Data>();
  const failure = shallowRef<unknown>();
  const busy = ref(false);
  let latest = 0;

  async function run(...args: Arguments): Promise<Data | undefined> {
    const mine = (latest += 1);
    busy.value = true;
    try {
      const answer = await call(...args);
      if (mine !== latest) return undefined;
      data.value = answer;
      failure.value = undefined;
      return answer;
    } catch (error) {
      if (mine === latest) failure.value = error;
      return undefined;
    } finally {
      if (mine === latest) busy.value = false;
    }
  }

  const fields = computed(() => (failure.value instanceof ApiError ? failure.value.fields : {}));
  /** The sentence for the person, unless it already stands at a field. */
  const sentence = computed(() => {
    if (failure.value === undefined || Object.keys(fields.value).length > 0) return '';
    return failure.value instanceof Error ? failure.value.message : 'the server did not answer';
  });
  return { data, failure, busy, run, fields, sentence };
}
