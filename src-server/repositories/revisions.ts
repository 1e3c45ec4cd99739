import type { Meaning, Person, RevisionState, Signature } from '#contract';
import type { Database } from '../db/index';
import { joinedPerson, personColumns } from './people';

export interface RevisionRow {
  id: string;
  calculation_id: string;
  letter: string;
  state: RevisionState;
  change_note: string;
  begun_at: Date;
  checker_id: string | null;
  locked_at: Date | null;
  content: unknown;
  results: unknown;
  versions: unknown;
  reasons: { about: string; reason: string }[];
  canonical: string | null;
  fingerprint: string | null;
}

const inOrder = (db: Database) => db<RevisionRow>('revisions').orderBy([{ column: 'begun_at' }, { column: 'letter' }]);

export async function findRevision(db: Database, id: string): Promise<RevisionRow | undefined> {
  return db<RevisionRow>('revisions').where({ id }).first() as Promise<RevisionRow | undefined>;
}

/** The revision with its row locked until the transaction ends: no update of its document gets in meanwhile. */
export async function lockRevisionRow(transaction: Database, id: string): Promise<RevisionRow | undefined> {
  return transaction<RevisionRow>('revisions').where({ id }).forUpdate().first() as Promise<RevisionRow | undefined>;
}

export async function listRevisions(db: Database, calculationId: string): Promise<RevisionRow[]> {
  return inOrder(db).where({ calculation_id: calculationId });
}

export async function insertRevision(
  db: Database,
  row: { calculation_id: string; letter: string; begun_by: string },
): Promise<string> {
  const [inserted] = await db('revisions').insert(row).returning<{ id: string }[]>('id');
  if (inserted === undefined) throw new Error('The revision was not written.');
  return inserted.id;
}

export async function updateRevision(
  db: Database,
  id: string,
  change: Partial<Omit<RevisionRow, 'id'>>,
): Promise<void> {
  const json = (value: unknown) => (value === undefined ? {} : { toJson: JSON.stringify(value) });
  const { content, results, versions, reasons, ...plain } = change;
  const documents = { content, results, versions, reasons };
  const columns: Record<string, unknown> = { ...plain };
  for (const [name, value] of Object.entries(documents)) if (value !== undefined) columns[name] = json(value).toJson;
  await db('revisions').where({ id }).update(columns);
}

export async function listWriters(db: Database, revisionId: string): Promise<Person[]> {
  const rows = await db('revision_writers as w')
    .join('people as p', 'p.id', 'w.person_id')
    .where({ 'w.revision_id': revisionId })
    .orderBy('w.first_at')
    .select<Record<string, unknown>[]>(personColumns('p'));
  return rows.map((row) => joinedPerson(row));
}

export async function listSignatures(db: Database, revisionIds: readonly string[]): Promise<Map<string, Signature[]>> {
  const rows = await db('signatures as s')
    .join('people as p', 'p.id', 's.person_id')
    .whereIn('s.revision_id', revisionIds)
    .whereNull('s.voided_at')
    .orderBy('s.signed_at')
    .select<Record<string, unknown>[]>({
      revision_id: 's.revision_id',
      meaning: 's.meaning',
      fingerprint: 's.fingerprint',
      signed_at: 's.signed_at',
      ...personColumns('p'),
    });
  const signatures = new Map<string, Signature[]>(revisionIds.map((id) => [id, []]));
  for (const row of rows) {
    signatures.get(String(row.revision_id))?.push({
      meaning: row.meaning as Meaning,
      person: joinedPerson(row),
      signedAt: (row.signed_at as Date).toISOString(),
      fingerprint: String(row.fingerprint),
    });
  }
  return signatures;
}

export async function insertSignature(
  db: Database,
  row: { revision_id: string; person_id: string; meaning: Meaning; fingerprint: string },
): Promise<void> {
  await voidSignatures(db, row.revision_id, row.meaning);
  await db('signatures').insert(row);
}

/** Voids the valid signatures of a revision (of one meaning only, when given); answers how many. */
export async function voidSignatures(db: Database, revisionId: string, meaning?: Meaning): Promise<number> {
  const query = db('signatures').where({ revision_id: revisionId }).whereNull('voided_at');
  if (meaning !== undefined) void query.where({ meaning });
  return query.update({ voided_at: db.fn.now() });
}
