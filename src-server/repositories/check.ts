import type { Remark, Tick } from '#contract';
import type { Database } from '../db/index';
import { joinedPerson, personColumns } from './people';

type Row = Record<string, unknown>;
const iso = (value: unknown) => (value as Date).toISOString();

export async function listRemarks(db: Database, revisionId: string): Promise<Remark[]> {
  const rows = await db('remarks as r')
    .join('people as p', 'p.id', 'r.author_id')
    .where({ 'r.revision_id': revisionId })
    .orderBy('r.number')
    .select<Row[]>({
      id: 'r.id',
      number: 'r.number',
      cell_id: 'r.cell_id',
      content: 'r.content',
      closed: 'r.closed',
      created_at: 'r.created_at',
      ...personColumns('p'),
    });
  const answers = await db('remark_answers as a')
    .join('people as p', 'p.id', 'a.author_id')
    .whereIn(
      'a.remark_id',
      rows.map((row) => String(row.id)),
    )
    .orderBy('a.created_at')
    .select<Row[]>({
      id: 'a.id',
      remark_id: 'a.remark_id',
      content: 'a.content',
      created_at: 'a.created_at',
      ...personColumns('p'),
    });
  return rows.map((row) => {
    const own = answers.filter((answer) => answer.remark_id === row.id);
    const author = joinedPerson(row);
    const answered = own.some((answer) => joinedPerson(answer).id !== author.id);
    return {
      id: String(row.id),
      number: Number(row.number),
      cellId: String(row.cell_id),
      author,
      text: String(row.content),
      at: iso(row.created_at),
      state: row.closed === true ? 'closed' : answered ? 'answered' : 'open',
      answers: own.map((answer) => ({
        id: String(answer.id),
        author: joinedPerson(answer),
        text: String(answer.content),
        at: iso(answer.created_at),
      })),
    };
  });
}

export interface RemarkRow {
  id: string;
  revision_id: string;
  number: number;
  author_id: string;
  closed: boolean;
}

export async function findRemark(db: Database, id: string): Promise<RemarkRow | undefined> {
  return db('remarks').where({ id }).first<RemarkRow | undefined>('id', 'revision_id', 'number', 'author_id', 'closed');
}

/** Writes a remark with the next number of its revision, whose row the transaction has locked. */
export async function insertRemark(
  transaction: Database,
  row: { revision_id: string; cell_id: string; author_id: string; content: string },
): Promise<number> {
  await transaction('revisions').where({ id: row.revision_id }).forUpdate().first('id');
  const [last] = await transaction('remarks')
    .where({ revision_id: row.revision_id })
    .max<{ last: number | null }[]>({ last: 'number' });
  const number = (last?.last ?? 0) + 1;
  await transaction('remarks').insert({ ...row, number });
  return number;
}

export async function insertAnswer(
  db: Database,
  row: { remark_id: string; author_id: string; content: string },
): Promise<void> {
  await db('remark_answers').insert(row);
}

/** Answers whether that was a change. */
export async function setRemarkClosed(db: Database, id: string, closed: boolean): Promise<boolean> {
  return (await db('remarks').where({ id, closed: !closed }).update({ closed })) > 0;
}

export async function listTicks(db: Database, revisionId: string): Promise<Tick[]> {
  const rows = await db('ticks as t')
    .join('people as p', 'p.id', 't.person_id')
    .where({ 't.revision_id': revisionId })
    .select<Row[]>({
      cell_id: 't.cell_id',
      fingerprint: 't.fingerprint',
      depends_on: 't.depends_on',
      ticked_at: 't.ticked_at',
      ...personColumns('p'),
    });
  return rows.map((row) => ({
    cellId: String(row.cell_id),
    person: joinedPerson(row),
    at: iso(row.ticked_at),
    fingerprint: String(row.fingerprint),
    dependsOn: row.depends_on as Record<string, string>,
  }));
}

export async function setTick(
  db: Database,
  row: {
    revision_id: string;
    cell_id: string;
    person_id: string;
    fingerprint: string;
    depends_on: Record<string, string>;
  },
): Promise<void> {
  await db('ticks')
    .insert({ ...row, depends_on: JSON.stringify(row.depends_on), ticked_at: db.fn.now() })
    .onConflict(['revision_id', 'cell_id'])
    .merge();
}

/** Answers whether there was one. */
export async function deleteTick(db: Database, revisionId: string, cellId: string): Promise<boolean> {
  return (await db('ticks').where({ revision_id: revisionId, cell_id: cellId }).delete()) > 0;
}
