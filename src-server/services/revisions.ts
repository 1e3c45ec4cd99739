import { acts, may, type Account, type RevisionDetail, type RevisionEntry, type Signature } from '#contract';
import type { ExchangeCalculation } from '#document';
import * as Y from 'yjs';
import type { Database } from '../db/index';
import { ApiError, databaseCode } from '../errors/index';
import { saveState } from '../repositories/documents';
import {
  insertRevision,
  listRevisions,
  listSignatures,
  listWriters,
  updateRevision,
  voidSignatures,
  type RevisionRow,
} from '../repositories/revisions';
import { appendTrail } from '../repositories/trail';
import { authorizeCalculation, authorizeChange, authorizeRevision, type RevisionAccess } from './access';
import { conditionsOf, revisionFacts } from './conditions';
import type { ServerContext } from './context';
import { currentContent, loadDocument } from './documents';
import type { Summaries } from './summaries';
import { publish, record } from './trail';

const entryOf = (row: RevisionRow, signatures: Signature[]): RevisionEntry => ({
  id: row.id,
  letter: row.letter,
  state: row.state,
  changeNote: row.change_note,
  begunAt: row.begun_at.toISOString(),
  lockedAt: row.locked_at?.toISOString() ?? null,
  signatures,
  fingerprint: row.fingerprint,
});

async function detailOf(
  db: Database,
  { project, calculation, revision, role }: RevisionAccess,
): Promise<RevisionDetail> {
  const rows = await listRevisions(db, calculation.id);
  const signatures = await listSignatures(
    db,
    rows.map((row) => row.id),
  );
  const entries = rows.map((row) => entryOf(row, signatures.get(row.id) ?? []));
  const { id, number, title, firm, client, place } = project;
  return {
    revision: entryOf(revision, signatures.get(revision.id) ?? []),
    calculation: { id: calculation.id, number: calculation.number, title: calculation.title, group: calculation.group },
    project: { id, number, title, firm, client, place },
    revisions: entries,
    writers: await listWriters(db, revision.id),
    acts: acts.filter((act) => may(role, act, revision.state)),
    reasons: revision.reasons,
  };
}

export async function revisionDetail(
  { db }: ServerContext,
  account: Account,
  revisionId: string,
): Promise<RevisionDetail> {
  return detailOf(db, await authorizeRevision(db, account.id, revisionId, 'revision.read'));
}

/** What the revision says: of a locked one what was frozen. */
export async function revisionContent(
  { db }: ServerContext,
  account: Account,
  revisionId: string,
): Promise<ExchangeCalculation & { results?: unknown }> {
  const { calculation, revision } = await authorizeRevision(db, account.id, revisionId, 'revision.read');
  if (revision.content === null) return currentContent(db, calculation, revision);
  return { ...(revision.content as ExchangeCalculation), state: revision.state, results: revision.results };
}

export async function revisionConditions({ db }: ServerContext, account: Account, revisionId: string) {
  const access = await authorizeRevision(db, account.id, revisionId, 'revision.read');
  return conditionsOf(await revisionFacts(db, access, account.id));
}

/** Back to draft with a reason; the signatures given so far are void. */
export async function returnRevision(
  context: ServerContext,
  account: Account,
  revisionId: string,
  reason: string,
): Promise<RevisionDetail> {
  await authorizeRevision(context.db, account.id, revisionId, 'revision.return');
  const access = await context.db.transaction(async (transaction) => {
    const current = await authorizeChange(transaction, account.id, revisionId, 'revision.return');
    await voidSignatures(transaction, revisionId);
    await updateRevision(transaction, revisionId, { state: 'draft' });
    await record(
      transaction,
      account,
      current,
      'revision.return',
      `returned revision ${current.revision.letter}: ${reason}`,
      { reason },
    );
    return current;
  });
  context.events.publish({ kind: 'revision-state', revisionId });
  publish(context, access, 'revision', 'register', 'trail');
  return revisionDetail(context, account, revisionId);
}

/** A, B … Z, AA, AB … */
export function letterAfter(letter: string): string {
  const last = letter.at(-1) ?? '';
  const head = letter.slice(0, -1);
  if (last === '') return 'A';
  if (last !== 'Z') return head + String.fromCharCode(last.charCodeAt(0) + 1);
  return `${letterAfter(head)}A`;
}

async function writeNextRevision(
  db: Database,
  account: Account,
  { calculation, revision }: RevisionAccess,
): Promise<string> {
  const { doc } = await loadDocument(db, revision.id);
  const letter = letterAfter(revision.letter);
  return db.transaction(async (transaction) => {
    const begun = await insertRevision(transaction, { calculation_id: calculation.id, letter, begun_by: account.id });
    await saveState(transaction, begun, Y.encodeStateAsUpdate(doc), '0');
    await appendTrail(transaction, {
      projectId: calculation.project_id,
      calculationId: calculation.id,
      revisionId: begun,
      personId: account.id,
      act: 'revision.begin',
      sentence: `began revision ${letter} from ${revision.letter}`,
    });
    return begun;
  });
}

/** Opens the next revision as a draft: a copy of the locked one, with the same cells. */
export async function beginRevision(
  context: ServerContext,
  summaries: Summaries,
  account: Account,
  calculationId: string,
): Promise<RevisionDetail> {
  const { calculation } = await authorizeCalculation(context.db, account, calculationId, 'project.read');
  const latest = (await listRevisions(context.db, calculation.id)).at(-1);
  if (latest === undefined) throw new ApiError('WRONG_STATE', 'There is no revision to go on from.');
  const access = await authorizeRevision(context.db, account.id, latest.id, 'revision.begin');
  let revisionId: string;
  try {
    revisionId = await writeNextRevision(context.db, account, access);
  } catch (error) {
    // Two who begin it in the same moment: the database lets one.
    if (databaseCode(error) === '23505')
      throw new ApiError('WRONG_STATE', `The revision after ${latest.letter} was begun by somebody else just now.`);
    throw error;
  }
  await summaries.compute(revisionId, account.id);
  publish(context, access, 'revision', 'register', 'trail');
  return revisionDetail(context, account, revisionId);
}
