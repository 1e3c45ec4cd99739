import { createHash } from 'node:crypto';
import type { TrailEntry } from '#contract';
import { canonicalJson } from '#document';
import type { Database } from '../db/index';
import { joinedPerson, personColumns } from './people';

export interface NewTrailEntry {
  projectId: string;
  calculationId?: string | undefined;
  revisionId?: string | undefined;
  personId: string | null;
  act: string;
  sentence: string;
  detail?: Record<string, unknown>;
}

/** Hash of an entry bound to the one before it: nothing can be changed, taken out or put between. */
export function trailHash(previousHash: string, content: Record<string, unknown>): string {
  return createHash('sha256').update(previousHash).update(canonicalJson(content)).digest('hex');
}

/** Appends an entry; the project's row is locked, so that the chain has one order. */
export async function appendTrail(transaction: Database, entry: NewTrailEntry): Promise<void> {
  await transaction('projects').where({ id: entry.projectId }).forUpdate().first('id');
  const last = await transaction('trail')
    .where({ project_id: entry.projectId })
    .orderBy('id', 'desc')
    .first<{ hash: string } | undefined>('hash');
  const { rows } = await transaction.raw<{ rows: { now: Date }[] }>(
    `SELECT date_trunc('milliseconds', clock_timestamp()) AS now`,
  );
  const at = rows[0]?.now ?? new Date(0);
  const content = hashedContent({
    project_id: entry.projectId,
    calculation_id: entry.calculationId ?? null,
    revision_id: entry.revisionId ?? null,
    person_id: entry.personId,
    act: entry.act,
    sentence: entry.sentence,
    detail: entry.detail ?? {},
    at,
  });
  const previous = last?.hash ?? '';
  await transaction('trail').insert({
    ...content,
    detail: JSON.stringify(content.detail),
    previous_hash: previous,
    hash: trailHash(previous, content),
  });
}

interface HashedRow {
  project_id: string;
  calculation_id: string | null;
  revision_id: string | null;
  person_id: string | null;
  act: string;
  sentence: string;
  detail: Record<string, unknown>;
  at: Date;
}

function hashedContent(row: HashedRow): Record<string, unknown> {
  return { ...row, at: row.at.toISOString() };
}

/** Walks the chain of a project; answers the number of the first entry that does not fit, if any. */
export async function firstBrokenEntry(db: Database, projectId: string): Promise<number | undefined> {
  const rows = await db('trail')
    .where({ project_id: projectId })
    .orderBy('id')
    .select<(HashedRow & { id: string; hash: string; previous_hash: string })[]>();
  let previous = '';
  for (const {
    id,
    hash,
    previous_hash: before,
    project_id,
    calculation_id,
    revision_id,
    person_id,
    act,
    sentence,
    detail,
    at,
  } of rows) {
    const expected = trailHash(
      previous,
      hashedContent({ project_id, calculation_id, revision_id, person_id, act, sentence, detail, at }),
    );
    if (before !== previous || hash !== expected) return Number(id);
    previous = hash;
  }
  return undefined;
}

export async function listTrail(
  db: Database,
  projectId: string,
  filter: { calculationId?: string | undefined; before?: number | undefined },
  limit: number,
): Promise<TrailEntry[]> {
  const query = db('trail as t')
    .leftJoin('people as p', 'p.id', 't.person_id')
    .leftJoin('calculations as c', 'c.id', 't.calculation_id')
    .leftJoin('revisions as r', 'r.id', 't.revision_id')
    .where({ 't.project_id': projectId })
    .orderBy('t.id', 'desc')
    .limit(limit);
  if (filter.calculationId !== undefined) void query.where({ 't.calculation_id': filter.calculationId });
  if (filter.before !== undefined) void query.where('t.id', '<', filter.before);
  const rows = await query.select<Record<string, unknown>[]>({
    id: 't.id',
    at: 't.at',
    act: 't.act',
    sentence: 't.sentence',
    detail: 't.detail',
    hash: 't.hash',
    calculation_id: 'c.id',
    number: 'c.number',
    title: 'c.title',
    letter: 'r.letter',
    ...personColumns('p'),
  });
  return rows.map((row) => ({
    id: Number(row.id),
    at: (row.at as Date).toISOString(),
    person: row.person_id === null ? null : joinedPerson(row),
    calculation:
      row.calculation_id === null
        ? null
        : { id: String(row.calculation_id), number: String(row.number), title: String(row.title) },
    letter: row.letter === null ? null : String(row.letter),
    act: String(row.act),
    sentence: String(row.sentence),
    detail: row.detail as Record<string, unknown>,
    hash: String(row.hash),
  }));
}
