import type { Account, ChangePersonRequest, CreatePersonRequest } from '#contract';
import { ApiError, databaseCode, forbidden, notFound } from '../errors/index';
import { deleteSessions, findCredentials, insertPerson, listPeople, updatePerson } from '../repositories/people';
import type { ServerContext } from './context';
import { hashPassword, passwordFits } from './passwords';

function onlyAdministrators(account: Account): void {
  if (!account.administrator) throw forbidden('Only an administrator keeps people.');
}

/** The account behind a name and a password; undefined when they do not fit together, or the person is no longer active. */
export async function signIn(
  { db }: ServerContext,
  signInName: string,
  password: string,
): Promise<Account | undefined> {
  const found = await findCredentials(db, { signInName });
  const fits = await passwordFits(password, found?.passwordHash);
  return fits && found?.account.active === true ? found.account : undefined;
}

/** Asks a signer for the password again; throws WRONG_PASSWORD. */
export async function confirmPassword({ db }: ServerContext, account: Account, password: string): Promise<void> {
  const found = await findCredentials(db, { id: account.id });
  if (!(await passwordFits(password, found?.passwordHash)))
    throw new ApiError('WRONG_PASSWORD', 'The passphrase is not right; nothing was signed.');
}

export async function people({ db }: ServerContext, account: Account): Promise<Account[]> {
  onlyAdministrators(account);
  return listPeople(db);
}

export async function createPerson(
  { db }: ServerContext,
  account: Account,
  request: CreatePersonRequest,
): Promise<Account> {
  onlyAdministrators(account);
  const { password, administrator = false, ...rest } = request;
  const passwordHash = await hashPassword(password);
  try {
    return await insertPerson(db, { ...rest, administrator, passwordHash });
  } catch (error) {
    if (databaseCode(error) === '23505')
      throw new ApiError('NAME_TAKEN', `The name ${request.signInName} is taken.`, { signInName: 'is taken' });
    throw error;
  }
}

export async function changePerson(
  { db, events }: ServerContext,
  account: Account,
  personId: string,
  request: ChangePersonRequest,
): Promise<Account> {
  onlyAdministrators(account);
  if (personId === account.id && (request.active === false || request.administrator === false)) {
    throw forbidden('An administrator cannot take away the own access; another one has to.');
  }
  const { password, ...rest } = request;
  const changed = await updatePerson(db, personId, {
    ...rest,
    passwordHash: password === undefined ? undefined : await hashPassword(password),
  });
  if (changed === undefined) throw notFound('person');
  if (request.active === false || password !== undefined) {
    await deleteSessions(db, personId);
    events.publish({ kind: 'access', personId });
  }
  return changed;
}
