import type { Member, Role } from '#contract';
import type { Database } from '../db/index';
import { joinedPerson, personColumns } from './people';

export interface ProjectRow {
  id: string;
  number: string;
  title: string;
  firm: string;
  client: string;
  place: string;
  begun: string;
}

const columns = ['id', 'number', 'title', 'firm', 'client', 'place'];
const select = (db: Database) =>
  db<ProjectRow>('projects').select(...columns, db.raw(`to_char(begun, 'YYYY-MM-DD') AS begun`));

export async function listProjects(db: Database, personId: string, all: boolean): Promise<ProjectRow[]> {
  const query = select(db).orderBy('number');
  if (!all) void query.whereIn('id', db('project_members').select('project_id').where({ person_id: personId }));
  return query as Promise<ProjectRow[]>;
}

export async function findProject(db: Database, id: string): Promise<ProjectRow | undefined> {
  return select(db).where({ id }).first() as Promise<ProjectRow | undefined>;
}

export async function insertProject(db: Database, project: Omit<ProjectRow, 'id' | 'begun'>): Promise<string> {
  const [row] = await db('projects').insert(project).returning<{ id: string }[]>('id');
  if (row === undefined) throw new Error('The project was not written.');
  return row.id;
}

export async function updateProject(db: Database, id: string, change: Partial<Omit<ProjectRow, 'id'>>): Promise<void> {
  if (Object.keys(change).length > 0) await db('projects').where({ id }).update(change);
}

export async function listMembers(db: Database, projectIds: readonly string[]): Promise<Map<string, Member[]>> {
  const rows = await db('project_members as m')
    .join('people as p', 'p.id', 'm.person_id')
    .whereIn('m.project_id', projectIds)
    .orderBy('p.name')
    .select<Record<string, unknown>[]>({ project_id: 'm.project_id', role: 'm.role', ...personColumns('p') });
  const members = new Map<string, Member[]>(projectIds.map((id) => [id, []]));
  for (const row of rows)
    members.get(String(row.project_id))?.push({ person: joinedPerson(row), role: row.role as Role });
  return members;
}

/** The part of a person in a project; somebody who was deactivated has none any more. */
export async function roleOf(db: Database, projectId: string, personId: string): Promise<Role | undefined> {
  const row = await db('project_members as m')
    .join('people as p', 'p.id', 'm.person_id')
    .where({ 'm.project_id': projectId, 'm.person_id': personId, 'p.active': true })
    .first<{ role: Role } | undefined>('m.role');
  return row?.role;
}

export async function setMember(db: Database, projectId: string, personId: string, role: Role): Promise<void> {
  await db('project_members')
    .insert({ project_id: projectId, person_id: personId, role })
    .onConflict(['project_id', 'person_id'])
    .merge(['role']);
}

/** Answers whether the person was a member. */
export async function removeMember(db: Database, projectId: string, personId: string): Promise<boolean> {
  return (await db('project_members').where({ project_id: projectId, person_id: personId }).delete()) > 0;
}

/** E-mail addresses of active members, those of some roles only when asked. */
export async function memberAddresses(
  db: Database,
  projectId: string,
  roles?: readonly Role[],
): Promise<{ personId: string; email: string }[]> {
  const query = db('project_members as m')
    .join('people as p', 'p.id', 'm.person_id')
    .where({ 'm.project_id': projectId, 'p.active': true });
  if (roles !== undefined) void query.whereIn('m.role', roles);
  return query.select<{ personId: string; email: string }[]>({ personId: 'p.id', email: 'p.email' });
}
