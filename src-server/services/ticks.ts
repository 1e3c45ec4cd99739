import type { Account, Tick } from '#contract';
import { ApiError, notFound } from '../errors/index';
import { deleteTick, listTicks, setTick } from '../repositories/check';
import { authorizeChange, authorizeRevision, type RevisionAccess } from './access';
import { cellNumbers } from './cell-numbers';
import type { ServerContext } from './context';
import { computeContent, currentContent } from './documents';
import type { Summaries } from './summaries';
import { publish, record } from './trail';

export async function ticksOf({ db }: ServerContext, account: Account, revisionId: string): Promise<Tick[]> {
  await authorizeRevision(db, account.id, revisionId, 'revision.read');
  return listTicks(db, revisionId);
}

async function told(context: ServerContext, summaries: Summaries, access: RevisionAccess): Promise<Tick[]> {
  publish(context, access, 'ticks', 'trail');
  summaries.touch(access.revision.id);
  return listTicks(context.db, access.revision.id);
}

/**
 * Ticks a cell for what it says now. The server computes the sheet itself; when the checker's screen
 * showed something else, the tick is refused. A change that comes in just after makes the tick fall,
 * since it is bound to the fingerprint.
 */
export async function tickCell(
  context: ServerContext,
  summaries: Summaries,
  account: Account,
  revisionId: string,
  cellId: string,
  shown: string,
): Promise<Tick[]> {
  const access = await authorizeRevision(context.db, account.id, revisionId, 'tick.set');
  const content = await currentContent(context.db, access.calculation, access.revision);
  const cell = computeContent(content).cells[cellId];
  if (cell === undefined || cell.kind === 'section') throw notFound('cell');
  const { fingerprint, dependsOn } = cell;
  if (fingerprint !== shown)
    throw new ApiError('CONTENT_CHANGED', 'The cell changed while you looked at it. Look again, then tick.');
  await context.db.transaction(async (transaction) => {
    await authorizeChange(transaction, account.id, revisionId, 'tick.set');
    await setTick(transaction, {
      revision_id: revisionId,
      cell_id: cellId,
      person_id: account.id,
      fingerprint,
      depends_on: dependsOn,
    });
    const number = cellNumbers(content).get(cellId) ?? '';
    await record(transaction, account, access, 'tick.set', `ticked cell ${number}`, { cellId, fingerprint });
  });
  return told(context, summaries, access);
}

export async function untickCell(
  context: ServerContext,
  summaries: Summaries,
  account: Account,
  revisionId: string,
  cellId: string,
): Promise<Tick[]> {
  const access = await authorizeRevision(context.db, account.id, revisionId, 'tick.set');
  const content = await currentContent(context.db, access.calculation, access.revision);
  // The tick of a cell that was taken out meanwhile can be taken back too: it has no number any more.
  const number = cellNumbers(content).get(cellId);
  await context.db.transaction(async (transaction) => {
    await authorizeChange(transaction, account.id, revisionId, 'tick.set');
    if (!(await deleteTick(transaction, revisionId, cellId))) return;
    const sentence = `took back the tick of ${number === undefined ? 'a cell that is gone' : `cell ${number}`}`;
    await record(transaction, account, access, 'tick.remove', sentence, { cellId });
  });
  return told(context, summaries, access);
}
