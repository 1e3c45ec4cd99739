import type { Account, Role } from '#contract';
import type { Database } from '../db/index';
import { insertPerson } from '../repositories/people';
import { insertProject, setMember } from '../repositories/projects';
import { appendTrail } from '../repositories/trail';
import type { ServerContext } from '../services/context';
import { hashPassword } from '../services/passwords';
import type { Summaries } from '../services/summaries';
import { Demo, demoPassword, type Team } from './demo';
import { seedSkarrow } from './skarrow';
import { seedVeldraNess } from './veldra-ness';

const people: readonly [signInName: string, name: string, initials: string, role: Role | undefined][] = [
  ['odile.varga', 'O. Varga', 'OV', 'engineer'],
  ['timo.reinholt', 'T. Reinholt', 'TR', 'engineer'],
  ['hanna.quaye', 'H. Quaye', 'HQ', 'checker'],
  ['alasdair.brodie', 'A. Brodie', 'AB', 'lead'],
  ['priya.lindqvarn', 'P. Lindqvarn', 'PL', 'reader'],
  ['admin', 'Administrator', 'AD', undefined],
];

const powerHouse = {
  number: '2417',
  title: 'Veldra Ness power house',
  firm: 'Hollin & Strake',
  client: 'Veldra Island Supply',
  place: 'Veldra Ness, engine hall 2',
};
const creamery = {
  number: '2431',
  title: 'Skarrow creamery, hot water and cold store',
  firm: 'Hollin & Strake',
  client: 'Skarrow Creamery',
  place: 'Skarrow, dairy hall',
};

async function seedPeople(db: Database): Promise<Map<string, { account: Account; role: Role | undefined }>> {
  const passwordHash = await hashPassword(demoPassword);
  const accounts = new Map<string, { account: Account; role: Role | undefined }>();
  for (const [signInName, name, initials, role] of people) {
    const account = await insertPerson(db, {
      signInName,
      name,
      initials,
      email: `${signInName}@hollin-strake.example`,
      administrator: role === undefined,
      passwordHash,
    });
    accounts.set(signInName, { account, role });
  }
  return accounts;
}

async function seedProject(
  db: Database,
  project: typeof powerHouse,
  members: Iterable<{ account: Account; role: Role | undefined }>,
  openedBy: Account,
): Promise<string> {
  const projectId = await insertProject(db, project);
  await appendTrail(db, {
    projectId,
    personId: openedBy.id,
    act: 'project.create',
    sentence: `opened project ${project.number} ${project.title}`,
  });
  for (const { account, role } of members) if (role !== undefined) await setMember(db, projectId, account.id, role);
  return projectId;
}

/** Lays down the demo in an empty database: people, two projects, calculations in every state. All of it is invented. */
export async function seedDemo(context: ServerContext, summaries: Summaries): Promise<void> {
  if ((await context.db('people').first('id')) !== undefined) return;
  const { team, projects } = await context.db.transaction(async (transaction) => {
    const accounts = await seedPeople(transaction);
    const account = (signInName: string): Account => {
      const found = accounts.get(signInName);
      if (found === undefined) throw new Error(`The demo has no ${signInName}.`);
      return found.account;
    };
    const atWork: Team = {
      engineer: account('odile.varga'),
      second: account('timo.reinholt'),
      checker: account('hanna.quaye'),
      lead: account('alasdair.brodie'),
    };
    const ids: string[] = [];
    for (const project of [powerHouse, creamery])
      ids.push(await seedProject(transaction, project, accounts.values(), account('admin')));
    return { team: atWork, projects: ids };
  });
  const [first = '', second = ''] = projects;
  await seedVeldraNess(new Demo(context, summaries, first, team));
  await seedSkarrow(new Demo(context, summaries, second, team));
}
