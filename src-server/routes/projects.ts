import { Router } from 'express';
import {
  changeProjectRequest,
  createCalculationRequest,
  createProjectRequest,
  setMemberRequest,
  trailQuery,
} from '#contract';
import { authorizeProject } from '../services/access';
import { createCalculation, register } from '../services/calculations';
import type { ServerContext } from '../services/context';
import { listExamples } from '../services/examples';
import { changeProject, createProject, dropMember, projectById, projectsOf, putMember } from '../services/projects';
import type { Summaries } from '../services/summaries';
import { trailPageOf } from '../services/trail';
import { parameter, route } from './route';

export function projectRoutes(context: ServerContext, summaries: Summaries): Router {
  const router = Router();
  const id = (params: Record<string, string>) => parameter(params, 'projectId');
  route(router, {
    method: 'get',
    path: '/projects',
    permission: 'signed in',
    handle: ({ account }) => projectsOf(context, account),
  });
  route(router, {
    method: 'post',
    path: '/projects',
    permission: 'administrator',
    body: createProjectRequest,
    status: 201,
    handle: ({ account, body }) => createProject(context, account, body),
  });
  route(router, {
    method: 'get',
    path: '/projects/:projectId',
    permission: 'project.read',
    handle: ({ account, params }) => projectById(context, account, id(params)),
  });
  route(router, {
    method: 'patch',
    path: '/projects/:projectId',
    permission: 'project.manage',
    body: changeProjectRequest,
    handle: ({ account, params, body }) => changeProject(context, account, id(params), body),
  });
  route(router, {
    method: 'put',
    path: '/projects/:projectId/members/:personId',
    permission: 'project.manage',
    body: setMemberRequest,
    handle: ({ account, params, body }) =>
      putMember(context, account, id(params), parameter(params, 'personId'), body.role),
  });
  route(router, {
    method: 'delete',
    path: '/projects/:projectId/members/:personId',
    permission: 'project.manage',
    handle: ({ account, params }) => dropMember(context, account, id(params), parameter(params, 'personId')),
  });
  route(router, {
    method: 'get',
    path: '/projects/:projectId/calculations',
    permission: 'project.read',
    handle: ({ account, params }) => register(context, account, id(params)),
  });
  route(router, {
    method: 'post',
    path: '/projects/:projectId/calculations',
    permission: 'calculation.create',
    body: createCalculationRequest,
    status: 201,
    handle: ({ account, params, body }) => createCalculation(context, summaries, account, id(params), body),
  });
  route(router, {
    method: 'get',
    path: '/projects/:projectId/trail',
    permission: 'project.read',
    query: trailQuery,
    async handle({ account, params, query }) {
      await authorizeProject(context.db, account, id(params), 'project.read');
      return trailPageOf(context.db, id(params), query);
    },
  });
  route(router, {
    method: 'get',
    path: '/examples',
    permission: 'signed in',
    handle: () => Promise.resolve(listExamples()),
  });
  return router;
}
