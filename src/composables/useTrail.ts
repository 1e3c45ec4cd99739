import { computed, ref, shallowRef, watch } from 'vue';
import type { Project, RegisterRow, TrailEntry } from '#contract';
import { getRegister, getTrail } from 'src/api/projects';
import { useProjectsStore } from 'src/stores/projects';
import { useShellStore } from 'src/stores/shell';
import { kindOf, trailDays, type TrailFilter } from './trailLines';

/** The trail of a project, or of one calculation in it, page by page from the newest. */
export function useTrail(projectId: string, calculationId: () => string | undefined) {
  const projects = useProjectsStore();
  const shell = useShellStore();
  const project = computed<Project | undefined>(() => projects.byId(projectId));
  const calculations = shallowRef<readonly RegisterRow[]>([]);
  const entries = shallowRef<readonly TrailEntry[]>([]);
  const more = ref(false);
  const loading = ref(true);
  const failure = shallowRef<unknown>();
  const filter = ref<TrailFilter>('all');
  let latest = 0;

  async function guarded(work: (mine: number) => Promise<void>): Promise<void> {
    const mine = (latest += 1);
    loading.value = true;
    try {
      await work(mine);
      if (mine === latest) failure.value = undefined;
    } catch (error) {
      if (mine === latest) failure.value = error;
    } finally {
      if (mine === latest) loading.value = false;
    }
  }

  const load = () =>
    guarded(async (mine) => {
      const [known, rows, page] = await Promise.all([
        projects.fetch(projectId),
        getRegister(projectId),
        getTrail(projectId, { calculationId: calculationId() }),
      ]);
      if (mine !== latest) return;
      shell.openProject(known);
      calculations.value = rows;
      entries.value = page.entries;
      more.value = page.more;
    });
  const loadEarlier = () =>
    guarded(async (mine) => {
      const page = await getTrail(projectId, { calculationId: calculationId(), before: entries.value.at(-1)?.id });
      if (mine !== latest) return;
      entries.value = [...entries.value, ...page.entries];
      more.value = page.more;
    });
  watch(calculationId, load);

  const shown = computed(() =>
    entries.value.filter((entry) => filter.value === 'all' || kindOf(entry) === filter.value),
  );
  const days = computed(() => trailDays(shown.value));
  return { project, calculations, entries, shown, days, more, loading, failure, filter, load, loadEarlier };
}
