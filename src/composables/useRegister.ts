import { computed, ref, shallowRef, watch } from 'vue';
import { storeToRefs } from 'pinia';
import type { RegisterRow } from '#contract';
import { getRegister } from 'src/api/projects';
import { soon } from './soon';
import { useNotices } from './useNotices';
import { useProjectsStore } from 'src/stores/projects';
import { useSessionStore } from 'src/stores/session';
import { useShellStore } from 'src/stores/shell';
import {
  groupLetters,
  matches,
  passesFilter,
  registerFilters,
  registerLines,
  type RegisterFilter,
  type RegisterSort,
} from './registerLines';

/** A project's list of calculations: fetched, filtered, sought through, sorted, grouped. */
export function useRegister(projectId: string) {
  const projects = useProjectsStore();
  const shell = useShellStore();
  const { person } = storeToRefs(useSessionStore());

  const project = computed(() => projects.byId(projectId));
  const rows = shallowRef<readonly RegisterRow[]>([]);
  const failure = shallowRef<unknown>();
  const loading = ref(true);
  const filter = ref<RegisterFilter>('all');
  const sought = ref('');
  const sort = ref<RegisterSort>({ column: 'number', descending: false });

  async function load(): Promise<void> {
    loading.value = true;
    try {
      const [, fetched] = await Promise.all([projects.fetch(projectId), getRegister(projectId)]);
      rows.value = fetched;
      failure.value = undefined;
    } catch (error) {
      failure.value = error;
    } finally {
      loading.value = false;
    }
  }
  watch(
    project,
    (known) => {
      if (known !== undefined) shell.openProject(known);
    },
    { immediate: true },
  );

  // What others do shows at once; many notices in a row are one fetch.
  const refresh = soon(load);
  useNotices({ projectId }, (notice) => {
    if (notice === undefined || ['register', 'revision', 'remarks', 'ticks', 'access'].includes(notice.about))
      refresh();
  });

  const who = computed(() => ({
    initials: person.value?.initials ?? '',
    checks: project.value?.role === 'checker',
  }));
  const counts = computed(
    () =>
      Object.fromEntries(
        registerFilters.map((name) => [name, rows.value.filter((row) => passesFilter(row, name, who.value)).length]),
      ) as Record<RegisterFilter, number>,
  );
  const letters = computed(() => groupLetters(rows.value));
  const lines = computed(() =>
    registerLines(
      rows.value.filter((row) => passesFilter(row, filter.value, who.value) && matches(row, sought.value.trim())),
      sort.value,
      letters.value,
    ),
  );
  return { project, rows, lines, counts, filter, sought, sort, failure, loading, load };
}
