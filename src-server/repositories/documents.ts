import type { Database } from '../db/index';
import type { RevisionState } from '#contract';
import { voidSignatures } from './revisions';
import { appendTrail } from './trail';

export interface StoredUpdate {
  id: string;
  content: Buffer;
}

/** Everything that is stored of a document: a folded state, and the updates after it. */
export async function loadStored(
  db: Database,
  revisionId: string,
): Promise<{ state: Buffer | undefined; updates: StoredUpdate[] }> {
  const state = await db('document_states')
    .where({ revision_id: revisionId })
    .first<{ content: Buffer; through_id: string } | undefined>();
  const updates = await db('document_updates')
    .where({ revision_id: revisionId })
    .where('id', '>', state?.through_id ?? 0)
    .orderBy('id')
    .select<StoredUpdate[]>('id', 'content');
  return { state: state?.content, updates };
}

export interface NewUpdate {
  personId: string | null;
  content: Uint8Array;
}

/** Somebody's work in a revision after a pause this long is a new entry of the trail, in minutes. */
const newSpellAfter = 30;

/** Notes who wrote; answers those who began or came back after a pause. */
async function noteWriters(
  transaction: Database,
  revisionId: string,
  updates: readonly NewUpdate[],
): Promise<string[]> {
  // In one order everywhere, so that two transactions never wait for each other.
  const writers = [...new Set(updates.flatMap(({ personId }) => personId ?? []))].sort();
  if (writers.length === 0) return [];
  const recent = await transaction('revision_writers')
    .where({ revision_id: revisionId })
    .whereIn('person_id', writers)
    .whereRaw(`last_at > now() - ? * interval '1 minute'`, [newSpellAfter])
    .pluck<string[]>('person_id');
  await transaction('revision_writers')
    .insert(writers.map((person_id) => ({ revision_id: revisionId, person_id })))
    .onConflict(['revision_id', 'person_id'])
    .merge({ last_at: transaction.fn.now() });
  return writers.filter((person) => !recent.includes(person));
}

async function recordWriting(
  transaction: Database,
  revisionId: string,
  personId: string | null,
  act: string,
  sentence: (letter: string) => string,
): Promise<void> {
  const row = await transaction('revisions as r')
    .join('calculations as c', 'c.id', 'r.calculation_id')
    .where({ 'r.id': revisionId })
    .first<{ projectId: string; calculationId: string; letter: string } | undefined>({
      projectId: 'c.project_id',
      calculationId: 'c.id',
      letter: 'r.letter',
    });
  if (row === undefined) return;
  const { letter, ...place } = row;
  await appendTrail(transaction, { ...place, revisionId, personId, act, sentence: sentence(letter) });
}

/**
 * Appends updates in one transaction. Waits for a lock of the revision that is on its way; answers
 * false, and writes nothing, when `writable` says no to the state that it then finds. In a revision
 * that is being checked, a change voids the signatures, in the same transaction and with an entry in
 * the trail.
 */
export async function appendUpdates(
  db: Database,
  revisionId: string,
  updates: readonly NewUpdate[],
  writable: (state: RevisionState) => boolean,
): Promise<{ written: boolean; voided: boolean }> {
  return db.transaction(async (transaction) => {
    const row = await transaction('revisions')
      .where({ id: revisionId })
      .forShare()
      .first<{ state: RevisionState } | undefined>('state');
    if (row === undefined || !writable(row.state)) return { written: false, voided: false };
    await transaction('document_updates').insert(
      updates.map(({ personId, content }) => ({
        revision_id: revisionId,
        person_id: personId,
        content: Buffer.from(content),
      })),
    );
    const begun = await noteWriters(transaction, revisionId, updates);
    const voided = row.state === 'for check' && (await voidSignatures(transaction, revisionId)) > 0;
    // The trail comes last: it locks the project's row, and whoever holds that one must wait for nothing more.
    for (const personId of begun)
      await recordWriting(
        transaction,
        revisionId,
        personId,
        'content.write',
        (letter) => `wrote in revision ${letter}`,
      );
    if (voided) {
      const by = updates.at(-1)?.personId ?? null;
      await recordWriting(
        transaction,
        revisionId,
        by,
        'revision.void',
        (letter) => `changed revision ${letter} after it was signed: the signatures are void`,
      );
    }
    return { written: true, voided };
  });
}

/**
 * Keeps a folded state that holds every update up to `throughId`; the updates stay, as the history of
 * who wrote what. Of a revision that can no longer be written nothing is kept anew.
 */
export async function saveState(
  db: Database,
  revisionId: string,
  content: Uint8Array,
  throughId: string,
): Promise<void> {
  await db.raw(
    `INSERT INTO document_states (revision_id, content, through_id)
     SELECT id, CAST(:content AS bytea), CAST(:throughId AS bigint) FROM revisions
       WHERE id = :revisionId AND state IN ('draft', 'for check', 'checked') FOR SHARE
     ON CONFLICT (revision_id) DO UPDATE SET content = excluded.content, through_id = excluded.through_id
       WHERE document_states.through_id <= excluded.through_id`,
    { revisionId, content: Buffer.from(content), throughId },
  );
}
