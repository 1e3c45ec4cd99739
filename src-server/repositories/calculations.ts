import type { RegisterRow, RevisionState } from '#contract';
import type { Database } from '../db/index';

export interface CalculationRow {
  id: string;
  project_id: string;
  number: string;
  title: string;
  group: string;
}

export async function findCalculation(db: Database, id: string): Promise<CalculationRow | undefined> {
  return db<CalculationRow>('calculations')
    .where({ id })
    .first('id', 'project_id', 'number', 'title', 'group') as Promise<CalculationRow | undefined>;
}

/** Next free number of a project. The project's row is locked until the transaction ends, so that two never get the same. */
export async function nextNumber(transaction: Database, projectId: string): Promise<string> {
  const project = await transaction('projects')
    .where({ id: projectId })
    .forUpdate()
    .first<{ number: string } | undefined>('number');
  if (project === undefined) throw new Error(`There is no project ${projectId}.`);
  const prefix = `${project.number}-C-`;
  const row = await transaction('calculations')
    .where({ project_id: projectId })
    .whereRaw('number ~ ?', [`^${prefix.replace(/[.]/g, '\\.')}[0-9]+$`])
    .max<{ last: string | null }[]>({ last: transaction.raw('substring(number from ?)::int', ['[0-9]+$']) });
  const last = Number(row[0]?.last ?? 0);
  return prefix + String(last + 1).padStart(3, '0');
}

export async function insertCalculation(
  db: Database,
  row: Omit<CalculationRow, 'id'> & { created_by: string },
): Promise<string> {
  const [inserted] = await db('calculations').insert(row).returning<{ id: string }[]>('id');
  if (inserted === undefined) throw new Error('The calculation was not written.');
  return inserted.id;
}

export async function updateCalculation(
  db: Database,
  id: string,
  change: { title?: string | undefined; group?: string | undefined },
): Promise<void> {
  const given = Object.fromEntries(Object.entries(change).filter(([, value]) => value !== undefined));
  if (Object.keys(given).length > 0) await db('calculations').where({ id }).update(given);
}

interface RegisterQueryRow {
  calculation_id: string;
  revision_id: string;
  number: string;
  title: string;
  group: string;
  letter: string;
  state: RevisionState;
  cells: number | null;
  ticked: number | null;
  changed: number | null;
  open_remarks: number | null;
  tbv: number | null;
  outside_range: number | null;
  changed_at: Date | null;
  changed_by: string | null;
  begun_at: Date;
  prepares: string[] | null;
  checks: string[] | null;
  mine: boolean;
}

/** The register of a project: every calculation at its latest revision. */
export async function registerRows(db: Database, projectId: string, personId: string): Promise<RegisterRow[]> {
  const { rows } = await db.raw<{ rows: RegisterQueryRow[] }>(
    `SELECT c.id AS calculation_id, r.id AS revision_id, c.number, c.title, c."group", r.letter, r.state, r.begun_at,
       s.cells, s.ticked, s.changed, s.open_remarks, s.tbv, s.outside_range, s.changed_at, by.name AS changed_by,
       (SELECT array_agg(p.initials ORDER BY w.first_at) FROM revision_writers w JOIN people p ON p.id = w.person_id WHERE w.revision_id = r.id) AS prepares,
       (SELECT array_agg(DISTINCT p.initials) FROM people p WHERE p.id = r.checker_id
          OR p.id IN (SELECT person_id FROM ticks t WHERE t.revision_id = r.id)) AS checks,
       EXISTS (SELECT 1 FROM revision_writers w WHERE w.revision_id = r.id AND w.person_id = :personId) AS mine
     FROM calculations c
     JOIN LATERAL (SELECT * FROM revisions r WHERE r.calculation_id = c.id ORDER BY r.begun_at DESC, length(r.letter) DESC, r.letter DESC LIMIT 1) r ON true
     LEFT JOIN revision_summaries s ON s.revision_id = r.id
     LEFT JOIN people by ON by.id = s.changed_by
     WHERE c.project_id = :projectId ORDER BY c."group", c.number`,
    { projectId, personId },
  );
  return rows.map((row) => ({
    calculationId: row.calculation_id,
    revisionId: row.revision_id,
    number: row.number,
    title: row.title,
    group: row.group,
    letter: row.letter,
    state: row.state,
    cells: row.cells ?? 0,
    ticked: row.ticked ?? 0,
    changed: row.changed ?? 0,
    openRemarks: row.open_remarks ?? 0,
    tbv: row.tbv ?? 0,
    outsideRange: row.outside_range ?? 0,
    lastChange: (row.changed_at ?? row.begun_at).toISOString(),
    lastChangeBy: row.changed_by,
    prepares: row.prepares ?? [],
    checks: row.checks ?? [],
    mine: row.mine,
  }));
}
