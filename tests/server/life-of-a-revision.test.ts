import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { acts, may, type Remark, type RevisionDetail, type Role, type TrailPage } from '#contract';
import { firstBrokenEntry } from '../../src-server/repositories/trail';
import {
  calculationIn,
  createCalculation,
  handOver,
  lock,
  shownFingerprint,
  signCheck,
  startTestServer,
  testPassword,
  tickAll,
  type TestServer,
} from '../helpers/server';

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.close());

const error = (body: unknown) => (body as { error: { code: string; message: string } }).error;

describe('from draft to locked', () => {
  it('goes hand over, tick, check, lock; and the next revision begins from it', async () => {
    const detail = await createCalculation(server);
    const { id } = detail.revision;
    expect(detail.revision).toMatchObject({ letter: 'A', state: 'draft' });
    expect((await handOver(server, id)).body.revision.state).toBe('for check');
    const early = await signCheck(server, id);
    expect(early.status).toBe(409);
    expect(error(early.body).message).toContain('not ticked');
    await tickAll(server, id);
    expect((await signCheck(server, id)).body.revision.state).toBe('checked');
    const locked = await lock(server, id);
    expect(locked.status).toBe(200);
    expect(locked.body.revision).toMatchObject({ state: 'locked', changeNote: 'First issue' });
    expect(locked.body.revision.signatures.map((signature) => signature.meaning)).toEqual([
      'prepared',
      'checked',
      'approved',
    ]);
    expect(locked.body.revision.fingerprint).toMatch(/^[0-9a-f]{64}$/);

    const next = await server.client.engineer.post<RevisionDetail>(`/calculations/${detail.calculation.id}/revisions`);
    expect(next.body.revision).toMatchObject({ letter: 'B', state: 'draft' });
    const before = await server.client.reader.get<{ cells: unknown[] }>(`/revisions/${id}/content`);
    const after = await server.client.reader.get<{ cells: unknown[] }>(`/revisions/${next.body.revision.id}/content`);
    expect(after.body.cells).toEqual(before.body.cells);

    const b = next.body.revision.id;
    await handOver(server, b);
    await tickAll(server, b);
    await signCheck(server, b);
    const second = await lock(server, b, 'Nothing but the letter');
    expect(second.body.revisions.map((revision) => revision.state)).toEqual(['superseded', 'locked']);
  });

  it('asks the lead for a reason for what is left open, and keeps it', async () => {
    const detail = await createCalculation(server, 'steam-main-insulation');
    const { id } = detail.revision;
    await handOver(server, id);
    await tickAll(server, id);
    await signCheck(server, id);
    const refused = await lock(server, id);
    expect(refused.status).toBe(409);
    expect(error(refused.body)).toMatchObject({ code: 'CONDITIONS_OPEN' });
    const reasons = { 'tbv:c22': 'From 0.1 to 0.4 the loss moves by 3 %.' };
    const { lead } = server.client;
    const contentFingerprint = await shownFingerprint(lead, id);
    const given = await lead.post<RevisionDetail>(`/revisions/${id}/lock`, {
      password: testPassword,
      contentFingerprint,
      changeNote: 'First issue',
      reasons,
    });
    expect(given.status).toBe(200);
    expect(given.body.reasons).toEqual([
      { about: expect.stringContaining('Emissivity') as string, reason: reasons['tbv:c22'] },
    ]);
  });

  it('returns to draft with a reason, and the signatures are void', async () => {
    const detail = await calculationIn(server, 'checked');
    expect(detail.revision.signatures).toHaveLength(2);
    const returned = await server.client.lead.post<RevisionDetail>(`/revisions/${detail.revision.id}/return`, {
      reason: 'Wrong duct.',
    });
    expect(returned.body.revision).toMatchObject({ state: 'draft', signatures: [] });
  });

  it('does not sign with a wrong passphrase, nor for a content that was not on the screen', async () => {
    const detail = await createCalculation(server);
    const { engineer } = server.client;
    const { id } = detail.revision;
    const contentFingerprint = await shownFingerprint(engineer, id);
    const wrong = await engineer.post(`/revisions/${id}/hand-over`, { password: 'something else', contentFingerprint });
    expect(wrong.status).toBe(401);
    expect(error(wrong.body).code).toBe('WRONG_PASSWORD');
    const other = await engineer.post(`/revisions/${id}/hand-over`, {
      password: testPassword,
      contentFingerprint: 'of another content',
    });
    expect(other.status).toBe(409);
    expect(error(other.body).code).toBe('CONTENT_CHANGED');
  });

  it('tells the checkers by mail, without a value in it', async () => {
    const { catcher } = server.running;
    const detail = await calculationIn(server, 'for check');
    const mailOf = () => catcher?.mails.find((one) => one.text.includes(detail.calculation.id));
    await expect.poll(mailOf, { timeout: 15_000 }).not.toBeUndefined();
    const mail = mailOf();
    expect(mail?.to).toEqual(['checker@test.example']);
    expect(mail?.subject).toContain('handed over for check');
    expect(mail?.text).not.toMatch(/kW|°C/);
  });
});

describe('remarks', () => {
  it('are asked by the checker, answered by the engineer, closed by the one who asked only', async () => {
    const { checker, lead, engineer, reader } = server.client;
    const { revision } = await createCalculation(server);
    const asked = await checker.post<Remark[]>(`/revisions/${revision.id}/remarks`, {
      cellId: 'c21',
      text: 'Which source?',
    });
    expect(asked.status).toBe(201);
    const remark = asked.body[0];
    expect(remark).toMatchObject({ number: 1, state: 'open' });
    const id = remark?.id ?? '';
    expect((await reader.post(`/remarks/${id}/answers`, { text: 'No.' })).status).toBe(403);
    const answered = await engineer.post<Remark[]>(`/remarks/${id}/answers`, { text: 'The survey.' });
    expect(answered.body[0]).toMatchObject({ state: 'answered', answers: [{ text: 'The survey.' }] });
    expect((await engineer.post(`/remarks/${id}/close`)).status).toBe(403);
    expect((await lead.post(`/remarks/${id}/close`)).status).toBe(403);
    expect((await checker.post<Remark[]>(`/remarks/${id}/close`)).body[0]?.state).toBe('closed');
    expect((await checker.post<Remark[]>(`/remarks/${id}/reopen`)).body[0]?.state).toBe('answered');
    await expect
      .poll(() => server.running.catcher?.mails.some((mail) => mail.subject.includes('remark R1 answered')), {
        timeout: 15_000,
      })
      .toBe(true);
  });
});

describe('ticks', () => {
  it('are refused when the screen showed something else than the server computes', async () => {
    const { checker } = server.client;
    const { revision } = await createCalculation(server);
    const refused = await checker.put(`/revisions/${revision.id}/ticks/c21`, { fingerprint: 'stale' });
    expect(refused.status).toBe(409);
    expect(error(refused.body).code).toBe('CONTENT_CHANGED');
    expect((await checker.put(`/revisions/${revision.id}/ticks/nothing`, { fingerprint: 'x' })).status).toBe(404);
    expect((await checker.put(`/revisions/${revision.id}/ticks/s1`, { fingerprint: 'x' })).status).toBe(404);
  });
});

describe('the access table', () => {
  const roles: readonly Role[] = ['engineer', 'checker', 'lead', 'reader'];
  const states = ['draft', 'for check', 'checked', 'locked'] as const;
  const request = (role: Role, act: (typeof acts)[number], detail: RevisionDetail) => {
    const client = server.client[role];
    const { id } = detail.revision;
    const signature = { password: 'wrong on purpose', contentFingerprint: 'none' };
    switch (act) {
      case 'revision.read':
        return client.get(`/revisions/${id}`);
      case 'remark.ask':
        return client.post(`/revisions/${id}/remarks`, { cellId: 'c21', text: 'A question' });
      case 'tick.set':
        return client.put(`/revisions/${id}/ticks/c21`, { fingerprint: 'stale' });
      case 'revision.handOver':
        return client.post(`/revisions/${id}/hand-over`, signature);
      case 'revision.return':
        return client.post(`/revisions/${id}/return`, {});
      case 'revision.check':
        return client.post(`/revisions/${id}/check`, signature);
      case 'revision.lock':
        return client.post(`/revisions/${id}/lock`, { ...signature, changeNote: 'x' });
      default:
        return undefined;
    }
  };
  // Answers of a service that was reached and then stopped for another reason than access.
  const reached = new Set([200, 201, 400, 401, 409]);

  it.each(states)('holds over HTTP in state %s for every role', async (state) => {
    const detail = await calculationIn(server, state);
    for (const role of roles) {
      for (const act of acts) {
        if (act === 'revision.return') continue;
        const answer = await request(role, act, detail);
        if (answer === undefined) continue;
        const code = answer.status >= 400 ? error(answer.body).code : '';
        const allowed = reached.has(answer.status) && code !== 'WRONG_STATE';
        expect({ role, act, state, allowed }).toEqual({ role, act, state, allowed: may(role, act, state) });
      }
    }
  });

  it('shows nothing to strangers and refuses whoever is not signed in', async () => {
    const detail = await calculationIn(server, 'draft');
    const paths = [
      `/revisions/${detail.revision.id}`,
      `/revisions/${detail.revision.id}/content`,
      `/revisions/${detail.revision.id}/remarks`,
      `/revisions/${detail.revision.id}/ticks`,
      `/revisions/${detail.revision.id}/conditions`,
      `/revisions/${detail.revision.id}/export`,
      `/calculations/${detail.calculation.id}`,
      `/projects/${server.projectId}`,
      `/projects/${server.projectId}/calculations`,
      `/projects/${server.projectId}/trail`,
    ];
    for (const path of paths) {
      expect([path, (await server.client.stranger.get(path)).status]).toEqual([path, 404]);
      expect([path, (await server.nobody.get(path)).status]).toEqual([path, 401]);
    }
  });
});

describe('what is locked', () => {
  it('cannot be changed by SQL, by the application nor by its own role', async () => {
    const detail = await calculationIn(server, 'locked');
    const { db } = server.running.context;
    const { id } = detail.revision;
    const attempts = [
      () => db('revisions').where({ id }).update({ content: '{}' }),
      () => db('revisions').where({ id }).update({ fingerprint: 'other' }),
      () => db('revisions').where({ id }).update({ state: 'draft' }),
      () => db('revisions').where({ id }).delete(),
      () => db('document_updates').insert({ revision_id: id, content: Buffer.from([0, 0]) }),
      () => db('ticks').where({ revision_id: id }).delete(),
      () => db('signatures').where({ revision_id: id }).update({ voided_at: new Date() }),
      () =>
        db('remarks').insert({
          revision_id: id,
          number: 99,
          cell_id: 'c21',
          author_id: server.client.checker.account?.id,
          content: 'late',
        }),
    ];
    for (const attempt of attempts) await expect(attempt()).rejects.toThrow(/locked/);
  });

  it('is written down in a trail that nobody changes', async () => {
    await calculationIn(server, 'locked');
    const { db } = server.running.context;
    await expect(db('trail').update({ sentence: 'nothing happened' })).rejects.toThrow(/only added to/);
    await expect(db('trail').delete()).rejects.toThrow(/only added to/);
    await expect(db.raw('TRUNCATE trail')).rejects.toThrow(/only added to/);
    expect(await firstBrokenEntry(db, server.projectId)).toBeUndefined();
    const { body } = await server.client.reader.get<TrailPage>(`/projects/${server.projectId}/trail`);
    expect(body.entries[0]).toMatchObject({ act: 'revision.lock', person: { name: 'P. lead' } });
  });

  it('shows where the trail was changed behind the triggers', async () => {
    const { db } = server.running.context;
    await db.raw('ALTER TABLE trail DISABLE TRIGGER trail_unchanged');
    const row = await db('trail')
      .where({ project_id: server.projectId })
      .orderBy('id')
      .offset(3)
      .first<{ id: string; sentence: string }>('id', 'sentence');
    await db('trail').where({ id: row.id }).update({ sentence: 'something else' });
    expect(await firstBrokenEntry(db, server.projectId)).toBe(Number(row.id));
    await db('trail').where({ id: row.id }).update({ sentence: row.sentence });
    expect(await firstBrokenEntry(db, server.projectId)).toBeUndefined();
    await db.raw('ALTER TABLE trail ENABLE TRIGGER trail_unchanged');
  });
});
