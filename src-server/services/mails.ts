import type { Account, Role } from '#contract';
import type { Database } from '../db/index';
import { findAccount } from '../repositories/people';
import { memberAddresses } from '../repositories/projects';
import type { RevisionAccess } from './access';
import type { ServerContext } from './context';

/** One link and no values: whoever reads a mail on its way learns nothing of the content. */
function body(context: ServerContext, { project, calculation, revision }: RevisionAccess, sentence: string): string {
  const link = `${context.config.publicOrigin}/calculations/${calculation.id}/${revision.letter}`;
  return `${sentence}\n\n${calculation.number} revision ${revision.letter}, project ${project.number}\n${link}\n`;
}

async function send(
  context: ServerContext,
  transaction: Database,
  access: RevisionAccess,
  to: readonly { personId: string; email: string }[],
  from: Account,
  subject: string,
  sentence: string,
): Promise<void> {
  const text = body(context, access, sentence);
  const mails = to
    .filter(({ personId }) => personId !== from.id)
    .map(({ email }) => ({
      to: email,
      subject: `${access.calculation.number} ${access.revision.letter}: ${subject}`,
      text,
    }));
  if (mails.length > 0) await context.mails.enqueue(mails, transaction);
}

/** To the checker named, or to all checkers of the project. */
export async function mailHandedOver(
  context: ServerContext,
  transaction: Database,
  access: RevisionAccess,
  account: Account,
  checkerId: string | null,
): Promise<void> {
  const checkers = await memberAddresses(transaction, access.project.id, ['checker'] satisfies Role[]);
  const to = checkerId === null ? checkers : checkers.filter(({ personId }) => personId === checkerId);
  await send(
    context,
    transaction,
    access,
    to,
    account,
    'handed over for check',
    `${account.name} hands over for check.`,
  );
}

export async function mailAnswered(
  context: ServerContext,
  transaction: Database,
  access: RevisionAccess,
  account: Account,
  askedBy: string,
  number: number,
): Promise<void> {
  const asker = await findAccount(transaction, askedBy);
  if (asker === undefined || !asker.active) return;
  await send(
    context,
    transaction,
    access,
    [{ personId: asker.id, email: asker.email }],
    account,
    `remark R${number} answered`,
    `${account.name} answered remark R${number}.`,
  );
}

export async function mailLocked(
  context: ServerContext,
  transaction: Database,
  access: RevisionAccess,
  account: Account,
): Promise<void> {
  const members = await memberAddresses(transaction, access.project.id);
  await send(
    context,
    transaction,
    access,
    members,
    account,
    'locked',
    `${account.name} locked revision ${access.revision.letter}; it is in force from now on.`,
  );
}
