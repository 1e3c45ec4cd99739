import { mkdtempSync, mkdirSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import express from 'express';
import { pino } from 'pino';
import supertest from 'supertest';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Account, RevisionDetail } from '#contract';
import { readConfig } from '../../src-server/config/index';
import { answerErrors } from '../../src-server/middleware/errors';
import { requireSameOrigin } from '../../src-server/middleware/origin';
import { giveNonce, securityHeaders } from '../../src-server/middleware/security';
import { applicationRoutes } from '../../src-server/routes/application';
import { calculationIn, Client, startTestServer, testPassword, type TestServer } from '../helpers/server';

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.close());

const code = (body: unknown) => (body as { error: { code: string } }).error.code;
const newPerson = async (signInName: string): Promise<Client> => {
  const { body } = await server.client.administrator.post<Account>('/people', {
    signInName,
    name: 'T. Rial',
    initials: 'TR',
    email: `${signInName}@test.example`,
    password: testPassword,
  });
  const client = new Client(server.origin, body);
  await client.post('/session', { signInName, password: testPassword });
  return client;
};

describe('headers', () => {
  const paths = ['/', '/healthz', '/api/session', '/api/nothing', '/assets/nothing.js', '/%ff'];

  it.each(paths)('of %s carry the whole policy', async (path) => {
    const { headers } = await server.nobody.send('GET', path);
    const nonce = /'nonce-([0-9a-f]{32})'/.exec(String(headers['content-security-policy']))?.[1] ?? '';
    const expected = [
      "default-src 'none'",
      "script-src 'self'",
      "worker-src 'self'",
      `style-src 'self' 'nonce-${nonce}'`,
      "style-src-attr 'unsafe-inline'",
      "img-src 'self' data:",
      "font-src 'self'",
      "connect-src 'self'",
      "manifest-src 'self'",
      "base-uri 'none'",
      "form-action 'self'",
      "frame-ancestors 'none'",
      "object-src 'none'",
    ];
    expect(String(headers['content-security-policy']).split(';')).toEqual(expected);
    expect(headers).toMatchObject({
      'x-content-type-options': 'nosniff',
      'x-frame-options': 'SAMEORIGIN',
      'referrer-policy': 'same-origin',
      'cross-origin-opener-policy': 'same-origin',
    });
    expect(headers['x-powered-by']).toBeUndefined();
  });

  it('have another nonce each time', async () => {
    const policies = await Promise.all(
      Array.from({ length: 5 }, async () =>
        String((await server.nobody.send('GET', '/')).headers['content-security-policy']),
      ),
    );
    expect(new Set(policies).size).toBe(5);
  });

  it('keep answers of the interface out of every cache', async () => {
    expect((await server.client.reader.get('/projects')).headers['cache-control']).toBe('no-store');
  });

  it('promise TLS for a year where the public address has it', async () => {
    const app = express().use(securityHeaders(true), (_request, response) => void response.end());
    const { headers } = await supertest(app).get('/');
    expect(headers['strict-transport-security']).toContain('max-age=31536000');
  });
});

describe('the built application', () => {
  let folder: string;
  beforeAll(() => {
    folder = mkdtempSync(join(tmpdir(), 'wallflux-page-'));
    mkdirSync(join(folder, 'assets'));
    writeFileSync(join(folder, 'index.html'), '<style nonce=__CSP_NONCE__></style><main nonce=__CSP_NONCE__></main>');
    writeFileSync(join(folder, 'assets', 'app-12345678.js'), 'export {};');
    writeFileSync(join(folder, 'icon.svg'), '<svg xmlns="http://www.w3.org/2000/svg"/>');
  });
  afterAll(() => rmSync(folder, { recursive: true }));
  const app = () =>
    supertest(
      express().use(
        giveNonce,
        securityHeaders(false),
        applicationRoutes(folder),
        answerErrors(pino({ level: 'silent' })),
      ),
    );

  it.each(['/', '/projects', '/calculations/1/B'])('goes out at %s with the nonce of its answer', async (path) => {
    const { text, headers } = await app().get(path);
    const nonce = /'nonce-([0-9a-f]{32})'/.exec(headers['content-security-policy'] ?? '')?.[1] ?? 'none';
    expect(text).toBe(`<style nonce=${nonce}></style><main nonce=${nonce}></main>`);
    expect(headers['cache-control']).toBe('no-store');
  });

  it('never goes out as a plain file, without its nonce', async () => {
    const answer = await app().get('/index.html');
    expect([answer.status, answer.headers.location]).toEqual([302, '/']);
  });

  it('keeps hashed files for a year and others for an hour', async () => {
    expect((await app().get('/assets/app-12345678.js')).headers['cache-control']).toBe(
      'public, max-age=31536000, immutable',
    );
    expect((await app().get('/icon.svg')).headers['cache-control']).toBe('public, max-age=3600');
  });

  it('answers 404 for a file that is not there, also outside its folder', async () => {
    for (const path of ['/assets/gone-12345678.js', '/assets/..%2findex.html', '/assets/%2e%2e/%2e%2e/etc/passwd'])
      expect([path, (await app().get(path)).status]).toEqual([path, 404]);
  });
});

describe('where a change comes from', () => {
  const app = express()
    .use(requireSameOrigin('https://sheets.example'), (_request, response) => void response.json({ taken: true }))
    .use(answerErrors(pino({ level: 'silent' })));
  const host = 'sheets.internal:8417';

  it.each([
    ['its own origin', { Origin: 'https://sheets.example' }, 200],
    ['the host that was asked', { Origin: `http://${host}` }, 200],
    ['no Origin, but the browser says it is the same', { 'Sec-Fetch-Site': 'same-origin' }, 200],
    ['no Origin, but a page of the product', { Referer: 'https://sheets.example/projects' }, 200],
    ['another origin', { Origin: 'https://elsewhere.example' }, 403],
    ['another port', { Origin: 'https://sheets.example:8443' }, 403],
    ['no TLS', { Origin: 'http://sheets.example' }, 403],
    ['an origin that only begins like ours', { Origin: 'https://sheets.example.elsewhere.example' }, 403],
    ['a page in a box', { Origin: 'null' }, 403],
    [
      'another origin, with our page as the referrer',
      { Origin: 'https://e.example', Referer: 'https://sheets.example/' },
      403,
    ],
    ['another site, by the browser’s own word', { 'Sec-Fetch-Site': 'cross-site' }, 403],
    ['a neighbour on the same site', { 'Sec-Fetch-Site': 'same-site', Referer: 'https://sheets.example/' }, 403],
    ['a typed address', { 'Sec-Fetch-Site': 'none' }, 403],
    ['another page', { Referer: 'https://elsewhere.example/sheets.example' }, 403],
    ['nowhere', {}, 403],
  ])('%s', async (_case, headers, status) => {
    for (const method of ['post', 'put', 'patch', 'delete'] as const)
      expect(
        (
          await supertest(app)
            [method]('/')
            .set({ Host: host, ...headers })
        ).status,
      ).toBe(status);
  });

  it('does not matter for reading', async () => {
    expect((await supertest(app).get('/').set('Origin', 'https://elsewhere.example')).status).toBe(200);
  });
});

describe('sessions', () => {
  it('are kept in a cookie that scripts cannot read and other sites do not send', async () => {
    const client = new Client(server.origin);
    const { headers } = await client.post('/session', { signInName: 'reader', password: testPassword });
    const [cookie = ''] = headers['set-cookie'] ?? [];
    expect(cookie).toMatch(/^wallflux\.sid=/);
    expect(cookie).toMatch(/; HttpOnly/);
    expect(cookie).toMatch(/; SameSite=Lax/);
    expect(cookie).toMatch(/; Path=\//);
  });

  it('are not made for those who only look', async () => {
    const { headers } = await server.nobody.get('/session');
    expect(headers['set-cookie']).toBeUndefined();
  });

  it('cannot be used with a forged or an ended id', async () => {
    const client = await newPerson('signs.out');
    const before = client.cookie;
    await client.delete('/session');
    client.cookie = before;
    expect((await client.get('/session')).status).toBe(401);
    client.cookie = before.replace(/.$/, (last) => (last === 'a' ? 'b' : 'a'));
    expect((await client.get('/session')).status).toBe(401);
  });

  it('all end when the passphrase is set anew, when rights are taken, when the person is deactivated', async () => {
    const { administrator } = server.client;
    for (const [index, change] of [
      { password: 'another long passphrase' },
      { administrator: false },
      { active: false },
    ].entries()) {
      const client = await newPerson(`changed${index}`);
      const other = new Client(server.origin, client.account);
      await other.post('/session', { signInName: `changed${index}`, password: testPassword });
      await administrator.patch(`/people/${client.account?.id ?? ''}`, change);
      expect([(await client.get('/session')).status, (await other.get('/session')).status]).toEqual([401, 401]);
    }
  });

  it('of a deactivated member have no role any more, whatever line is still open', async () => {
    const { administrator } = server.client;
    const client = await newPerson('goes');
    const path = `/projects/${server.projectId}/members/${client.account?.id ?? ''}`;
    await administrator.put(path, { role: 'engineer' });
    const { db } = server.running.context;
    const { roleOf } = await import('../../src-server/repositories/projects');
    expect(await roleOf(db, server.projectId, client.account?.id ?? '')).toBe('engineer');
    await administrator.patch(`/people/${client.account?.id ?? ''}`, { active: false });
    expect(await roleOf(db, server.projectId, client.account?.id ?? '')).toBeUndefined();
    await administrator.delete(path);
  });
});

describe('wrong tries', () => {
  it('of signing are limited for the person and written into the trail', async () => {
    const { administrator } = server.client;
    const client = await newPerson('guesses');
    await administrator.put(`/projects/${server.projectId}/members/${client.account?.id ?? ''}`, { role: 'lead' });
    const { revision } = await calculationIn(server, 'checked');
    const lock = (password: string) =>
      client.post(`/revisions/${revision.id}/lock`, { password, contentFingerprint: 'x', changeNote: 'x' });
    for (let tries = 0; tries < 10; tries += 1) expect((await lock(`wrong ${tries}`)).status).toBe(401);
    const last = await lock(testPassword);
    expect([last.status, code(last.body)]).toEqual([429, 'TOO_MANY_TRIES']);
    const rows = await server.running.context
      .db('trail')
      .where({ revision_id: revision.id, act: 'revision.wrongPassphrase' });
    expect(rows).toHaveLength(10);
    expect(JSON.stringify(rows)).not.toContain('wrong 3');
    // Somebody else still signs.
    expect((await server.client.lead.get(`/revisions/${revision.id}`)).status).toBe(200);
    await administrator.delete(`/projects/${server.projectId}/members/${client.account?.id ?? ''}`);
  });

  it('of signing do not come from the number of good ones', async () => {
    const { engineer } = server.client;
    const { revision } = await calculationIn(server, 'draft');
    for (let times = 0; times < 12; times += 1) {
      const answer = await engineer.post(`/revisions/${revision.id}/hand-over`, {
        password: testPassword,
        contentFingerprint: 'not what is shown',
      });
      expect(answer.status).toBe(409);
    }
  });
});

describe('what comes in', () => {
  const calculations = () => `/api/projects/${server.projectId}/calculations`;
  const raw = (text: string, type: string) =>
    supertest(server.origin)
      .post(calculations())
      .set({ Origin: server.origin, Cookie: server.client.engineer.cookie, 'Content-Type': type })
      .send(text);

  it.each([
    ['no JSON', '{"title"', 'application/json', 400],
    ['a form', 'title=x', 'application/x-www-form-urlencoded', 400],
    ['plain text', '{"title":"x","start":{"from":"empty"}}', 'text/plain', 400],
    ['an unknown character set', '{}', 'application/json; charset=klingon', 400],
    ['no object', '[]', 'application/json', 400],
  ])('%s is refused in words', async (_case, text, type, status) => {
    const answer = await raw(text, type);
    expect([answer.status, code(answer.body)]).toEqual([status, 'INVALID_INPUT']);
    expect(JSON.stringify(answer.body)).not.toMatch(/node_modules|\.ts:|SyntaxError/);
  });

  it('has no say in what it is not asked for', async () => {
    const { engineer, lead } = server.client;
    const made = await engineer.post<RevisionDetail>(`/projects/${server.projectId}/calculations`, {
      title: 'Given too much',
      start: { from: 'empty' },
      number: '9001-C-999',
      state: 'locked',
      project_id: 'x',
    });
    expect(made.body.calculation.number).not.toBe('9001-C-999');
    expect(made.body.revision.state).toBe('draft');
    const renamed = await lead.patch<RevisionDetail>(`/calculations/${made.body.calculation.id}`, {
      title: 'Renamed',
      number: '1',
      project_id: 'x',
      created_by: null,
    });
    expect(renamed.body.calculation).toMatchObject({ title: 'Renamed', number: made.body.calculation.number });
  });

  it.each(["'; DROP TABLE people; --", '<script>alert(1)</script>', '{{constructor}}', 'a\u0000b', '＇ OR 1=1'])(
    'as a title stays text: %s',
    async (title) => {
      const answer = await server.client.engineer.post<RevisionDetail>(`/projects/${server.projectId}/calculations`, {
        title,
        start: { from: 'empty' },
      });
      if (answer.status === 201) expect(answer.body.calculation.title).toBe(title);
      else expect([answer.status, code(answer.body)]).toEqual([400, 'INVALID_INPUT']);
    },
  );

  it('as a query is parsed too', async () => {
    const { reader } = server.client;
    expect((await reader.get(`/projects/${server.projectId}/trail?before=x`)).status).toBe(400);
    expect((await reader.get(`/projects/${server.projectId}/trail?calculationId=1`)).status).toBe(400);
    expect((await reader.get(`/projects/${server.projectId}/trail?before=1&before=2`)).status).toBe(400);
  });
});

describe('what goes wrong inside', () => {
  it('is logged whole under a reference, and told in one general sentence', async () => {
    const lines: string[] = [];
    const { stdSerializers } = await import('pino');
    const log = pino(
      { serializers: { error: stdSerializers.err } },
      { write: (line: string) => void lines.push(line) },
    );
    const app = express()
      .get('/', () => {
        throw new Error('the innermost secret');
      })
      .use(answerErrors(log));
    const { status, body } = await supertest(app).get('/');
    expect([status, code(body)]).toEqual([500, 'INTERNAL']);
    expect(JSON.stringify(body)).not.toContain('innermost');
    const reference = /under ([0-9a-f]{8})/.exec(JSON.stringify(body))?.[1] ?? 'none';
    expect(lines.join()).toContain(reference);
    expect(lines.join()).toContain('the innermost secret');
  });
});

describe('the environment', () => {
  const good = { DATABASE_URL: 'postgres://x', SESSION_SECRET: 'sixteen characters' };

  it('is read once, with defaults', () => {
    expect(readConfig(good)).toMatchObject({ port: 8417, host: '127.0.0.1', publicOrigin: 'http://localhost:8417' });
    expect(readConfig({ ...good, PUBLIC_ORIGIN: 'https://sheets.example/' }).publicOrigin).toBe(
      'https://sheets.example',
    );
  });

  it.each([
    ['SESSION_SECRET', { ...good, SESSION_SECRET: 'short' }],
    ['DATABASE_URL', { SESSION_SECRET: good.SESSION_SECRET }],
    ['PORT', { ...good, PORT: 'eighty' }],
    ['PUBLIC_ORIGIN', { ...good, PUBLIC_ORIGIN: 'sheets' }],
  ])('names what is wrong in it: %s', (name, variables) => {
    expect(() => readConfig(variables)).toThrow(name);
  });
});
