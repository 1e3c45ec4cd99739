import { ref, watch } from 'vue';
import { defineStore } from 'pinia';

export interface ShellProject {
  id: string;
  number: string;
  title: string;
}
export interface ShellSheet {
  /** Of the calculation; where the word "Sheet" of the spine leads. */
  calculationId: string;
  letter: string;
  number: string;
  title: string;
}

const place = 'wallflux.shell';

/** The spine as it was before the page was loaded anew; for this tab only. */
function kept(): { project: ShellProject | null; sheet: ShellSheet | null } {
  try {
    const { project = null, sheet = null } = JSON.parse(sessionStorage.getItem(place) ?? '{}') as {
      project?: ShellProject | null;
      sheet?: ShellSheet | null;
    };
    return { project, sheet };
  } catch {
    return { project: null, sheet: null };
  }
}

function keep(project: ShellProject | null, sheet: ShellSheet | null): void {
  try {
    sessionStorage.setItem(place, JSON.stringify({ project, sheet }));
  } catch {
    // Storage is shut: the spine fills again with the next page of a project.
  }
}

/** What the binder's spine shows: the project at hand and the sheet that was open last in it. */
export const useShellStore = defineStore('shell', () => {
  const before = kept();
  const project = ref<ShellProject | null>(before.project);
  const sheet = ref<ShellSheet | null>(before.sheet);
  /** How many frames on the page fill the side leaf: 0 or 1, two for a moment while pages change. */
  const leafUsers = ref(0);
  /** Whether the folded leaf (below 1024 px) or the phone's menu is open. */
  const leafOpen = ref(false);
  const keysShown = ref(false);

  /** Every page of a project calls this as soon as it knows which. */
  function openProject({ id, number, title }: ShellProject): void {
    if (project.value?.id !== id) sheet.value = null;
    project.value = { id, number, title };
  }

  /** The sheet, its report and its trail call this, so that the spine leads back. */
  function openSheet({ calculationId, letter, number, title }: ShellSheet): void {
    sheet.value = { calculationId, letter, number, title };
  }

  function close(): void {
    project.value = null;
    sheet.value = null;
    leafOpen.value = false;
  }

  watch([project, sheet], () => keep(project.value, sheet.value));

  return { project, sheet, leafUsers, leafOpen, keysShown, openProject, openSheet, close };
});
