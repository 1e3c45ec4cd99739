import { z } from 'zod';
import {
  exampleEntry,
  project,
  registerRow,
  revisionDetail,
  trailPage,
  type ChangeProjectRequest,
  type CreateCalculationRequest,
  type CreateProjectRequest,
  type ExampleEntry,
  type Project,
  type RegisterRow,
  type RevisionDetail,
  type SetMemberRequest,
  type TrailPage,
} from '#contract';
import { command, request } from './client';

export const getProjects = (): Promise<Project[]> => request(z.array(project), 'GET', '/projects');
export const getProject = (id: string): Promise<Project> => request(project, 'GET', `/projects/${id}`);
export const createProject = (body: CreateProjectRequest): Promise<Project> =>
  request(project, 'POST', '/projects', { body });
export const changeProject = (id: string, body: ChangeProjectRequest): Promise<Project> =>
  request(project, 'PATCH', `/projects/${id}`, { body });

export const setMember = (projectId: string, personId: string, body: SetMemberRequest): Promise<void> =>
  command('PUT', `/projects/${projectId}/members/${personId}`, body);
export const removeMember = (projectId: string, personId: string): Promise<void> =>
  command('DELETE', `/projects/${projectId}/members/${personId}`);

export const getRegister = (projectId: string): Promise<RegisterRow[]> =>
  request(z.array(registerRow), 'GET', `/projects/${projectId}/calculations`);
export const createCalculation = (projectId: string, body: CreateCalculationRequest): Promise<RevisionDetail> =>
  request(revisionDetail, 'POST', `/projects/${projectId}/calculations`, { body });
export const getExamples = (): Promise<ExampleEntry[]> => request(z.array(exampleEntry), 'GET', '/examples');

/** Newest first; `before` is the id of the oldest entry that is already there. */
export const getTrail = (
  projectId: string,
  query: { calculationId?: string | undefined; before?: number | undefined } = {},
): Promise<TrailPage> => request(trailPage, 'GET', `/projects/${projectId}/trail`, { query });
