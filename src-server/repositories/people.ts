import type { Account, Person } from '#contract';
import type { Database } from '../db/index';

interface PersonRow {
  id: string;
  sign_in_name: string;
  name: string;
  initials: string;
  email: string;
  password_hash: string;
  administrator: boolean;
  active: boolean;
}

export interface Credentials {
  account: Account;
  passwordHash: string;
}

const accountOf = (row: PersonRow): Account => ({
  id: row.id,
  signInName: row.sign_in_name,
  name: row.name,
  initials: row.initials,
  email: row.email,
  administrator: row.administrator,
  active: row.active,
});

/** Columns of a person as others see one, for joins: `…personColumns('author')`. */
export const personColumns = (table: string, prefix = 'person'): Record<string, string> => ({
  [`${prefix}_id`]: `${table}.id`,
  [`${prefix}_sign_in_name`]: `${table}.sign_in_name`,
  [`${prefix}_name`]: `${table}.name`,
  [`${prefix}_initials`]: `${table}.initials`,
});

export function joinedPerson(row: Record<string, unknown>, prefix = 'person'): Person {
  const part = (name: string) => String(row[`${prefix}_${name}`]);
  return { id: part('id'), signInName: part('sign_in_name'), name: part('name'), initials: part('initials') };
}

export async function listPeople(db: Database): Promise<Account[]> {
  return (await db<PersonRow>('people').orderBy('name')).map(accountOf);
}

export async function findAccount(db: Database, id: string): Promise<Account | undefined> {
  const row = await db<PersonRow>('people').where({ id }).first();
  return row && accountOf(row);
}

export async function findCredentials(
  db: Database,
  by: { id: string } | { signInName: string },
): Promise<Credentials | undefined> {
  const row = await db<PersonRow>('people')
    .where('id' in by ? { id: by.id } : { sign_in_name: by.signInName.toLowerCase() })
    .first();
  return row && { account: accountOf(row), passwordHash: row.password_hash };
}

export interface PersonChange {
  name?: string | undefined;
  initials?: string | undefined;
  email?: string | undefined;
  administrator?: boolean | undefined;
  active?: boolean | undefined;
  passwordHash?: string | undefined;
}

const columnsOf = ({ passwordHash, ...rest }: PersonChange) => ({
  ...rest,
  ...(passwordHash === undefined ? {} : { password_hash: passwordHash }),
});

export async function insertPerson(
  db: Database,
  person: Required<Omit<PersonChange, 'active'>> & { signInName: string },
): Promise<Account> {
  const { signInName, ...rest } = person;
  const [row] = await db<PersonRow>('people')
    .insert({ sign_in_name: signInName.toLowerCase(), ...columnsOf(rest) } as PersonRow)
    .returning('*');
  if (row === undefined) throw new Error('The person was not written.');
  return accountOf(row);
}

export async function updatePerson(db: Database, id: string, change: PersonChange): Promise<Account | undefined> {
  const columns = columnsOf(change);
  if (Object.keys(columns).length === 0) return findAccount(db, id);
  const [row] = await db<PersonRow>('people')
    .where({ id })
    .update(columns as Partial<PersonRow>)
    .returning('*');
  return row && accountOf(row);
}

/** Ends every session of a person; answers their ids. */
export async function deleteSessions(db: Database, personId: string): Promise<string[]> {
  const rows = await db('session')
    .whereRaw(`sess #>> '{passport,user}' = ?`, [personId])
    .delete()
    .returning<{ sid: string }[]>('sid');
  return rows.map(({ sid }) => sid);
}
