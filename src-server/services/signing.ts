import type { Account, Act, CheckRequest, Condition, HandOverRequest, RevisionDetail } from '#contract';
import type { Database } from '../db/index';
import { ApiError } from '../errors/index';
import { roleOf } from '../repositories/projects';
import { insertSignature, listPreparers, listWriters, updateRevision } from '../repositories/revisions';
import { authorizeChange, authorizeRevision, type RevisionAccess } from './access';
import { revisionFacts, type RevisionFacts } from './conditions';
import type { ServerContext } from './context';
import { mailHandedOver } from './mails';
import { passwordIsRight } from './people';
import { revisionDetail } from './revisions';
import { publish, record } from './trail';

/** Conditions without which the check is not signed. */
const neededForCheck: readonly Condition['id'][] = [
  'ticks',
  'remarks',
  'errors',
  'recomputed',
  'independence',
  'signatures',
];

const labels: Readonly<Record<Condition['id'], string>> = {
  ticks: 'Ticks',
  remarks: 'Remarks',
  ranges: 'Ranges',
  recomputed: 'Second pass',
  tbv: 'To be verified',
  requirements: 'Requirements',
  errors: 'Results',
  independence: 'Independence',
  signatures: 'Signatures',
};

/** Asks the signer for the passphrase again; a wrong one is written into the trail. */
export async function confirmSigner(
  context: ServerContext,
  account: Account,
  access: RevisionAccess,
  password: string,
): Promise<void> {
  if (await passwordIsRight(context, account, password)) return;
  const { letter } = access.revision;
  await context.db.transaction((transaction) =>
    record(
      transaction,
      account,
      access,
      'revision.wrongPassphrase',
      `gave a wrong passphrase at signing revision ${letter}`,
    ),
  );
  publish(context, access, 'trail');
  throw new ApiError('WRONG_PASSWORD', 'The passphrase is not right; nothing was signed.');
}

/** Inside the transaction of the signature: the revision's row is locked, and its content is what the signer saw. */
export async function factsForSigning(
  transaction: Database,
  account: Account,
  revisionId: string,
  act: Act,
  shown: string,
): Promise<{ access: RevisionAccess; facts: RevisionFacts }> {
  const access = await authorizeChange(transaction, account.id, revisionId, act);
  const facts = await revisionFacts(transaction, access, account.id);
  if (facts.fingerprint !== shown)
    throw new ApiError('CONTENT_CHANGED', 'The sheet changed while you looked at it. Look again, then sign.');
  return { access, facts };
}

/** Throws when one of the needed conditions is open. */
export function demand(conditions: readonly Condition[], needed: readonly Condition['id'][]): void {
  const open = conditions.filter((condition) => needed.includes(condition.id) && !condition.met);
  const dependent = open.find((condition) => condition.id === 'independence');
  if (dependent !== undefined)
    throw new ApiError(
      'NOT_INDEPENDENT',
      `Somebody who prepared nothing in this revision has to check it: ${dependent.sentence}.`,
    );
  if (open.length > 0)
    throw new ApiError(
      'CONDITIONS_OPEN',
      `Still open: ${open.map((condition) => `${labels[condition.id].toLowerCase()} (${condition.sentence})`).join('; ')}.`,
    );
}

/** The checker named at hand-over is one of the project, and prepared nothing in this revision. */
async function requireChecker(db: Database, access: RevisionAccess, checkerId: string): Promise<void> {
  if ((await roleOf(db, access.project.id, checkerId)) !== 'checker')
    throw new ApiError('INVALID_INPUT', 'The person named is no checker of this project.', {
      checkerId: 'is no checker of this project',
    });
  const writers = await listWriters(db, access.revision.id);
  const preparers = await listPreparers(db, access.revision.id);
  if (preparers.includes(checkerId) || writers.some((writer) => writer.id === checkerId))
    throw new ApiError('NOT_INDEPENDENT', 'The checker named wrote in this revision; name another one.');
}

/** Signed as prepared, and waiting for a checker. */
export async function handOver(
  context: ServerContext,
  account: Account,
  revisionId: string,
  request: HandOverRequest,
): Promise<RevisionDetail> {
  const before = await authorizeRevision(context.db, account.id, revisionId, 'revision.handOver');
  const checkerId = request.checkerId ?? null;
  if (checkerId !== null) await requireChecker(context.db, before, checkerId);
  await confirmSigner(context, account, before, request.password);
  await context.db.transaction(async (transaction) => {
    const { access, facts } = await factsForSigning(
      transaction,
      account,
      revisionId,
      'revision.handOver',
      request.contentFingerprint,
    );
    const { fingerprint, content } = facts;
    if (content.cells.length === 0) throw new ApiError('CONDITIONS_OPEN', 'An empty sheet cannot be handed over.');
    await insertSignature(transaction, { revision_id: revisionId, meaning: 'prepared', fingerprint }, account);
    await updateRevision(transaction, revisionId, { state: 'for check', checker_id: checkerId });
    const note = request.note === undefined || request.note === '' ? '' : `: ${request.note}`;
    await record(
      transaction,
      account,
      access,
      'revision.handOver',
      `signed revision ${access.revision.letter} as prepared and handed it over for check${note}`,
      { fingerprint, checkerId },
    );
    await mailHandedOver(context, transaction, access, account, checkerId);
  });
  afterSigning(context, before);
  return revisionDetail(context, account, revisionId);
}

/** Signed as checked. */
export async function signCheck(
  context: ServerContext,
  account: Account,
  revisionId: string,
  request: CheckRequest,
): Promise<RevisionDetail> {
  const before = await authorizeRevision(context.db, account.id, revisionId, 'revision.check');
  await confirmSigner(context, account, before, request.password);
  await context.db.transaction(async (transaction) => {
    const { access, facts } = await factsForSigning(
      transaction,
      account,
      revisionId,
      'revision.check',
      request.contentFingerprint,
    );
    const { fingerprint, conditions } = facts;
    demand(conditions, neededForCheck);
    await insertSignature(transaction, { revision_id: revisionId, meaning: 'checked', fingerprint }, account);
    await updateRevision(transaction, revisionId, { state: 'checked' });
    await record(
      transaction,
      account,
      access,
      'revision.check',
      `signed revision ${access.revision.letter} as checked`,
      { fingerprint },
    );
  });
  afterSigning(context, before);
  return revisionDetail(context, account, revisionId);
}

/** Tells the open sheets and screens; only after the transaction, since they fetch anew at once. */
export function afterSigning(context: ServerContext, access: RevisionAccess): void {
  context.events.publish({ kind: 'revision-state', revisionId: access.revision.id });
  publish(context, access, 'revision', 'register', 'trail');
}
