import type { Account, Condition, LockRequest, RevisionDetail } from '#contract';
import type { Database } from '../db/index';
import { ApiError } from '../errors/index';
import { insertSignature, listRevisions, updateRevision } from '../repositories/revisions';
import { authorizeRevision, type RevisionAccess } from './access';
import type { RevisionFacts } from './conditions';
import type { ServerContext } from './context';
import { figuresOf } from './documents';
import { canonicalRecord, currentVersions, fingerprintOf, type LockedRecord } from './locked-record';
import { mailLocked } from './mails';
import { revisionDetail } from './revisions';
import { afterSigning, confirmSigner, demand, factsForSigning } from './signing';
import { record } from './trail';

/** Conditions without which nothing is locked; and those that a lead may leave open with a reason. */
const needed: readonly Condition['id'][] = ['ticks', 'remarks', 'errors', 'recomputed', 'signatures'];
const excusable: readonly Condition['id'][] = ['tbv', 'requirements', 'ranges'];

/** Reasons for everything that is left open; throws when one is missing. */
function reasonsFor(
  conditions: readonly Condition[],
  given: Readonly<Record<string, string>>,
): { about: string; reason: string }[] {
  const items = conditions
    .filter((condition) => excusable.includes(condition.id))
    .flatMap((condition) => condition.items);
  const missing = items.filter((item) => !Object.hasOwn(given, item.key));
  if (missing.length > 0)
    throw new ApiError(
      'CONDITIONS_OPEN',
      `Say why it may stay open: ${missing.map((item) => item.sentence).join('; ')}.`,
    );
  return items.map((item) => ({ about: item.sentence, reason: given[item.key] ?? '' }));
}

/** The revision in force until now is superseded, in the same transaction as the lock of the next. */
async function supersede(transaction: Database, account: Account, access: RevisionAccess): Promise<void> {
  const before = (await listRevisions(transaction, access.calculation.id)).find((row) => row.state === 'locked');
  if (before === undefined) return;
  await updateRevision(transaction, before.id, { state: 'superseded' });
  await record(
    transaction,
    account,
    { ...access, revision: before },
    'revision.supersede',
    `revision ${before.letter} is superseded by ${access.revision.letter}`,
  );
}

/** Everything that is frozen, from one reading inside the transaction of the lock. */
function frozen(facts: RevisionFacts, request: LockRequest): LockedRecord {
  return {
    content: { ...facts.content, state: 'locked' },
    results: figuresOf(facts.results),
    versions: currentVersions(),
    changeNote: request.changeNote,
    reasons: reasonsFor(facts.conditions, request.reasons ?? {}),
    remarks: facts.remarks,
    ticks: facts.ticks,
    signatures: facts.signatures,
  };
}

async function lockWithin(
  context: ServerContext,
  transaction: Database,
  account: Account,
  revisionId: string,
  request: LockRequest,
): Promise<void> {
  const { access, facts } = await factsForSigning(
    transaction,
    account,
    revisionId,
    'revision.lock',
    request.contentFingerprint,
  );
  demand(facts.conditions, needed);
  const locked = frozen(facts, request);
  const canonical = canonicalRecord(locked);
  const fingerprint = fingerprintOf(canonical);
  await insertSignature(transaction, { revision_id: revisionId, meaning: 'approved', fingerprint }, account);
  await supersede(transaction, account, access);
  const { content, results, versions, reasons, changeNote } = locked;
  await updateRevision(transaction, revisionId, {
    state: 'locked',
    change_note: changeNote,
    locked_at: 'now',
    content,
    results,
    versions,
    reasons,
    canonical,
    fingerprint,
  });
  await record(
    transaction,
    account,
    access,
    'revision.lock',
    `signed revision ${access.revision.letter} as approved and locked it`,
    { fingerprint, changeNote, reasons },
  );
  await mailLocked(context, transaction, access, account);
}

/** Signed as approved, frozen for good, in force; the revision before it is superseded in the same moment. */
export async function lockRevision(
  context: ServerContext,
  account: Account,
  revisionId: string,
  request: LockRequest,
): Promise<RevisionDetail> {
  const before = await authorizeRevision(context.db, account.id, revisionId, 'revision.lock');
  await confirmSigner(context, account, before, request.password);
  await context.db.transaction((transaction) => lockWithin(context, transaction, account, revisionId, request));
  afterSigning(context, before);
  return revisionDetail(context, account, revisionId);
}
