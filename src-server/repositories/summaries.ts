import type { Database } from '../db/index';

export interface Summary {
  cells: number;
  ticked: number;
  changed: number;
  open_remarks: number;
  tbv: number;
  outside_range: number;
}

/** Writes the figures that the register shows; who changed and when only when content did. */
export async function saveSummary(
  db: Database,
  revisionId: string,
  summary: Summary,
  changedBy: string | null | undefined,
): Promise<void> {
  const change = changedBy === undefined ? {} : { changed_by: changedBy, changed_at: db.fn.now() };
  await db('revision_summaries')
    .insert({ revision_id: revisionId, ...summary, ...change })
    .onConflict('revision_id')
    .merge({ ...summary, ...change });
}
