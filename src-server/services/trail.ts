import type { Account, Notice, TrailPage } from '#contract';
import type { Database } from '../db/index';
import { appendTrail, listTrail } from '../repositories/trail';
import type { RevisionAccess } from './access';
import type { ServerContext } from './context';

const pageSize = 100;

/** Writes what somebody did to a revision into the trail of its project. */
export async function record(
  transaction: Database,
  account: Account,
  access: Pick<RevisionAccess, 'project' | 'calculation' | 'revision'>,
  act: string,
  sentence: string,
  detail: Record<string, unknown> = {},
): Promise<void> {
  await appendTrail(transaction, {
    projectId: access.project.id,
    calculationId: access.calculation.id,
    revisionId: access.revision.id,
    personId: account.id,
    act,
    sentence,
    detail,
  });
}

/** Tells the screens that something is to be fetched again. */
export function publish(
  context: ServerContext,
  access: Pick<RevisionAccess, 'project' | 'revision'>,
  ...about: Notice['about'][]
): void {
  for (const one of about) {
    context.events.publish({
      kind: 'notice',
      notice: { about: one, projectId: access.project.id, revisionId: access.revision.id },
    });
  }
}

export async function trailPageOf(
  db: Database,
  projectId: string,
  filter: { calculationId?: string | undefined; before?: number | undefined },
): Promise<TrailPage> {
  const entries = await listTrail(db, projectId, filter, pageSize + 1);
  return { entries: entries.slice(0, pageSize), more: entries.length > pageSize };
}
