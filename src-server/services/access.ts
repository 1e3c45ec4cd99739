import { may, mayInProject, type Account, type Act, type ProjectAct, type Role } from '#contract';
import type { Database } from '../db/index';
import { forbidden, notFound, ApiError } from '../errors/index';
import { findCalculation, type CalculationRow } from '../repositories/calculations';
import { findProject, roleOf, type ProjectRow } from '../repositories/projects';
import { findRevision, lockRevisionRow, type RevisionRow } from '../repositories/revisions';

export interface ProjectAccess {
  project: ProjectRow;
  role: Role | undefined;
}

export interface RevisionAccess {
  project: ProjectRow;
  calculation: CalculationRow;
  revision: RevisionRow;
  role: Role;
}

const words: Readonly<Record<Act, string>> = {
  'revision.read': 'read it',
  'content.write': 'write in it',
  'remark.ask': 'ask a remark',
  'remark.answer': 'answer a remark',
  'remark.close': 'close a remark',
  'tick.set': 'tick cells',
  'revision.handOver': 'hand it over for check',
  'revision.return': 'return it',
  'revision.check': 'sign the check',
  'revision.lock': 'lock it',
  'revision.begin': 'begin the next revision',
};

/** The project, when the person may do this in it; to strangers it does not exist. */
export async function authorizeProject(
  db: Database,
  account: Account,
  projectId: string,
  act: ProjectAct,
): Promise<ProjectAccess> {
  const project = await findProject(db, projectId);
  const role = project && (await roleOf(db, projectId, account.id));
  if (project === undefined || !mayInProject(role, 'project.read', account.administrator)) throw notFound('project');
  if (!mayInProject(role, act, account.administrator))
    throw forbidden('Your role in this project does not allow that.');
  return { project, role };
}

async function revisionAccess(db: Database, personId: string, revisionId: string): Promise<RevisionAccess> {
  const revision = await findRevision(db, revisionId);
  const calculation = revision && (await findCalculation(db, revision.calculation_id));
  const project = calculation && (await findProject(db, calculation.project_id));
  const role = project && (await roleOf(db, project.id, personId));
  if (revision === undefined || calculation === undefined || project === undefined || role === undefined)
    throw notFound('revision');
  return { project, calculation, revision, role };
}

/** The revision with all around it, when the person may do this to it in its state. */
export async function authorizeRevision(
  db: Database,
  personId: string,
  revisionId: string,
  act: Act,
): Promise<RevisionAccess> {
  const access = await revisionAccess(db, personId, revisionId);
  if (may(access.role, act, access.revision.state)) return access;
  const inOtherState = (['draft', 'for check', 'checked', 'locked'] as const).some((state) =>
    may(access.role, act, state),
  );
  if (!inOtherState) throw forbidden(`As ${access.role} of the project you cannot ${words[act]}.`);
  throw new ApiError(
    'WRONG_STATE',
    `Revision ${access.revision.letter} is ${access.revision.state}: nobody can ${words[act]} now.`,
  );
}

/**
 * As `authorizeRevision`, inside a transaction and with the revision's row locked: neither its state nor
 * its content changes until the transaction ends. To be called before anything else is locked.
 */
export async function authorizeChange(
  transaction: Database,
  personId: string,
  revisionId: string,
  act: Act,
): Promise<RevisionAccess> {
  await lockRevisionRow(transaction, revisionId);
  return authorizeRevision(transaction, personId, revisionId, act);
}

/** The calculation, when the person is a member of its project. */
export async function authorizeCalculation(
  db: Database,
  account: Account,
  calculationId: string,
  act: ProjectAct,
): Promise<{ calculation: CalculationRow; access: ProjectAccess }> {
  const calculation = await findCalculation(db, calculationId);
  const role = calculation && (await roleOf(db, calculation.project_id, account.id));
  if (calculation === undefined || role === undefined) throw notFound('calculation');
  return { calculation, access: await authorizeProject(db, account, calculation.project_id, act) };
}
