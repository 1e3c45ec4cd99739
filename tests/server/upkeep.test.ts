import { randomBytes } from 'node:crypto';
import knex from 'knex';
import { afterAll, beforeAll, describe, expect, inject, it } from 'vitest';
import type { Project, RegisterRow, Remark, RevisionEntry, TrailPage, Verification } from '#contract';
import { migrationSource } from '../../migrations/index';
import { readMail } from '../../src-server/mail/catcher';
import { firstBrokenEntry } from '../../src-server/repositories/trail';
import { staleSummaries } from '../../src-server/repositories/summaries';
import { demoPassword } from '../../src-server/seed/demo';
import { seedDemo } from '../../src-server/seed/index';
import {
  calculationIn,
  Client,
  createCalculation,
  lock,
  shownFingerprint,
  startTestServer,
  testPassword,
  tickAll,
  type TestServer,
} from '../helpers/server';

/** Of charge-air-pipe.json, counted by hand: c11, c21, c31, c32, c33, c41; its four sections are not ticked. */
const cellsOfExample = 6;

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.close());

const mailsAbout = (calculationId: string) =>
  server.running.catcher?.mails.filter((mail) => mail.text.includes(calculationId)) ?? [];
const delivered = (calculationId: string, count: number) =>
  expect.poll(() => mailsAbout(calculationId).length, { timeout: 20_000 }).toBe(count);
const addressesOf = (calculationId: string) =>
  mailsAbout(calculationId)
    .flatMap((mail) => mail.to)
    .sort();

describe('mails', () => {
  it('at hand-over go to the checker named', async () => {
    const { administrator, engineer, checker, stranger } = server.client;
    const path = `/projects/${server.projectId}/members/${stranger.account?.id ?? ''}`;
    await administrator.put(path, { role: 'checker' });
    const { revision, calculation } = await createCalculation(server);
    await engineer.post(`/revisions/${revision.id}/hand-over`, {
      password: testPassword,
      contentFingerprint: await shownFingerprint(engineer, revision.id),
      checkerId: checker.account?.id,
    });
    await delivered(calculation.id, 1);
    expect(addressesOf(calculation.id)).toEqual(['checker@test.example']);
    const other = await calculationIn(server, 'for check');
    await delivered(other.calculation.id, 2);
    expect(addressesOf(other.calculation.id)).toEqual(['checker@test.example', 'stranger@test.example']);
    await administrator.delete(path);
  });

  it('at an answer go to the one who asked, at a lock to all members but the one who locked', async () => {
    const { checker, engineer } = server.client;
    const { revision, calculation } = await createCalculation(server);
    const asked = await checker.post<Remark[]>(`/revisions/${revision.id}/remarks`, { cellId: 'c21', text: 'Why?' });
    await engineer.post(`/remarks/${asked.body[0]?.id ?? ''}/answers`, { text: 'Because.' });
    await delivered(calculation.id, 1);
    expect(addressesOf(calculation.id)).toEqual(['checker@test.example']);
    const locked = await calculationIn(server, 'locked');
    await delivered(locked.calculation.id, 5);
    expect(addressesOf(locked.calculation.id)).toEqual([
      'checker@test.example',
      'checker@test.example',
      'engineer@test.example',
      'reader@test.example',
      'second@test.example',
    ]);
  });

  it('have one link, and neither a value nor a word of what was written', async () => {
    const { checker, engineer } = server.client;
    const { revision, calculation } = await createCalculation(server);
    const asked = await checker.post<Remark[]>(`/revisions/${revision.id}/remarks`, {
      cellId: 'c21',
      text: 'Is 148 degC the wall?',
    });
    await engineer.post(`/remarks/${asked.body[0]?.id ?? ''}/answers`, { text: 'Measured: 148 degC.' });
    await delivered(calculation.id, 1);
    const [mail] = mailsAbout(calculation.id);
    expect(mail?.subject).toBe(`${calculation.number} A: remark R1 answered`);
    expect(mail?.text).toBe(
      [
        'P. engineer answered remark R1.',
        '',
        `${calculation.number} revision A, project 9001`,
        `${server.running.context.config.publicOrigin}/calculations/${calculation.id}/A`,
      ].join('\n'),
    );
  });

  it('are not sent for an act that was rolled back', async () => {
    const { context } = server.running;
    const mail = (subject: string) => ({ to: 'nobody@test.example', subject, text: 'x' });
    const rolledBack = context.db.transaction(async (transaction) => {
      await context.mails.enqueue([mail('rolled back')], transaction);
      throw new Error('not done');
    });
    await expect(rolledBack).rejects.toThrow('not done');
    await context.db.transaction((transaction) => context.mails.enqueue([mail('done')], transaction));
    const subjects = () => server.running.catcher?.mails.map((one) => one.subject) ?? [];
    await expect.poll(subjects, { timeout: 20_000 }).toContain('done');
    expect(subjects()).not.toContain('rolled back');
  });

  it('can be read at the machine itself, and nowhere else', async () => {
    const page = await server.nobody.send<string>('GET', '/dev/mails', undefined, { Accept: 'text/plain' });
    expect(page.body).toContain('Subject: done');
    const list = await server.nobody.send<{ subject: string }[]>('GET', '/dev/mails', undefined, {
      Accept: 'application/json',
    });
    expect(list.body[0]?.subject).toBe('done');
    const elsewhere = await server.nobody.send<string>('GET', '/dev/mails', undefined, {
      Accept: 'application/json',
      'X-Forwarded-For': '203.0.113.9',
    });
    expect(JSON.stringify(elsewhere.body)).not.toContain('done');
  });

  it('wait for the server when it is away', async () => {
    const { calculation } = await calculationIn(server, 'for check');
    const before = server.running.catcher?.mails ?? [];
    await server.stop();
    const soFar = before.filter((mail) => mail.text.includes(calculation.id)).length;
    await server.startAgain();
    await delivered(calculation.id, 1 - soFar);
  });

  it.each([
    // The first three headers are those of RFC 2047 §8 and its ISO-8859-1 examples, written in UTF-8.
    ['=?UTF-8?Q?Keld_J=C3=B8rn_Simonsen?=', 'Keld Jørn Simonsen'],
    ['=?utf-8?B?Q8O0dMOp?=', 'Côté'],
    ['=?UTF-8?Q?a?= =?UTF-8?Q?b?=', 'ab'],
    ['plain words', 'plain words'],
  ])('show their subject: %s', (subject, shown) => {
    expect(readMail(`Subject: ${subject}\r\n\r\n`, []).subject).toBe(shown);
  });

  it.each([
    ['7bit', 'plain =C3', 'plain =C3'],
    ['quoted-printable', 'J=C3=B8rn, a line that goes=\r\n on', 'Jørn, a line that goes on'],
    ['base64', 'SsO4cm4=', 'Jørn'],
  ])('show their text sent as %s', (encoding, sent, shown) => {
    expect(readMail(`Subject: x\r\nContent-Transfer-Encoding: ${encoding}\r\n\r\n${sent}`, []).text).toBe(shown);
  });
});

describe('the figures of the register', () => {
  const row = async (calculationId: string): Promise<RegisterRow | undefined> => {
    const { body } = await server.client.reader.get<RegisterRow[]>(`/projects/${server.projectId}/calculations`);
    return body.find((one) => one.calculationId === calculationId);
  };

  it('follow ticks and remarks within a moment', async () => {
    const { checker } = server.client;
    const { revision, calculation } = await calculationIn(server, 'for check');
    await tickAll(server, revision.id);
    await checker.post(`/revisions/${revision.id}/remarks`, { cellId: 'c21', text: 'Why?' });
    const figures = async () => {
      const found = await row(calculation.id);
      return found && [found.ticked, found.cells, found.openRemarks];
    };
    await expect.poll(figures, { timeout: 10_000 }).toEqual([cellsOfExample, cellsOfExample, 1]);
  });

  it('are not lost when the server stops in that moment', async () => {
    const { revision, calculation } = await calculationIn(server, 'for check');
    await tickAll(server, revision.id);
    await server.stop();
    await server.startAgain();
    expect((await row(calculation.id))?.ticked).toBe(cellsOfExample);
  });

  it('are made good at the next start when the server was killed', async () => {
    const { revision, calculation } = await calculationIn(server, 'draft');
    const { db } = server.running.context;
    await db('revision_summaries')
      .where({ revision_id: revision.id })
      .update({ cells: 99, computed_at: '2020-01-01T00:00:00Z' });
    expect((await staleSummaries(db)).map((stale) => stale.revisionId)).toContain(revision.id);
    await server.stop();
    await server.startAgain();
    expect((await row(calculation.id))?.cells).toBe(cellsOfExample);
    expect(await staleSummaries(server.running.context.db)).toEqual([]);
  });
});

describe('what is done to a project', () => {
  it('stands in its trail, and nothing stands there that changed nothing', async () => {
    const { administrator, reader } = server.client;
    const path = `/projects/${server.projectId}`;
    const memberPath = `${path}/members/${reader.account?.id ?? ''}`;
    const newest = async () => {
      const { body } = await reader.get<TrailPage>(`${path}/trail`);
      return body.entries[0];
    };
    await administrator.patch(path, { title: 'Trial plant, second hall', client: 'Somebody' });
    const changed = await newest();
    expect(changed).toMatchObject({ act: 'project.change', sentence: 'changed title, client of the project' });
    await administrator.patch(path, { title: 'Trial plant, second hall' });
    await administrator.put(memberPath, { role: 'reader' });
    expect((await newest())?.id).toBe(changed?.id);
    expect((await administrator.delete(`${path}/members/${administrator.account?.id ?? ''}`)).status).toBe(404);
    expect((await newest())?.id).toBe(changed?.id);
  });

  it('is read page by page, for one calculation when asked', async () => {
    const { reader } = server.client;
    const { calculation } = await calculationIn(server, 'locked');
    const trail = (query: string) => reader.get<TrailPage>(`/projects/${server.projectId}/trail?${query}`);
    const { body } = await trail(`calculationId=${calculation.id}`);
    expect(body.more).toBe(false);
    expect(new Set(body.entries.map((entry) => entry.calculation?.id))).toEqual(new Set([calculation.id]));
    expect(body.entries.map((entry) => entry.act)).toEqual([
      'revision.lock',
      'revision.check',
      ...Array<string>(cellsOfExample).fill('tick.set'),
      'revision.handOver',
      'content.write',
      'calculation.create',
    ]);
    expect(body.entries.find((entry) => entry.act === 'tick.set')?.sentence).toMatch(/^ticked cell \d\.\d$/);
    const older = await trail(`calculationId=${calculation.id}&before=${body.entries[2]?.id ?? 0}`);
    expect(older.body.entries).toEqual(body.entries.slice(3));
  });
});

describe('the database', () => {
  it('goes all steps down and up again', async () => {
    const address = inject('databaseServer');
    const name = `steps_${process.pid}_${randomBytes(4).toString('hex')}`;
    const admin = knex({ client: 'pg', connection: `${address}/postgres`, pool: { min: 0, max: 1 } });
    await admin.raw('CREATE DATABASE ??', [name]);
    const db = knex({ client: 'pg', connection: `${address}/${name}`, migrations: { migrationSource } });
    const shape = async () =>
      (
        await db.raw<{ rows: unknown[] }>(
          `SELECT table_name, column_name, data_type, is_nullable FROM information_schema.columns
           WHERE table_schema = 'public' AND table_name NOT LIKE 'knex%' ORDER BY 1, 2`,
        )
      ).rows;
    const triggers = async () =>
      (
        await db.raw<{ rows: unknown[] }>(
          `SELECT event_object_table, trigger_name, event_manipulation FROM information_schema.triggers ORDER BY 1, 2, 3`,
        )
      ).rows;
    try {
      await db.migrate.latest();
      const before = [await shape(), await triggers()];
      await db.migrate.rollback(undefined, true);
      expect(await shape()).toEqual([]);
      expect(
        (await db.raw<{ rows: unknown[] }>(`SELECT proname FROM pg_proc WHERE pronamespace = 'public'::regnamespace`))
          .rows,
      ).toEqual([]);
      await db.migrate.latest();
      expect([await shape(), await triggers()]).toEqual(before);
    } finally {
      await db.destroy();
      await admin.raw('DROP DATABASE IF EXISTS ?? WITH (FORCE)', [name]);
      await admin.destroy();
    }
  });

  it('has an index that begins with every foreign key', async () => {
    const { rows } = await server.running.context.db.raw<{ rows: { place: string }[] }>(
      `SELECT c.conrelid::regclass || '.' || a.attname AS place
       FROM pg_constraint c JOIN pg_attribute a ON a.attrelid = c.conrelid AND a.attnum = c.conkey[1]
       WHERE c.contype = 'f' AND c.connamespace = 'public'::regnamespace
         AND NOT EXISTS (SELECT 1 FROM pg_index i WHERE i.indrelid = c.conrelid AND i.indkey[0] = c.conkey[1])
       ORDER BY 1`,
    );
    expect(rows.map(({ place }) => place)).toEqual([]);
  });

  it('is answered for at /healthz', async () => {
    expect(await server.nobody.send('GET', '/healthz')).toMatchObject({ status: 200, body: { ok: true } });
  });
});

describe('the demo', () => {
  let demo: TestServer;
  let reader: Client;
  beforeAll(async () => {
    demo = await startTestServer({ people: false });
    await seedDemo(demo.running.context, demo.running.summaries);
    reader = new Client(demo.origin);
    await reader.post('/session', { signInName: 'priya.lindqvarn', password: demoPassword });
  });
  afterAll(() => demo.close());

  it('has a calculation in each state, with figures, ticks, remarks and signatures', async () => {
    const { body: projects } = await reader.get<Project[]>('/projects');
    expect(projects.map((project) => project.number)).toEqual(['2417', '2431']);
    const rows = (
      await Promise.all(
        projects.map(({ id }) => reader.get<RegisterRow[]>(`/projects/${id}/calculations`).then(({ body }) => body)),
      )
    ).flat();
    expect(rows).toHaveLength(7);
    expect(new Set(rows.map((row) => row.state))).toEqual(new Set(['draft', 'for check', 'checked', 'locked']));
    expect(rows.every((row) => row.cells > 0 && row.prepares.length > 0)).toBe(true);
    expect(rows.some((row) => row.openRemarks > 0) && rows.some((row) => row.tbv > 0)).toBe(true);
  });

  it('has sheets without an error, locked revisions that are sound, and whole trails', async () => {
    const { db } = demo.running.context;
    expect(await db('revision_summaries').sum<{ sum: string }[]>({ sum: 'errors' })).toEqual([{ sum: '0' }]);
    const locked = await db('revisions')
      .whereIn('state', ['locked', 'superseded'])
      .select<Pick<RevisionEntry, 'id'>[]>('id');
    expect(locked).toHaveLength(3);
    for (const { id } of locked)
      expect((await reader.get<Verification>(`/revisions/${id}/verification`)).body).toEqual({
        sound: true,
        differences: [],
      });
    for (const { id } of await db('projects').select<{ id: string }[]>('id'))
      expect(await firstBrokenEntry(db, id)).toBeUndefined();
  });

  it('is laid down once', async () => {
    const count = async () => (await demo.running.context.db('trail').count<{ count: string }[]>())[0]?.count;
    const before = await count();
    await seedDemo(demo.running.context, demo.running.summaries);
    expect(await count()).toBe(before);
  });
});

describe('a lock', () => {
  it('needs a reason for exactly what is left open', async () => {
    const detail = await calculationIn(server, 'checked');
    expect((await lock(server, detail.revision.id)).body.reasons).toEqual([]);
  });
});
