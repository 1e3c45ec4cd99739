import { ref } from 'vue';
import { defineStore } from 'pinia';
import type { ChangeProjectRequest, CreateProjectRequest, Project } from '#contract';
import * as api from 'src/api/projects';

/** The projects of the person who is signed in. */
export const useProjectsStore = defineStore('projects', () => {
  const projects = ref<Project[]>([]);
  const loaded = ref(false);

  async function load(): Promise<void> {
    projects.value = await api.getProjects();
    loaded.value = true;
  }

  function put(project: Project): Project {
    const index = projects.value.findIndex(({ id }) => id === project.id);
    if (index < 0) projects.value.push(project);
    else projects.value[index] = project;
    return project;
  }

  const byId = (id: string) => projects.value.find((project) => project.id === id);
  const fetch = async (id: string): Promise<Project> => put(await api.getProject(id));
  const create = async (request: CreateProjectRequest): Promise<Project> => put(await api.createProject(request));
  const change = async (id: string, request: ChangeProjectRequest): Promise<Project> =>
    put(await api.changeProject(id, request));

  function clear(): void {
    projects.value = [];
    loaded.value = false;
  }

  return { projects, loaded, load, byId, fetch, create, change, clear };
});
