import { ref } from 'vue';
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

/** What the binder's spine shows: the project at hand and the sheet that was open last in it. */
export const useShellStore = defineStore('shell', () => {
  const project = ref<ShellProject | null>(null);
  const sheet = ref<ShellSheet | null>(null);
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

  return { project, sheet, leafUsers, leafOpen, keysShown, openProject, openSheet, close };
});
