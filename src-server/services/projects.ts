import type { Account, ChangeProjectRequest, CreateProjectRequest, Member, Project, Role } from '#contract';
import { ApiError, databaseCode, forbidden, notFound } from '../errors/index';
import { findAccount } from '../repositories/people';
import {
  insertProject,
  listMembers,
  listProjects,
  removeMember,
  roleOf,
  setMember,
  updateProject,
  type ProjectRow,
} from '../repositories/projects';
import { appendTrail } from '../repositories/trail';
import { authorizeProject } from './access';
import type { ServerContext } from './context';

function publish({ events }: ServerContext, projectId: string): void {
  events.publish({ kind: 'notice', notice: { about: 'trail', projectId, revisionId: null } });
}

const projectOf = (row: ProjectRow, members: Member[], account: Account): Project => ({
  ...row,
  role: members.find((member) => member.person.id === account.id)?.role ?? null,
  members,
});

export async function projectsOf({ db }: ServerContext, account: Account): Promise<Project[]> {
  const rows = await listProjects(db, account.id, account.administrator);
  const members = await listMembers(
    db,
    rows.map((row) => row.id),
  );
  return rows.map((row) => projectOf(row, members.get(row.id) ?? [], account));
}

export async function projectById({ db }: ServerContext, account: Account, projectId: string): Promise<Project> {
  const { project } = await authorizeProject(db, account, projectId, 'project.read');
  const members = await listMembers(db, [projectId]);
  return projectOf(project, members.get(projectId) ?? [], account);
}

export async function createProject(
  context: ServerContext,
  account: Account,
  request: CreateProjectRequest,
): Promise<Project> {
  if (!account.administrator) throw forbidden('Only an administrator opens a project.');
  const { number, title, firm = '', client = '', place = '' } = request;
  try {
    const id = await context.db.transaction(async (transaction) => {
      const created = await insertProject(transaction, { number, title, firm, client, place });
      await appendTrail(transaction, {
        projectId: created,
        personId: account.id,
        act: 'project.create',
        sentence: `opened project ${number} ${title}`,
      });
      return created;
    });
    return await projectById(context, account, id);
  } catch (error) {
    if (databaseCode(error) === '23505')
      throw new ApiError('NUMBER_TAKEN', `There is a project ${number} already.`, { number: 'is taken' });
    throw error;
  }
}

export async function changeProject(
  context: ServerContext,
  account: Account,
  projectId: string,
  request: ChangeProjectRequest,
): Promise<Project> {
  const { project } = await authorizeProject(context.db, account, projectId, 'project.manage');
  const given: Partial<ProjectRow> = Object.fromEntries(
    Object.entries(request).filter(([name, value]) => value !== undefined && value !== Reflect.get(project, name)),
  );
  const names = Object.keys(given);
  if (names.length > 0) {
    await context.db.transaction(async (transaction) => {
      await updateProject(transaction, projectId, given);
      await appendTrail(transaction, {
        projectId,
        personId: account.id,
        act: 'project.change',
        sentence: `changed ${names.join(', ')} of the project`,
        detail: {
          from: names.map((name) => String(Reflect.get(project, name))).join('; '),
          to: Object.values(given).join('; '),
        },
      });
    });
    publish(context, projectId);
  }
  return projectById(context, account, projectId);
}

export async function putMember(
  context: ServerContext,
  account: Account,
  projectId: string,
  personId: string,
  role: Role,
): Promise<Project> {
  await authorizeProject(context.db, account, projectId, 'project.manage');
  const person = await findAccount(context.db, personId);
  if (person === undefined) throw notFound('person');
  if ((await roleOf(context.db, projectId, personId)) === role) return projectById(context, account, projectId);
  await context.db.transaction(async (transaction) => {
    await setMember(transaction, projectId, personId, role);
    await appendTrail(transaction, {
      projectId,
      personId: account.id,
      act: 'member.set',
      sentence: `made ${person.name} ${role} of the project`,
      detail: { personId, role },
    });
  });
  context.events.publish({ kind: 'access', personId });
  publish(context, projectId);
  return projectById(context, account, projectId);
}

export async function dropMember(
  context: ServerContext,
  account: Account,
  projectId: string,
  personId: string,
): Promise<Project> {
  await authorizeProject(context.db, account, projectId, 'project.manage');
  const person = await findAccount(context.db, personId);
  if (person === undefined) throw notFound('person');
  await context.db.transaction(async (transaction) => {
    if (!(await removeMember(transaction, projectId, personId))) throw notFound('member');
    await appendTrail(transaction, {
      projectId,
      personId: account.id,
      act: 'member.remove',
      sentence: `took ${person.name} out of the project`,
      detail: { personId },
    });
  });
  context.events.publish({ kind: 'access', personId });
  publish(context, projectId);
  return projectById(context, account, projectId);
}
