import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Account, Project, RegisterRow, RevisionDetail } from '#contract';
import { Client, createCalculation, startTestServer, testPassword, type TestServer } from '../helpers/server';

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.close());

const code = (body: unknown) => (body as { error: { code: string } }).error.code;

describe('signing in', () => {
  it('renews the id of the session and ends it at sign-out', async () => {
    const client = new Client(server.origin);
    const first = await client.post('/session', { signInName: 'engineer', password: testPassword });
    expect(first.status).toBe(200);
    const planted = client.cookie;
    await client.post('/session', { signInName: 'engineer', password: testPassword });
    expect(client.cookie).not.toBe(planted);
    expect((await client.get('/session')).status).toBe(200);
    expect((await client.delete('/session')).status).toBe(204);
    expect((await client.get('/session')).status).toBe(401);
  });

  it('answers a wrong passphrase and an unknown name alike', async () => {
    const wrong = await server.nobody.post('/session', { signInName: 'reader', password: 'wrong' });
    const unknown = await server.nobody.post('/session', { signInName: 'who-is-that', password: 'wrong' });
    expect([wrong.status, wrong.body]).toEqual([unknown.status, unknown.body]);
  });

  it('is limited after ten wrong tries for a name', async () => {
    const client = new Client(server.origin);
    for (let tries = 0; tries < 10; tries += 1)
      expect((await client.post('/session', { signInName: 'guessed', password: 'wrong' })).status).toBe(401);
    const last = await client.post('/session', { signInName: 'guessed', password: 'wrong' });
    expect(last.status).toBe(429);
    expect(code(last.body)).toBe('TOO_MANY_TRIES');
  });

  it('refuses changes that do not come from the product’s own pages', async () => {
    for (const origin of ['https://elsewhere.example', 'null']) {
      const answer = await server.client.engineer.send(
        'POST',
        `/api/projects/${server.projectId}/calculations`,
        { title: 'x', start: { from: 'empty' } },
        { Origin: origin },
      );
      expect(answer.status).toBe(403);
      expect(code(answer.body)).toBe('WRONG_ORIGIN');
    }
  });

  it('sends a strict Content Security Policy with every page', async () => {
    const page = await server.nobody.send('GET', '/');
    const policy = String(page.headers['content-security-policy']);
    expect(policy).toContain("default-src 'none'");
    expect(policy).toContain("script-src 'self';");
    expect(policy).not.toContain('unsafe-eval');
    expect(page.headers['x-powered-by']).toBeUndefined();
  });
});

describe('people', () => {
  const person = {
    signInName: 'new.person',
    name: 'N. Person',
    initials: 'NP',
    email: 'new@test.example',
    password: 'twelve letters or more',
  };

  it('are kept by an administrator only', async () => {
    const { administrator, lead } = server.client;
    expect((await lead.get('/people')).status).toBe(403);
    expect((await lead.post('/people', person)).status).toBe(403);
    const created = await administrator.post<Account>('/people', person);
    expect(created.status).toBe(201);
    expect(JSON.stringify(created.body)).not.toContain('argon2');
    expect(code((await administrator.post('/people', person)).body)).toBe('NAME_TAKEN');
    expect((await administrator.patch<Account>(`/people/${created.body.id}`, { name: 'N. Other' })).body.name).toBe(
      'N. Other',
    );
  });

  it('are out at once when they are deactivated', async () => {
    const { administrator } = server.client;
    const created = await administrator.post<Account>('/people', { ...person, signInName: 'leaves.soon' });
    const own = new Client(server.origin);
    await own.post('/session', { signInName: 'leaves.soon', password: person.password });
    expect((await own.get('/session')).status).toBe(200);
    await administrator.patch(`/people/${created.body.id}`, { active: false });
    expect((await own.get('/session')).status).toBe(401);
    expect((await own.post('/session', { signInName: 'leaves.soon', password: person.password })).status).toBe(401);
  });

  it('cannot lock themselves out as the administrator at work', async () => {
    const { administrator } = server.client;
    expect((await administrator.patch(`/people/${administrator.account?.id ?? ''}`, { active: false })).status).toBe(
      403,
    );
  });

  it('names the fields that are wrong', async () => {
    const answer = await server.client.administrator.post('/people', {
      ...person,
      email: 'nowhere',
      password: 'short',
    });
    expect(answer.status).toBe(400);
    expect(Object.keys((answer.body as { error: { fields: object } }).error.fields).sort()).toEqual([
      'email',
      'password',
    ]);
  });
});

describe('projects', () => {
  it('are opened and given members by an administrator', async () => {
    const { administrator, engineer, stranger } = server.client;
    expect((await engineer.post('/projects', { number: '9002', title: 'Other' })).status).toBe(403);
    const opened = await administrator.post<Project>('/projects', { number: '9002', title: 'Other' });
    expect(opened.status).toBe(201);
    expect(code((await administrator.post('/projects', { number: '9002', title: 'Again' })).body)).toBe('NUMBER_TAKEN');
    const { id } = opened.body;
    const strangerId = stranger.account?.id ?? '';
    expect((await stranger.get(`/projects/${id}`)).status).toBe(404);
    await administrator.put(`/projects/${id}/members/${strangerId}`, { role: 'reader' });
    expect((await stranger.get<Project>(`/projects/${id}`)).body.role).toBe('reader');
    expect((await stranger.patch(`/projects/${id}`, { title: 'Mine' })).status).toBe(403);
    expect((await administrator.patch<Project>(`/projects/${id}`, { title: 'Renamed' })).body.title).toBe('Renamed');
    await administrator.delete(`/projects/${id}/members/${strangerId}`);
    expect((await stranger.get(`/projects/${id}`)).status).toBe(404);
  });

  it('give every calculation a number of its own, also to many at once', async () => {
    const { engineer, second } = server.client;
    const requests = Array.from({ length: 12 }, (_, index) =>
      (index % 2 === 0 ? engineer : second).post<RevisionDetail>(`/projects/${server.projectId}/calculations`, {
        title: `At once ${index}`,
        start: { from: 'empty' },
      }),
    );
    const numbers = (await Promise.all(requests)).map(({ body }) => body.calculation.number);
    expect(new Set(numbers).size).toBe(12);
  });

  it('list their calculations with figures that agree with the sheets', async () => {
    const detail = await createCalculation(server, 'jacket-water-cooler');
    const { body } = await server.client.reader.get<RegisterRow[]>(`/projects/${server.projectId}/calculations`);
    const row = body.find((one) => one.calculationId === detail.calculation.id);
    expect(row).toMatchObject({
      letter: 'A',
      state: 'draft',
      cells: 15,
      ticked: 0,
      changed: 0,
      openRemarks: 0,
      tbv: 2,
      outsideRange: 0,
      prepares: ['EN'],
      mine: false,
    });
  });

  it('let engineers and leads open and rename calculations, nobody else', async () => {
    const { checker, reader, lead } = server.client;
    const detail = await createCalculation(server);
    for (const client of [checker, reader]) {
      expect(
        (await client.post(`/projects/${server.projectId}/calculations`, { title: 'x', start: { from: 'empty' } }))
          .status,
      ).toBe(403);
      expect((await client.patch(`/calculations/${detail.calculation.id}`, { title: 'x' })).status).toBe(403);
    }
    expect(
      (await lead.patch<RevisionDetail>(`/calculations/${detail.calculation.id}`, { title: 'Better title' })).body
        .calculation.title,
    ).toBe('Better title');
  });

  it('offer the examples, and refuse one that is not there', async () => {
    const { engineer } = server.client;
    expect((await engineer.get<{ id: string }[]>('/examples')).body.map((example) => example.id)).toContain(
      'jacket-water-cooler',
    );
    expect(
      (
        await engineer.post(`/projects/${server.projectId}/calculations`, {
          title: 'x',
          start: { from: 'example', example: '../package' },
        })
      ).status,
    ).toBe(404);
  });

  it('answer what is no id and no address with 404, and what is too large with 413', async () => {
    const { engineer } = server.client;
    expect((await engineer.get('/revisions/not-an-id')).status).toBe(404);
    expect((await engineer.get('/nothing/here')).status).toBe(404);
    expect(
      (await engineer.post(`/projects/${server.projectId}/calculations`, { title: 'x'.repeat(1_200_000) })).status,
    ).toBe(413);
  });
});
