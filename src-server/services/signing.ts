import { createHash } from 'node:crypto';
import type { Account, CheckRequest, Condition, HandOverRequest, LockRequest, RevisionDetail } from '#contract';
import { canonicalJson } from '#document';
import { catalogueVersion, engineVersion, propertiesVersion, twelveDigits, type CalculationResult } from '#engine';
import type { Database } from '../db/index';
import { ApiError } from '../errors/index';
import { roleOf } from '../repositories/projects';
import { insertSignature, listRevisions, lockRevisionRow, updateRevision } from '../repositories/revisions';
import { authorizeRevision, type RevisionAccess } from './access';
import { revisionFacts, type RevisionFacts } from './conditions';
import type { ServerContext } from './context';
import { mailHandedOver, mailLocked } from './mails';
import { confirmPassword } from './people';
import { revisionDetail } from './revisions';
import { publish, record } from './trail';

/** Conditions without which the check is not signed; and those that a lead may leave open with a reason. */
const neededForCheck: readonly Condition['id'][] = ['ticks', 'remarks', 'errors', 'independence', 'signatures'];
const neededForLock: readonly Condition['id'][] = ['ticks', 'remarks', 'errors', 'signatures'];
const excusable: readonly Condition['id'][] = ['tbv', 'requirements', 'ranges'];

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

/** Inside the transaction of the signature: the revision's row is locked, and its content is what the signer saw. */
async function factsForSigning(
  transaction: Database,
  access: RevisionAccess,
  account: Account,
  act: Parameters<typeof authorizeRevision>[3],
  shown: string,
): Promise<RevisionFacts> {
  await lockRevisionRow(transaction, access.revision.id);
  await authorizeRevision(transaction, account.id, access.revision.id, act);
  const facts = await revisionFacts(transaction, access, account.id);
  if (facts.fingerprint !== shown)
    throw new ApiError('CONTENT_CHANGED', 'The sheet changed while you looked at it. Look again, then sign.');
  return facts;
}

function demand(conditions: readonly Condition[], needed: readonly Condition['id'][]): void {
  const open = conditions.filter((condition) => needed.includes(condition.id) && !condition.met);
  if (open.some((condition) => condition.id === 'independence')) {
    throw new ApiError(
      'NOT_INDEPENDENT',
      'You wrote in this revision: somebody who prepared nothing in it has to check it.',
    );
  }
  if (open.length > 0)
    throw new ApiError(
      'CONDITIONS_OPEN',
      `Still open: ${open.map((condition) => `${labels[condition.id].toLowerCase()} (${condition.sentence})`).join('; ')}.`,
    );
}

/** Signed as prepared, and waiting for a checker. */
export async function handOver(
  context: ServerContext,
  account: Account,
  revisionId: string,
  request: HandOverRequest,
): Promise<RevisionDetail> {
  const access = await authorizeRevision(context.db, account.id, revisionId, 'revision.handOver');
  const checkerId = request.checkerId ?? null;
  if (checkerId !== null && (await roleOf(context.db, access.project.id, checkerId)) !== 'checker') {
    throw new ApiError('INVALID_INPUT', 'The person named is no checker of this project.', {
      checkerId: 'is no checker of this project',
    });
  }
  await confirmPassword(context, account, request.password);
  await context.db.transaction(async (transaction) => {
    const { fingerprint, content } = await factsForSigning(
      transaction,
      access,
      account,
      'revision.handOver',
      request.contentFingerprint,
    );
    if (content.cells.length === 0) throw new ApiError('CONDITIONS_OPEN', 'An empty sheet cannot be handed over.');
    await insertSignature(transaction, {
      revision_id: revisionId,
      person_id: account.id,
      meaning: 'prepared',
      fingerprint,
    });
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
  });
  await afterSigning(context, access);
  await mailHandedOver(context, access, account, checkerId);
  return revisionDetail(context, account, revisionId);
}

/** Signed as checked. */
export async function signCheck(
  context: ServerContext,
  account: Account,
  revisionId: string,
  request: CheckRequest,
): Promise<RevisionDetail> {
  const access = await authorizeRevision(context.db, account.id, revisionId, 'revision.check');
  await confirmPassword(context, account, request.password);
  await context.db.transaction(async (transaction) => {
    const { fingerprint, conditions } = await factsForSigning(
      transaction,
      access,
      account,
      'revision.check',
      request.contentFingerprint,
    );
    demand(conditions, neededForCheck);
    await insertSignature(transaction, {
      revision_id: revisionId,
      person_id: account.id,
      meaning: 'checked',
      fingerprint,
    });
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
  await afterSigning(context, access);
  return revisionDetail(context, account, revisionId);
}

function frozenResults(results: CalculationResult): Record<string, string> {
  return Object.fromEntries(results.names.map(({ name, value }) => [name, twelveDigits(value)]));
}

/** Reasons for everything that is left open; throws when one is missing. */
function reasonsFor(
  conditions: readonly Condition[],
  given: Readonly<Record<string, string>>,
): { about: string; reason: string }[] {
  const items = conditions
    .filter((condition) => excusable.includes(condition.id))
    .flatMap((condition) => condition.items);
  const missing = items.filter((item) => given[item.key] === undefined);
  if (missing.length > 0)
    throw new ApiError(
      'CONDITIONS_OPEN',
      `Say why it may stay open: ${missing.map((item) => item.sentence).join('; ')}.`,
    );
  return items.map((item) => ({ about: item.sentence, reason: given[item.key] ?? '' }));
}

/** Signed as approved, frozen for good, in force; the revision before it is superseded in the same moment. */
export async function lockRevision(
  context: ServerContext,
  account: Account,
  revisionId: string,
  request: LockRequest,
): Promise<RevisionDetail> {
  const access = await authorizeRevision(context.db, account.id, revisionId, 'revision.lock');
  await confirmPassword(context, account, request.password);
  await context.db.transaction(async (transaction) => {
    const facts = await factsForSigning(transaction, access, account, 'revision.lock', request.contentFingerprint);
    demand(facts.conditions, neededForLock);
    const reasons = reasonsFor(facts.conditions, request.reasons ?? {});
    const versions = { engine: engineVersion, catalogue: catalogueVersion, properties: propertiesVersion };
    const content = { ...facts.content, state: 'locked' };
    const results = frozenResults(facts.results);
    const canonical = canonicalJson({ content, results, versions, reasons, changeNote: request.changeNote });
    const fingerprint = createHash('sha256').update(canonical).digest('hex');
    await insertSignature(transaction, {
      revision_id: revisionId,
      person_id: account.id,
      meaning: 'approved',
      fingerprint,
    });
    const before = (await listRevisions(transaction, access.calculation.id)).find((row) => row.state === 'locked');
    if (before !== undefined) {
      await updateRevision(transaction, before.id, { state: 'superseded' });
      await record(
        transaction,
        account,
        { ...access, revision: before },
        'revision.supersede',
        `revision ${before.letter} is superseded by ${access.revision.letter}`,
      );
    }
    await updateRevision(transaction, revisionId, {
      state: 'locked',
      change_note: request.changeNote,
      locked_at: new Date(),
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
      { fingerprint, reasons },
    );
  });
  await afterSigning(context, access);
  await mailLocked(context, access, account);
  return revisionDetail(context, account, revisionId);
}

async function afterSigning(context: ServerContext, access: RevisionAccess): Promise<void> {
  context.events.publish({ kind: 'revision-state', revisionId: access.revision.id });
  publish(context, access, 'revision', 'register', 'trail');
}
