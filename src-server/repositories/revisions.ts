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

/** A change of a revision's row; the time of a lock is the database's own. */
export type RevisionChange = Partial<Omit<RevisionRow, 'id' | 'locked_at'>> & { locked_at?: 'now' };

const jsonColumns: readonly string[] = ['content', 'results', 'versions', 'reasons'];

export async function updateRevision(db: Database, id: string, change: RevisionChange): Promise<void> {
  const columns = Object.entries(change)
    .filter(([, value]) => value !== undefined)
    .map(([name, value]): [string, unknown] => {
      if (name === 'locked_at') return [name, db.fn.now()];
      return [name, jsonColumns.includes(name) ? JSON.stringify(value) : value];
    });
  await db('revisions').where({ id }).update(Object.fromEntries(columns));
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
      // A signature keeps the name under which it was given.
      person_name: db.raw('coalesce(s.signed_name, p.name)'),
      person_initials: db.raw('coalesce(s.signed_initials, p.initials)'),
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

/** Everybody who ever signed a revision as prepared, void signatures counted. */
export async function listPreparers(db: Database, revisionId: string): Promise<string[]> {
  return db('signatures')
    .where({ revision_id: revisionId, meaning: 'prepared' })
    .distinct()
    .pluck<string[]>('person_id');
}

/** Signs with the name as it is now; an earlier signature of the same meaning becomes void. */
export async function insertSignature(
  db: Database,
  row: { revision_id: string; meaning: Meaning; fingerprint: string },
  person: Person,
): Promise<void> {
  await voidSignatures(db, row.revision_id, row.meaning);
  await db('signatures').insert({
    ...row,
    person_id: person.id,
    signed_name: person.name,
    signed_initials: person.initials,
  });
}

/** Voids the valid signatures of a revision (of one meaning only, when given); answers how many. */
export async function voidSignatures(db: Database, revisionId: string, meaning?: Meaning): Promise<number> {
  const query = db('signatures').where({ revision_id: revisionId }).whereNull('voided_at');
  if (meaning !== undefined) void query.where({ meaning });
  return query.update({ voided_at: db.fn.now() });
}
