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
  { db, log }: ServerContext,
  signInName: string,
  password: string,
): Promise<Account | undefined> {
  const found = await findCredentials(db, { signInName });
  const fits = await passwordFits(password, found?.passwordHash);
  const account = fits && found?.account.active === true ? found.account : undefined;
  // What was typed as a name may be a passphrase: only a person that exists is named.
  log.info({ personId: found?.account.id }, account === undefined ? 'sign-in refused' : 'signed in');
  return account;
}

/** Asks a signer for the password again. */
export async function passwordIsRight({ db }: ServerContext, account: Account, password: string): Promise<boolean> {
  const found = await findCredentials(db, { id: account.id });
  return passwordFits(password, found?.passwordHash);
}

export async function people({ db }: ServerContext, account: Account): Promise<Account[]> {
  onlyAdministrators(account);
  return listPeople(db);
}

export async function createPerson(
  { db, log }: ServerContext,
  account: Account,
  request: CreatePersonRequest,
): Promise<Account> {
  onlyAdministrators(account);
  const { password, administrator = false, ...rest } = request;
  const passwordHash = await hashPassword(password);
  try {
    const created = await insertPerson(db, { ...rest, administrator, passwordHash });
    log.info({ by: account.id, personId: created.id, administrator }, 'person brought in');
    return created;
  } catch (error) {
    if (databaseCode(error) === '23505')
      throw new ApiError('NAME_TAKEN', `The name ${request.signInName} is taken.`, { signInName: 'is taken' });
    throw error;
  }
}

/** Whether a change takes something away that open sessions still have. */
const endsSessions = (request: ChangePersonRequest): boolean =>
  request.active === false || request.password !== undefined || request.administrator === false;

export async function changePerson(
  { db, events, log }: ServerContext,
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
  log.info({ by: account.id, personId, changed: Object.keys(request) }, 'person changed');
  if (endsSessions(request)) {
    for (const sessionId of await deleteSessions(db, personId)) events.publish({ kind: 'signed-out', sessionId });
    events.publish({ kind: 'access', personId });
  }
  return changed;
}
