import type { Database } from '../db/index';

export interface Summary {
  cells: number;
  ticked: number;
  changed: number;
  open_remarks: number;
  tbv: number;
  outside_range: number;
  requirements_failed: number;
  errors: number;
}

/** Writes the figures that the register shows; who changed and when only when content did. */
export async function saveSummary(
  db: Database,
  revisionId: string,
  summary: Summary,
  computedAt: Date,
  changedBy: string | null | undefined,
): Promise<void> {
  const change = changedBy === undefined ? {} : { changed_by: changedBy, changed_at: db.fn.now() };
  const columns = { ...summary, ...change, computed_at: computedAt };
  await db('revision_summaries')
    .insert({ revision_id: revisionId, ...columns })
    .onConflict('revision_id')
    .merge(columns);
}

/** The database's clock. */
export async function databaseNow(db: Database): Promise<Date> {
  const { rows } = await db.raw<{ rows: { now: Date }[] }>('SELECT clock_timestamp() AS now');
  return rows[0]?.now ?? new Date(0);
}

/** Open revisions with a content, tick or remark younger than their figures: a server ended before it computed them. */
export async function staleSummaries(db: Database): Promise<{ revisionId: string; changedBy: string | null }[]> {
  const { rows } = await db.raw<{ rows: { revisionId: string; changedBy: string | null }[] }>(
    `SELECT r.id AS "revisionId", u.person_id AS "changedBy"
     FROM revisions r
     LEFT JOIN revision_summaries s ON s.revision_id = r.id
     LEFT JOIN LATERAL (SELECT person_id, created_at FROM document_updates d WHERE d.revision_id = r.id
       ORDER BY d.id DESC LIMIT 1) u ON true
     WHERE r.state IN ('draft', 'for check', 'checked')
       AND (s.computed_at IS NULL OR u.created_at > s.computed_at
         OR EXISTS (SELECT 1 FROM trail t WHERE t.revision_id = r.id AND t.at > s.computed_at))`,
  );
  return rows;
}
