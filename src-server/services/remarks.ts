import type { Account, AskRemarkRequest, Remark } from '#contract';
import { ApiError, forbidden, notFound } from '../errors/index';
import {
  findRemark,
  insertAnswer,
  insertRemark,
  listRemarks,
  setRemarkClosed,
  type RemarkRow,
} from '../repositories/check';
import { authorizeChange, authorizeRevision, type RevisionAccess } from './access';
import { cellNumbers } from './cell-numbers';
import type { ServerContext } from './context';
import { currentContent } from './documents';
import { mailAnswered } from './mails';
import type { Summaries } from './summaries';
import { publish, record } from './trail';

export async function remarksOf({ db }: ServerContext, account: Account, revisionId: string): Promise<Remark[]> {
  await authorizeRevision(db, account.id, revisionId, 'revision.read');
  return listRemarks(db, revisionId);
}

async function told(context: ServerContext, summaries: Summaries, access: RevisionAccess): Promise<Remark[]> {
  publish(context, access, 'remarks', 'trail');
  summaries.touch(access.revision.id);
  return listRemarks(context.db, access.revision.id);
}

export async function askRemark(
  context: ServerContext,
  summaries: Summaries,
  account: Account,
  revisionId: string,
  request: AskRemarkRequest,
): Promise<Remark[]> {
  const access = await authorizeRevision(context.db, account.id, revisionId, 'remark.ask');
  const content = await currentContent(context.db, access.calculation, access.revision);
  const place = cellNumbers(content).get(request.cellId);
  if (place === undefined) throw notFound('cell');
  await context.db.transaction(async (transaction) => {
    await authorizeChange(transaction, account.id, revisionId, 'remark.ask');
    const number = await insertRemark(transaction, {
      revision_id: revisionId,
      cell_id: request.cellId,
      author_id: account.id,
      content: request.text,
    });
    await record(transaction, account, access, 'remark.ask', `asked remark R${number} at ${place}`, {
      cellId: request.cellId,
    });
  });
  return told(context, summaries, access);
}

async function remarkAccess(
  { db }: ServerContext,
  account: Account,
  remarkId: string,
  act: 'remark.answer' | 'remark.close',
): Promise<{ remark: RemarkRow; access: RevisionAccess }> {
  const remark = await findRemark(db, remarkId);
  if (remark === undefined) throw notFound('remark');
  try {
    return { remark, access: await authorizeRevision(db, account.id, remark.revision_id, act) };
  } catch (error) {
    // The same words as for a remark that is not there: a stranger cannot tell the two apart.
    throw error instanceof ApiError && error.code === 'NOT_FOUND' ? notFound('remark') : error;
  }
}

export async function answerRemark(
  context: ServerContext,
  summaries: Summaries,
  account: Account,
  remarkId: string,
  text: string,
): Promise<Remark[]> {
  const { remark, access } = await remarkAccess(context, account, remarkId, 'remark.answer');
  await context.db.transaction(async (transaction) => {
    await authorizeChange(transaction, account.id, remark.revision_id, 'remark.answer');
    await insertAnswer(transaction, { remark_id: remarkId, author_id: account.id, content: text });
    await record(transaction, account, access, 'remark.answer', `answered remark R${remark.number}`);
    await mailAnswered(context, transaction, access, account, remark.author_id, remark.number);
  });
  return told(context, summaries, access);
}

/** Closes or reopens; only the one who asked does. */
export async function setClosed(
  context: ServerContext,
  summaries: Summaries,
  account: Account,
  remarkId: string,
  closed: boolean,
): Promise<Remark[]> {
  const { remark, access } = await remarkAccess(context, account, remarkId, 'remark.close');
  if (remark.author_id !== account.id) throw forbidden('Only the one who asked a remark closes or reopens it.');
  await context.db.transaction(async (transaction) => {
    await authorizeChange(transaction, account.id, remark.revision_id, 'remark.close');
    if (!(await setRemarkClosed(transaction, remarkId, closed))) return;
    await record(
      transaction,
      account,
      access,
      closed ? 'remark.close' : 'remark.reopen',
      `${closed ? 'closed' : 'reopened'} remark R${remark.number}`,
    );
  });
  return told(context, summaries, access);
}
