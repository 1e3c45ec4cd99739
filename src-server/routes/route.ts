import type { Request, RequestHandler, Router } from 'express';
import { z, type ZodType } from 'zod';
import type { Account, Act, ProjectAct } from '#contract';
import { ApiError } from '../errors/index';

/** Who may call a route: everybody, everybody signed in, an administrator, or by the access table. */
export type Permission = 'anyone' | 'signed in' | 'administrator' | Act | ProjectAct;

interface RouteDefinition<Body, Query> {
  method: 'get' | 'post' | 'put' | 'patch' | 'delete';
  path: string;
  /** Cannot be left out. Acts of the access table are judged by the service, which reads the object. */
  permission: Permission;
  body?: ZodType<Body>;
  query?: ZodType<Query>;
  status?: number;
  before?: RequestHandler[];
  handle(input: {
    account: Account;
    params: Record<string, string>;
    body: Body;
    query: Query;
    request: Request;
  }): Promise<unknown>;
}

/** Path parameters that are no ids of objects. */
const plainParameters = new Set(['cellId', 'letter']);

function parsed<Output>(schema: ZodType<Output>, given: unknown): Output {
  const result = schema.safeParse(given);
  if (result.success) return result.data;
  const fields = Object.fromEntries(
    result.error.issues.map((issue) => [issue.path.join('.') || 'body', issue.message]),
  );
  const [[field, reason] = ['', '']] = Object.entries(fields);
  throw new ApiError('INVALID_INPUT', `${field}: ${reason}`, fields);
}

function parsedParameters(request: Request): Record<string, string> {
  return Object.fromEntries(
    Object.entries(request.params).map(([name, value]) => {
      const text = String(value);
      if (!plainParameters.has(name) && !z.uuid().safeParse(text).success)
        throw new ApiError('NOT_FOUND', 'There is no such object.');
      return [name, text.slice(0, 100)];
    }),
  );
}

function accountOf(request: Request, permission: Permission): Account {
  if (request.user === undefined) {
    if (permission === 'anyone')
      return { id: '', signInName: '', name: '', initials: '', email: '', administrator: false, active: false };
    throw new ApiError('NOT_SIGNED_IN', 'Sign in first.');
  }
  if (permission === 'administrator' && !request.user.administrator)
    throw new ApiError('FORBIDDEN', 'Only an administrator may do that.');
  return request.user;
}

/** Declares a route: parses, authorises, calls the service, answers JSON. */
export function route<Body = undefined, Query = undefined>(
  router: Router,
  definition: RouteDefinition<Body, Query>,
): void {
  const handler: RequestHandler = async (request, response) => {
    const account = accountOf(request, definition.permission);
    const params = parsedParameters(request);
    const body = definition.body === undefined ? (undefined as Body) : parsed(definition.body, request.body);
    const query = definition.query === undefined ? (undefined as Query) : parsed(definition.query, request.query);
    const answer = await definition.handle({ account, params, body, query, request });
    if (answer === undefined) response.status(definition.status ?? 204).end();
    else response.status(definition.status ?? 200).json(answer);
  };
  // Kept beside the handler, so that a test can hold every declared route to what it declares.
  const declared = Object.assign(handler, { permission: definition.permission });
  router[definition.method](definition.path, ...(definition.before ?? []), declared);
}

/** A path parameter that the route's own path has. */
export const parameter = (params: Record<string, string>, name: string): string => params[name] ?? '';
