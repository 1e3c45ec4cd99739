import type { Account, Tick } from '#contract';
import { ApiError, notFound } from '../errors/index';
import { deleteTick, listTicks, setTick } from '../repositories/check';
import { authorizeRevision, type RevisionAccess } from './access';
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
 * showed something else, the tick is refused.
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
  const result = computeContent(content).cells[cellId];
  if (result === undefined || result.kind === 'section') throw notFound('cell');
  if (result.fingerprint !== shown)
    throw new ApiError('CONTENT_CHANGED', 'The cell changed while you looked at it. Look again, then tick.');
  await context.db.transaction(async (transaction) => {
    await setTick(transaction, {
      revision_id: revisionId,
      cell_id: cellId,
      person_id: account.id,
      fingerprint: result.fingerprint,
      depends_on: result.dependsOn,
    });
    await record(transaction, account, access, 'tick.set', 'ticked a cell', {
      cellId,
      fingerprint: result.fingerprint,
    });
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
  await context.db.transaction(async (transaction) => {
    await deleteTick(transaction, revisionId, cellId);
    await record(transaction, account, access, 'tick.remove', 'took back the tick of a cell', { cellId });
  });
  return told(context, summaries, access);
}
