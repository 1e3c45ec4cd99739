import { Router } from 'express';
import { changePersonRequest, createPersonRequest } from '#contract';
import type { ServerContext } from '../services/context';
import { changePerson, createPerson, people } from '../services/people';
import { parameter, route } from './route';

export function peopleRoutes(context: ServerContext): Router {
  const router = Router();
  route(router, {
    method: 'get',
    path: '/people',
    permission: 'administrator',
    handle: ({ account }) => people(context, account),
  });
  route(router, {
    method: 'post',
    path: '/people',
    permission: 'administrator',
    body: createPersonRequest,
    status: 201,
    handle: ({ account, body }) => createPerson(context, account, body),
  });
  route(router, {
    method: 'patch',
    path: '/people/:personId',
    permission: 'administrator',
    body: changePersonRequest,
    handle: ({ account, params, body }) => changePerson(context, account, parameter(params, 'personId'), body),
  });
  return router;
}
