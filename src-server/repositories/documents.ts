import type { Database } from '../db/index';
import type { RevisionState } from '#contract';
import { voidSignatures } from './revisions';

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

/**
 * Appends updates in one transaction. Waits for a lock of the revision that is on its way; answers
 * false, and writes nothing, when `writable` says no to the state that it then finds. In a revision
 * that is being checked, a change voids the signatures.
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
    const writers = [...new Set(updates.flatMap(({ personId }) => personId ?? []))].sort();
    if (writers.length > 0) {
      await transaction('revision_writers')
        .insert(writers.map((person_id) => ({ revision_id: revisionId, person_id })))
        .onConflict(['revision_id', 'person_id'])
        .merge({ last_at: transaction.fn.now() });
    }
    const voided = row.state === 'for check' && (await voidSignatures(transaction, revisionId)) > 0;
    return { written: true, voided };
  });
}

/** Keeps a folded state that holds every update up to `throughId`; the updates stay, as the history of who wrote what. */
export async function saveState(
  db: Database,
  revisionId: string,
  content: Uint8Array,
  throughId: string,
): Promise<void> {
  await db('document_states')
    .insert({ revision_id: revisionId, content: Buffer.from(content), through_id: throughId })
    .onConflict('revision_id')
    .merge(['content', 'through_id'])
    .whereRaw('document_states.through_id <= ?', [throughId]);
}
