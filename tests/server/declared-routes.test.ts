import { randomUUID } from 'node:crypto';
import type { Router } from 'express';
import { Passport } from 'passport';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import {
  acts,
  may,
  mayInProject,
  projectActs,
  type Act,
  type ProjectAct,
  type Remark,
  type RevisionDetail,
} from '#contract';
import { calculationRoutes } from '../../src-server/routes/calculations';
import { peopleRoutes } from '../../src-server/routes/people';
import { projectRoutes } from '../../src-server/routes/projects';
import { revisionRoutes } from '../../src-server/routes/revisions';
import type { Permission } from '../../src-server/routes/route';
import { sessionRoutes } from '../../src-server/routes/session';
import type { ServerContext } from '../../src-server/services/context';
import type { Summaries } from '../../src-server/services/summaries';
import {
  calculationIn,
  startTestServer,
  testPassword,
  type Answer,
  type Part,
  type TestServer,
} from '../helpers/server';

interface Declared {
  method: string;
  path: string;
  permission: Permission | undefined;
}

/** Every route that the product declares, read from its routers; they need no database to be made. */
function declaredRoutes(): Declared[] {
  const context = {} as ServerContext;
  const summaries = {} as Summaries;
  const routers: Router[] = [
    sessionRoutes(context, new Passport() as never),
    peopleRoutes(context),
    projectRoutes(context, summaries),
    calculationRoutes(context, summaries),
    revisionRoutes(context, summaries),
  ];
  return routers.flatMap((router) =>
    router.stack.flatMap(({ route }) => {
      if (route === undefined) return [];
      const permission = route.stack
        .map((layer): unknown => Reflect.get(layer.handle, 'permission'))
        .find((value) => value !== undefined);
      const [layer] = route.stack;
      return [{ method: (layer?.method ?? '').toUpperCase(), path: route.path, permission: permission as Permission }];
    }),
  );
}

const routes = declaredRoutes();
const cases = (some: readonly Declared[]) => some.map((route): [string, Declared] => [nameOf(route), route]);
const nameOf = ({ method, path }: Declared) => `${method} ${path}`;
const signing = { password: testPassword, contentFingerprint: 'not what is shown' };

/** A body that is in order, for each route that takes one. */
const bodies: Readonly<Record<string, unknown>> = {
  'POST /people': {
    signInName: 'declared',
    name: 'D. Eclared',
    initials: 'DE',
    email: 'd@test.example',
    password: testPassword,
  },
  'PATCH /people/:personId': { name: 'P. Renamed' },
  'POST /projects': { number: '9100', title: 'Declared' },
  'PATCH /projects/:projectId': { title: 'Trial plant, renamed' },
  'PUT /projects/:projectId/members/:personId': { role: 'reader' },
  'POST /projects/:projectId/calculations': { title: 'Declared', start: { from: 'empty' } },
  'PATCH /calculations/:calculationId': { title: 'Renamed' },
  'POST /revisions/:revisionId/hand-over': signing,
  'POST /revisions/:revisionId/return': { reason: 'Tried out' },
  'POST /revisions/:revisionId/check': signing,
  'POST /revisions/:revisionId/lock': { ...signing, changeNote: 'Tried out' },
  'POST /revisions/:revisionId/remarks': { cellId: 'c21', text: 'A question' },
  'POST /remarks/:remarkId/answers': { text: 'An answer' },
  'PUT /revisions/:revisionId/ticks/:cellId': { fingerprint: 'not what is shown' },
};

let server: TestServer;
let detail: RevisionDetail;
let remarkId = '';
/** Somebody whom no other test needs. */
let spareId = '';

beforeAll(async () => {
  server = await startTestServer();
  detail = await calculationIn(server, 'for check');
  const asked = await server.client.checker.post<Remark[]>(`/revisions/${detail.revision.id}/remarks`, {
    cellId: 'c21',
    text: 'Which source?',
  });
  remarkId = asked.body[0]?.id ?? '';
  const spare = await server.client.administrator.post<{ id: string }>('/people', {
    signInName: 'spare',
    name: 'S. Pare',
    initials: 'SP',
    email: 'spare@test.example',
    password: testPassword,
  });
  spareId = spare.body.id;
});
afterAll(() => server.close());

/** The path with the ids of the trial project, or with such as nobody has. */
function filled(path: string, foreign = true): string {
  const ids: Record<string, string> = {
    projectId: server.projectId,
    calculationId: detail.calculation.id,
    revisionId: detail.revision.id,
    remarkId,
    personId: spareId,
  };
  return path
    .replace(':cellId', 'c21')
    .replace(/:(\w+)/g, (_, name: string) => (foreign ? (ids[name] ?? '') : randomUUID()));
}

const call = (route: Declared, part: Part | 'nobody', path = filled(route.path)): Promise<Answer> => {
  const client = part === 'nobody' ? server.nobody : server.client[part];
  return client.send(route.method, `/api${path}`, bodies[nameOf(route)] ?? (route.method === 'POST' ? {} : undefined));
};
const codeOf = ({ body, status }: Answer): string =>
  status < 400 ? '' : (body as { error: { code: string } }).error.code;

const isAct = (permission: Permission | undefined): permission is Act => acts.some((act) => act === permission);
const isProjectAct = (permission: Permission | undefined): permission is ProjectAct =>
  projectActs.some((act) => act === permission);
const ofObjects = routes.filter(({ permission }) => isAct(permission) || isProjectAct(permission));

describe('every declared route', () => {
  it('is known to this test, with a permission; only signing in goes without', () => {
    expect(routes.length).toBeGreaterThan(30);
    const without = routes.filter(({ permission }) => permission === undefined).map(nameOf);
    expect(without).toEqual(['POST /session']);
    const taking = routes.filter(({ method }) => method === 'PUT' || method === 'PATCH').map(nameOf);
    expect(taking.filter((name) => bodies[name] === undefined)).toEqual([]);
  });

  it.each(cases(routes.filter(({ permission }) => permission !== undefined)))(
    '%s asks who is there',
    async (_name, route) => {
      const answer = await call(route, 'nobody');
      expect([answer.status, codeOf(answer)]).toEqual([401, 'NOT_SIGNED_IN']);
    },
  );

  it.each(cases(ofObjects))('%s shows strangers nothing, not even that it is there', async (_name, route) => {
    const answer = await call(route, 'stranger');
    expect([answer.status, codeOf(answer)]).toEqual([404, 'NOT_FOUND']);
    const absent = await call(route, 'stranger', filled(route.path, false));
    expect(answer).toMatchObject({ status: absent.status, body: absent.body });
  });

  it.each(cases(routes.filter(({ permission }) => permission === 'administrator')))(
    '%s is for administrators',
    async (_name, route) => {
      for (const part of ['engineer', 'checker', 'lead', 'reader', 'stranger'] as const) {
        const answer = await call(route, part);
        expect([part, answer.status, codeOf(answer)]).toEqual([part, 403, 'FORBIDDEN']);
      }
      expect((await call(route, 'administrator')).status).toBeLessThan(300);
    },
  );

  it.each(cases(ofObjects))('%s holds every role to its permission', async (_name, route) => {
    const { permission } = route;
    for (const role of ['reader', 'lead', 'checker', 'engineer'] as const) {
      const allowed = isAct(permission)
        ? may(role, permission, 'for check')
        : isProjectAct(permission) && mayInProject(role, permission);
      // Reached, and then stopped for another reason than who asks: that is not looked at here.
      if (allowed) continue;
      const answer = await call(route, role);
      const inOtherState =
        isAct(permission) && ['draft', 'checked', 'locked'].some((state) => may(role, permission, state as 'draft'));
      const expected = inOtherState ? [409, 'WRONG_STATE'] : [403, 'FORBIDDEN'];
      expect([role, answer.status, codeOf(answer)]).toEqual([role, ...expected]);
    }
  });

  it('lets those in whose act it is', async () => {
    // Those that change the state come last, so that each finds the state that it needs.
    const last = ['lock', 'check', 'hand-over', 'return', 'members'];
    const inOrder = [...ofObjects].sort(
      (a, b) =>
        last.findIndex((word) => a.path.includes(`/${word}`)) - last.findIndex((word) => b.path.includes(`/${word}`)),
    );
    for (const route of inOrder) {
      const { permission } = route;
      const parts = (['engineer', 'checker', 'lead', 'reader', 'administrator'] as const).filter((part) => {
        if (isAct(permission)) return part !== 'administrator' && may(part, permission, 'for check');
        if (!isProjectAct(permission)) return false;
        return part === 'administrator'
          ? mayInProject(undefined, permission, true) && route.path.startsWith('/projects')
          : mayInProject(part, permission);
      });
      // One is enough for acts that can be done once.
      for (const part of route.method === 'GET' ? parts : parts.slice(0, 1)) {
        const answer = await call(route, part);
        const code = codeOf(answer);
        const stoppedElsewhere = ['CONTENT_CHANGED', 'CONDITIONS_OPEN'].includes(code);
        const ownRemarkOnly = route.path.includes('/remarks/') && part !== 'checker' && code === 'FORBIDDEN';
        const notFrozen = route.path.endsWith('/verification') && code === 'WRONG_STATE';
        expect({
          route: nameOf(route),
          part,
          in: answer.status < 300 || stoppedElsewhere || ownRemarkOnly || notFrozen,
          code,
        }).toEqual({ route: nameOf(route), part, in: true, code });
      }
    }
  });
});

describe('ids of one project in the hands of another', () => {
  it('a checker named at hand-over must be one of this project', async () => {
    const { administrator, engineer, stranger } = server.client;
    const other = await administrator.post<{ id: string }>('/projects', { number: '9200', title: 'Elsewhere' });
    await administrator.put(`/projects/${other.body.id}/members/${stranger.account?.id ?? ''}`, { role: 'checker' });
    const draft = await calculationIn(server, 'draft');
    const answer = await engineer.post(`/revisions/${draft.revision.id}/hand-over`, {
      ...signing,
      checkerId: stranger.account?.id,
    });
    expect([answer.status, codeOf(answer)]).toEqual([400, 'INVALID_INPUT']);
  });

  it('a calculation cannot be begun from one that the person may not read', async () => {
    const { administrator, stranger } = server.client;
    const other = await administrator.post<{ id: string }>('/projects', { number: '9201', title: 'Elsewhere' });
    await administrator.put(`/projects/${other.body.id}/members/${stranger.account?.id ?? ''}`, { role: 'engineer' });
    const answer = await stranger.post(`/projects/${other.body.id}/calculations`, {
      title: 'Taken',
      start: { from: 'calculation', calculationId: detail.calculation.id },
    });
    expect([answer.status, codeOf(answer)]).toEqual([404, 'NOT_FOUND']);
  });

  it('a checker of another project cannot tick, remark or sign here', async () => {
    const { administrator, stranger } = server.client;
    const other = await administrator.post<{ id: string }>('/projects', { number: '9202', title: 'Elsewhere' });
    await administrator.put(`/projects/${other.body.id}/members/${stranger.account?.id ?? ''}`, { role: 'checker' });
    const { id } = detail.revision;
    expect((await stranger.put(`/revisions/${id}/ticks/c21`, { fingerprint: 'x' })).status).toBe(404);
    expect((await stranger.post(`/revisions/${id}/remarks`, { cellId: 'c21', text: 'x' })).status).toBe(404);
    expect((await stranger.post(`/remarks/${remarkId}/close`)).status).toBe(404);
    expect((await stranger.post(`/revisions/${id}/check`, signing)).status).toBe(404);
  });
});
