import { createHash } from 'node:crypto';
import type { Knex } from 'knex';
import * as Y from 'yjs';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { openDocument } from '#document';
import { may, type RevisionDetail, type RevisionState, type TrailPage, type Verification } from '#contract';
import { appendUpdates } from '../../src-server/repositories/documents';
import { firstBrokenEntry } from '../../src-server/repositories/trail';
import { contentFingerprint, loadDocument } from '../../src-server/services/documents';
import { letterAfter } from '../../src-server/services/revisions';
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
let db: Knex;
beforeAll(async () => {
  server = await startTestServer();
  db = server.running.context.db;
});
afterAll(() => server.close());

const code = (body: unknown) => (body as { error?: { code: string } }).error?.code;
const writable = (state: RevisionState) => may('engineer', 'content.write', state);
let inserted = 0;

/** Writes a line at the head of a cell, as the sync endpoint does for a browser. */
async function write(
  revisionId: string,
  text = `# line ${(inserted += 1)}\n`,
  part: 'engineer' | 'second' = 'engineer',
) {
  const { doc } = await loadDocument(db, revisionId);
  const before = Y.encodeStateVector(doc);
  openDocument(doc, { newId: () => 'none' })
    .source('c21')
    ?.insert(0, text);
  const content = Y.encodeStateAsUpdate(doc, before);
  const personId = server.client[part].account?.id ?? '';
  return appendUpdates(db, revisionId, [{ personId, content }], writable);
}

describe('a locked revision, by SQL', () => {
  let detail: RevisionDetail;
  let draft: RevisionDetail;
  let someone: string | undefined;

  beforeAll(async () => {
    detail = await createCalculation(server);
    const { id } = detail.revision;
    const { checker, engineer } = server.client;
    const asked = await checker.post<{ id: string }[]>(`/revisions/${id}/remarks`, { cellId: 'c21', text: 'Why?' });
    const remark = asked.body[0]?.id ?? '';
    await engineer.post(`/remarks/${remark}/answers`, { text: 'So.' });
    await checker.post(`/remarks/${remark}/close`);
    await write(id);
    await handOver(server, id);
    await tickAll(server, id);
    await signCheck(server, id);
    expect((await lock(server, id)).body.revision.state).toBe('locked');
    draft = await createCalculation(server);
    someone = server.client.checker.account?.id;
  });

  const of = () => ({ revision_id: detail.revision.id });
  const elsewhere = () => ({ revision_id: draft.revision.id });
  const attempts: [what: string, attempt: () => PromiseLike<unknown>][] = [
    ['its content', () => db('revisions').where({ id: detail.revision.id }).update({ content: '{}' })],
    ['its results', () => db('revisions').where({ id: detail.revision.id }).update({ results: '{}' })],
    ['its versions', () => db('revisions').where({ id: detail.revision.id }).update({ versions: '{}' })],
    ['its reasons', () => db('revisions').where({ id: detail.revision.id }).update({ reasons: '[{}]' })],
    ['its canonical text', () => db('revisions').where({ id: detail.revision.id }).update({ canonical: '{}' })],
    ['its fingerprint', () => db('revisions').where({ id: detail.revision.id }).update({ fingerprint: 'other' })],
    ['its letter', () => db('revisions').where({ id: detail.revision.id }).update({ letter: 'Z' })],
    ['its note', () => db('revisions').where({ id: detail.revision.id }).update({ change_note: 'other' })],
    ['the time of its lock', () => db('revisions').where({ id: detail.revision.id }).update({ locked_at: new Date() })],
    [
      'the calculation it belongs to',
      () => db('revisions').where({ id: detail.revision.id }).update({ calculation_id: draft.calculation.id }),
    ],
    ['itself, away', () => db('revisions').where({ id: detail.revision.id }).delete()],
    ...(['draft', 'for check', 'checked'] as const).map((state): [string, () => PromiseLike<unknown>] => [
      `its state to ${state}`,
      () => db('revisions').where({ id: detail.revision.id }).update({ state }),
    ]),
    [
      'an update of its document, added',
      () => db('document_updates').insert({ ...of(), content: Buffer.from([0, 0]) }),
    ],
    [
      'an update, changed',
      () =>
        db('document_updates')
          .where(of())
          .update({ content: Buffer.from([0, 0]) }),
    ],
    ['an update, deleted', () => db('document_updates').where(of()).delete()],
    ['an update, moved away', () => db('document_updates').where(of()).update(elsewhere())],
    ['a folded state, added', () => db('document_states').insert({ ...of(), content: Buffer.from([0, 0]) })],
    ['who wrote in it, added', () => db('revision_writers').insert({ ...of(), person_id: someone })],
    ['who wrote in it, deleted', () => db('revision_writers').where(of()).delete()],
    [
      'a remark, added',
      () => db('remarks').insert({ ...of(), number: 99, cell_id: 'c21', author_id: someone, content: 'late' }),
    ],
    ['a remark, changed', () => db('remarks').where(of()).update({ content: 'other' })],
    ['a remark, reopened', () => db('remarks').where(of()).update({ closed: false })],
    [
      'a remark, moved away',
      () =>
        db('remarks')
          .where(of())
          .update({ ...elsewhere(), number: 50 }),
    ],
    ['a remark, deleted', () => db('remarks').where(of()).delete()],
    [
      'an answer, changed',
      () =>
        db('remark_answers').whereIn('remark_id', db('remarks').select('id').where(of())).update({ content: 'other' }),
    ],
    [
      'an answer, deleted',
      () => db('remark_answers').whereIn('remark_id', db('remarks').select('id').where(of())).delete(),
    ],
    ['a tick, changed', () => db('ticks').where(of()).update({ fingerprint: 'other' })],
    ['a tick, moved away', () => db('ticks').where(of()).update(elsewhere())],
    ['a tick, deleted', () => db('ticks').where(of()).delete()],
    [
      'a signature, added',
      () => db('signatures').insert({ ...of(), person_id: someone, meaning: 'checked', fingerprint: 'x' }),
    ],
    ['a signature, made void', () => db('signatures').where(of()).update({ voided_at: new Date() })],
    ['a signature, given to another', () => db('signatures').where(of()).update({ person_id: someone })],
    ['a signature, moved away', () => db('signatures').where(of()).update(elsewhere())],
    ['a signature, deleted', () => db('signatures').where(of()).delete()],
  ];

  it.each(attempts)('cannot be changed: %s', async (_what, attempt) => {
    await expect(Promise.resolve(attempt())).rejects.toMatchObject({ code: '23000' });
  });

  it.each([
    'revisions',
    'document_updates',
    'document_states',
    'revision_writers',
    'remarks',
    'remark_answers',
    'ticks',
    'signatures',
    'trail',
  ])('its records are not emptied: %s', async (table) => {
    await expect(db.raw('TRUNCATE ?? CASCADE', [table])).rejects.toMatchObject({ code: '23000' });
  });

  it('goes on only to superseded or withdrawn, and from there nowhere', async () => {
    const locked = await calculationIn(server, 'locked');
    const to = (state: RevisionState) => db('revisions').where({ id: locked.revision.id }).update({ state });
    await to('superseded');
    for (const state of ['locked', 'draft', 'withdrawn'] as const)
      await expect(Promise.resolve(to(state))).rejects.toMatchObject({ code: '23000' });
  });

  it('is one in force for a calculation, by a constraint', async () => {
    const row = await db('revisions').where({ id: detail.revision.id }).first<Record<string, unknown>>();
    const { id: _id, ...rest } = row;
    const copy = {
      ...rest,
      letter: 'B',
      ...Object.fromEntries(
        ['content', 'results', 'versions', 'reasons'].map((name) => [name, JSON.stringify(rest[name])]),
      ),
    };
    await expect(Promise.resolve(db('revisions').insert(copy))).rejects.toMatchObject({
      constraint: 'revisions_one_in_force',
    });
  });
});

describe('an open revision, by SQL', () => {
  it('that is checked takes no content', async () => {
    const { revision } = await calculationIn(server, 'checked');
    const row = { revision_id: revision.id, content: Buffer.from([0, 0]) };
    await expect(Promise.resolve(db('document_updates').insert(row))).rejects.toMatchObject({ code: '23000' });
    expect(await write(revision.id)).toEqual({ written: false, voided: false });
  });

  it('keeps every signature, also those that are void', async () => {
    const { revision } = await calculationIn(server, 'checked');
    await server.client.lead.post(`/revisions/${revision.id}/return`, { reason: 'Once more.' });
    const signatures = () => db('signatures').where({ revision_id: revision.id });
    expect(await signatures()).toHaveLength(2);
    await expect(Promise.resolve(signatures().delete())).rejects.toMatchObject({ code: '23000' });
    await expect(Promise.resolve(signatures().update({ voided_at: null }))).rejects.toMatchObject({ code: '23000' });
  });

  it('is one at a time for a calculation, by a constraint', async () => {
    const { calculation } = await calculationIn(server, 'draft');
    await expect(
      Promise.resolve(db('revisions').insert({ calculation_id: calculation.id, letter: 'B' })),
    ).rejects.toMatchObject({ constraint: 'revisions_one_open' });
  });
});

describe('content that changes while it is checked', () => {
  it('voids the signature in the same transaction, with an entry in the trail, and hides the earlier one from nobody', async () => {
    const { revision } = await calculationIn(server, 'for check');
    expect(await write(revision.id, '# changed\n', 'second')).toEqual({ written: true, voided: true });
    const { body } = await server.client.reader.get<RevisionDetail>(`/revisions/${revision.id}`);
    expect(body.revision).toMatchObject({ state: 'for check', signatures: [] });
    expect(body.writers.map((writer) => writer.signInName)).toEqual(['engineer', 'second']);
    const trail = await server.client.reader.get<TrailPage>(`/projects/${server.projectId}/trail`);
    expect(trail.body.entries.slice(0, 2).map(({ act, sentence, person }) => [act, sentence, person?.name])).toEqual([
      ['revision.void', 'changed revision A after it was signed: the signatures are void', 'P. second'],
      ['content.write', 'wrote in revision A', 'P. second'],
    ]);
    expect(await db('signatures').where({ revision_id: revision.id }).whereNotNull('voided_at')).toHaveLength(1);
  });

  it('is not checked without being signed as prepared again', async () => {
    const { revision } = await calculationIn(server, 'for check');
    await write(revision.id);
    await tickAll(server, revision.id);
    const refused = await signCheck(server, revision.id);
    expect([refused.status, code(refused.body)]).toEqual([409, 'CONDITIONS_OPEN']);
    expect(JSON.stringify(refused.body)).toContain('prepared');
    await handOver(server, revision.id);
    expect((await signCheck(server, revision.id)).status).toBe(200);
  });

  it('makes exactly those ticks fall whose values it changes', async () => {
    const { revision, calculation } = await calculationIn(server, 'for check');
    await tickAll(server, revision.id);
    await write(revision.id, '# only a note\n');
    await server.running.summaries.compute(revision.id);
    const row = async () => {
      const { body } = await server.client.reader.get<{ calculationId: string; changed: number }[]>(
        `/projects/${server.projectId}/calculations`,
      );
      return body.find((one) => one.calculationId === calculation.id)?.changed;
    };
    expect(await row()).toBe(0);
    await write(revision.id, 'x_new = 3 m\n');
    await server.running.summaries.compute(revision.id);
    expect(await row()).toBe(1);
  });

  it('written again and again by one person within half an hour is one entry of the trail', async () => {
    const { revision } = await calculationIn(server, 'draft');
    for (let times = 0; times < 5; times += 1) await write(revision.id);
    const entries = await db('trail').where({ revision_id: revision.id, act: 'content.write' });
    expect(entries).toHaveLength(1);
    await db('revision_writers').where({ revision_id: revision.id }).update({ last_at: '2020-01-01' });
    await write(revision.id);
    expect(await db('trail').where({ revision_id: revision.id, act: 'content.write' })).toHaveLength(2);
  });
});

describe('who signs', () => {
  it('a check is nobody who wrote in the revision, whatever the part is today', async () => {
    const { administrator, second, checker } = server.client;
    const { revision } = await calculationIn(server, 'draft');
    await write(revision.id, '# mine\n', 'second');
    await handOver(server, revision.id);
    await tickAll(server, revision.id);
    const path = `/projects/${server.projectId}/members/${second.account?.id ?? ''}`;
    await administrator.put(path, { role: 'checker' });
    const contentFingerprint = await shownFingerprint(second, revision.id);
    const refused = await second.post(`/revisions/${revision.id}/check`, {
      password: testPassword,
      contentFingerprint,
    });
    expect([refused.status, code(refused.body)]).toEqual([403, 'NOT_INDEPENDENT']);
    const named = await server.client.engineer.post(`/revisions/${revision.id}/hand-over`, {
      password: testPassword,
      contentFingerprint,
      checkerId: second.account?.id,
    });
    expect([named.status, code(named.body)]).toEqual([403, 'NOT_INDEPENDENT']);
    await administrator.put(path, { role: 'engineer' });
    expect((await signCheck(server, revision.id)).status).toBe(200);
    expect(checker.account?.id).not.toBe(second.account?.id);
  });

  it('a check is nobody who signed it as prepared, also without a letter of their own', async () => {
    const { administrator, second } = server.client;
    const { revision } = await calculationIn(server, 'draft');
    const contentFingerprint = await shownFingerprint(second, revision.id);
    await second.post(`/revisions/${revision.id}/hand-over`, { password: testPassword, contentFingerprint });
    await tickAll(server, revision.id);
    const path = `/projects/${server.projectId}/members/${second.account?.id ?? ''}`;
    await administrator.put(path, { role: 'checker' });
    const refused = await second.post(`/revisions/${revision.id}/check`, {
      password: testPassword,
      contentFingerprint,
    });
    expect([refused.status, code(refused.body)]).toEqual([403, 'NOT_INDEPENDENT']);
    await administrator.put(path, { role: 'engineer' });
  });

  it('stands with the name of that day, and with the time of the database', async () => {
    const { administrator, lead } = server.client;
    const before = Date.now();
    const { revision } = await calculationIn(server, 'locked');
    await administrator.patch(`/people/${lead.account?.id ?? ''}`, { name: 'P. Married' });
    const { body } = await lead.get<RevisionDetail>(`/revisions/${revision.id}`);
    const approved = body.revision.signatures.find((signature) => signature.meaning === 'approved');
    expect(approved?.person.name).toBe('P. lead');
    expect(Date.parse(approved?.signedAt ?? '')).toBeGreaterThan(before - 5000);
    expect((await lead.get<Verification>(`/revisions/${revision.id}/verification`)).body.differences).toEqual([]);
    await administrator.patch(`/people/${lead.account?.id ?? ''}`, { name: 'P. lead' });
  });
});

describe('at the same moment', () => {
  it('of two locks one is done', async () => {
    const { revision } = await calculationIn(server, 'checked');
    const answers = await Promise.all([
      lock(server, revision.id),
      lock(server, revision.id),
      lock(server, revision.id),
    ]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409, 409]);
    const approvals = await db('signatures').where({ revision_id: revision.id, meaning: 'approved' });
    expect(approvals).toHaveLength(1);
    expect(await db('trail').where({ revision_id: revision.id, act: 'revision.lock' })).toHaveLength(1);
  });

  it('of two who begin the next revision one does', async () => {
    const { calculation } = await calculationIn(server, 'locked');
    const begin = (part: 'engineer' | 'second' | 'lead') =>
      server.client[part].post(`/calculations/${calculation.id}/revisions`);
    const answers = await Promise.all([begin('engineer'), begin('second'), begin('lead')]);
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 409, 409]);
    for (const { status, body } of answers) if (status === 409) expect(code(body)).toBe('WRONG_STATE');
  });

  it('a check and an edit never both pass: what is checked is what was signed', async () => {
    for (let round = 0; round < 6; round += 1) {
      const { revision } = await calculationIn(server, 'for check');
      await tickAll(server, revision.id);
      const contentFingerprint = await shownFingerprint(server.client.checker, revision.id);
      const [edits, signed] = await Promise.all([
        Promise.all(Array.from({ length: 4 }, (_, edit) => write(revision.id, `# ${round}.${edit}\n`))),
        server.client.checker.post(`/revisions/${revision.id}/check`, { password: testPassword, contentFingerprint }),
      ]);
      const { body } = await server.client.reader.get<{ settings: never; cells: never[] }>(
        `/revisions/${revision.id}/content`,
      );
      const written = edits.filter((edit) => edit.written).length;
      const present = body.cells.filter((cell: { source: string }) => cell.source.includes(`# ${round}.`)).length > 0;
      expect(present).toBe(written > 0);
      if (signed.status === 200) {
        expect(written).toBe(0);
        expect(contentFingerprint).toBe(contentFingerprint.length === 64 ? fingerprintNow(body) : '');
      } else expect(signed.status).toBe(409);
    }
  });

  it('edits, remarks, ticks, returns and hand-overs do not stand in each other’s way for good', async () => {
    const { checker, engineer, lead } = server.client;
    const { revision } = await calculationIn(server, 'for check');
    const { id } = revision;
    const acts = Array.from({ length: 6 }, (_, round) => [
      write(id),
      write(id, `# other ${round}\n`, 'second'),
      checker.post(`/revisions/${id}/remarks`, { cellId: 'c21', text: `Round ${round}` }),
      checker.put(`/revisions/${id}/ticks/c11`, { fingerprint: 'stale' }),
      lead.post(`/revisions/${id}/return`, { reason: `Round ${round}` }),
      handOver(server, id),
      engineer.get(`/revisions/${id}/conditions`),
    ]).flat();
    const answers = await Promise.all(acts);
    // 40P01, a deadlock, would be an answer 500 or a failed promise.
    for (const answer of answers) if ('status' in answer) expect(answer.status).toBeLessThan(500);
    expect(await firstBrokenEntry(db, server.projectId)).toBeUndefined();
  });
});

/** Of an answer with more in it than a fingerprint is made of. */
const fingerprintNow = ({ settings, cells }: { settings: never; cells: never[] }): string =>
  contentFingerprint({ settings, cells });

describe('the frozen record', () => {
  it('has the SHA-256 of everything that was signed', async () => {
    const { revision } = await calculationIn(server, 'locked');
    const row = await db('revisions')
      .where({ id: revision.id })
      .first<{ canonical: string; fingerprint: string; results: Record<string, string> }>();
    expect(createHash('sha256').update(row.canonical).digest('hex')).toBe(row.fingerprint);
    expect(revision.fingerprint).toBe(row.fingerprint);
    const record = JSON.parse(row.canonical) as Record<string, unknown[] & Record<string, string>>;
    expect(Object.keys(record).sort()).toEqual([
      'changeNote',
      'content',
      'reasons',
      'remarks',
      'results',
      'signatures',
      'ticks',
      'versions',
    ]);
    expect(Object.keys(record.versions ?? {}).sort()).toEqual(['catalogue', 'engine', 'properties']);
    expect(record.ticks?.length).toBeGreaterThan(3);
    expect(record.signatures).toHaveLength(2);
    // 0.324 m is a given of the sheet.
    expect(row.results).toMatchObject({ D: '0.324 m' });
  });

  it('is found sound, and each way to tamper with it behind the triggers is found', async () => {
    const { revision } = await calculationIn(server, 'locked');
    const other = await calculationIn(server, 'locked');
    const verify = async (id = revision.id) =>
      (await server.client.reader.get<Verification>(`/revisions/${id}/verification`)).body;
    expect(await verify()).toEqual({ sound: true, differences: [] });
    const row = await db('revisions').where({ id: revision.id }).first<Record<string, unknown>>();
    const tampered: [table: string, change: Record<string, unknown>, found: RegExp][] = [
      ['revisions', { canonical: String(row.canonical).replace('0.324', '0.325') }, /fingerprint/],
      ['revisions', { fingerprint: 'f'.repeat(64) }, /fingerprint/],
      ['revisions', { content: JSON.stringify(row.content).replace('3.2 m/s', '3.3 m/s') }, /content/],
      ['revisions', { results: JSON.stringify(row.results).replace('0.324', '0.325') }, /results/],
      ['revisions', { change_note: 'Another' }, /note/],
      ['ticks', { fingerprint: 'other' }, /ticks/],
      ['signatures', { person_id: server.client.reader.account?.id }, /signatures/],
      ['signatures', { fingerprint: 'f'.repeat(64) }, /lock belongs to another/],
    ];
    for (const [table, change, found] of tampered) {
      const key = table === 'revisions' ? { id: revision.id } : { revision_id: revision.id };
      await db
        .transaction(async (transaction) => {
          const rows = await transaction(table).where(key).select<Record<string, unknown>[]>('*');
          await transaction.raw('ALTER TABLE ?? DISABLE TRIGGER USER', [table]);
          await transaction(table).where(key).update(change);
          await transaction.raw('ALTER TABLE ?? ENABLE TRIGGER USER', [table]);
          expect(rows.length).toBeGreaterThan(0);
          const { verifyRevision } = await import('../../src-server/services/verification');
          const account = server.client.reader.account;
          if (account === undefined) throw new Error('There is no reader.');
          const { sound, differences } = await verifyRevision({ db: transaction }, account, revision.id);
          expect([change, sound]).toEqual([change, false]);
          expect(differences.join('; ')).toMatch(found);
          await transaction.rollback();
        })
        .catch((error: unknown) => {
          if (!String(error).includes('rejected with non-error')) throw error;
        });
    }
    expect(await verify()).toEqual({ sound: true, differences: [] });
    expect((await verify(other.revision.id)).sound).toBe(true);
  });

  it('is not there while a revision is open', async () => {
    const { revision } = await calculationIn(server, 'checked');
    const answer = await server.client.reader.get(`/revisions/${revision.id}/verification`);
    expect([answer.status, code(answer.body)]).toEqual([409, 'WRONG_STATE']);
  });
});

describe('the trail', () => {
  it('shows a changed, a removed, an added and a moved entry', async () => {
    await calculationIn(server, 'locked');
    const rows = await db('trail')
      .where({ project_id: server.projectId })
      .orderBy('id')
      .select<Record<string, unknown>[]>('*');
    const fifth = rows[5] ?? {};
    const attempts: ((transaction: Knex) => Promise<unknown>)[] = [
      async (transaction) => transaction('trail').where({ id: fifth.id }).update({ sentence: 'nothing' }),
      async (transaction) => transaction('trail').where({ id: fifth.id }).update({ person_id: null }),
      async (transaction) => transaction('trail').where({ id: fifth.id }).update({ at: '2020-01-01' }),
      async (transaction) => transaction('trail').where({ id: fifth.id }).delete(),
      async (transaction) => {
        const { id: _id, ...rest } = fifth;
        await transaction('trail').insert({ ...rest, detail: JSON.stringify(rest.detail) });
      },
      async (transaction) => {
        await transaction('trail').where({ id: fifth.id }).update({ id: -1 });
      },
    ];
    for (const [index, attempt] of attempts.entries()) {
      let broken: number | undefined;
      await db
        .transaction(async (transaction) => {
          await transaction.raw('ALTER TABLE trail DISABLE TRIGGER USER');
          await attempt(transaction);
          await transaction.raw('ALTER TABLE trail ENABLE TRIGGER USER');
          broken = await firstBrokenEntry(transaction, server.projectId);
          throw new Error('undo');
        })
        .catch((error: unknown) => expect(String(error)).toContain('undo'));
      expect([index, broken]).not.toEqual([index, undefined]);
    }
    expect(await firstBrokenEntry(db, server.projectId)).toBeUndefined();
  });
});

describe('letters', () => {
  it.each([
    ['A', 'B'],
    ['Y', 'Z'],
    ['Z', 'AA'],
    ['AZ', 'BA'],
    ['ZZ', 'AAA'],
  ])('after %s comes %s', (letter, next) => expect(letterAfter(letter)).toBe(next));
});
