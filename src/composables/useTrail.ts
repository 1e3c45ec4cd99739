import { computed, ref, shallowRef, watch } from 'vue';
import type { Project, RegisterRow, TrailEntry } from '#contract';
import { getRegister, getTrail } from 'src/api/projects';
import { useProjectsStore } from 'src/stores/projects';
import { useShellStore } from 'src/stores/shell';
import { soon } from './soon';
import { useNotices } from './useNotices';
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

  /** New entries on top of those that are there; earlier pages stay. */
  const loadNew = () =>
    guarded(async (mine) => {
      const page = await getTrail(projectId, { calculationId: calculationId() });
      const newest = entries.value[0]?.id ?? 0;
      const fresh = page.entries.filter(({ id }) => id > newest);
      if (mine !== latest) return;
      // More came than one page holds: what lies between is missing, so begin anew.
      if (fresh.length === page.entries.length && page.more) more.value = true;
      entries.value = fresh.length === page.entries.length ? fresh : [...fresh, ...entries.value];
    });
  const refresh = soon(loadNew);
  useNotices({ projectId }, (notice) => {
    if (notice === undefined || notice.about === 'trail') refresh();
  });

  const shown = computed(() =>
    entries.value.filter((entry) => filter.value === 'all' || kindOf(entry) === filter.value),
  );
  const days = computed(() => trailDays(shown.value));
  return { project, calculations, entries, shown, days, more, loading, failure, filter, load, loadEarlier };
}
