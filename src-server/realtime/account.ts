import type { IncomingMessage } from 'node:http';
import type { Request, RequestHandler, Response } from 'express';
import type { Account } from '#contract';
import type { Database } from '../db/index';
import { findAccount } from '../repositories/people';

export interface SignedIn {
  account: Account;
  sessionId: string;
  /** Whether the session still stands in the store: it may have run out since. */
  holds(): Promise<boolean>;
}

/** The signed-in person behind a request that is not one of Express (an upgrade); undefined when there is none. */
export async function accountOfRequest(
  request: IncomingMessage,
  session: RequestHandler,
  db: Database,
): Promise<SignedIn | undefined> {
  const expressRequest = request as Request;
  const noResponse = {
    setHeader: () => undefined,
    getHeader: () => undefined,
    end: () => undefined,
  } as unknown as Response;
  await new Promise<void>((resolve, reject) => {
    void session(expressRequest, noResponse, (error?: unknown) =>
      error === undefined ? resolve() : reject(error instanceof Error ? error : new Error(String(error))),
    );
  });
  const passport: unknown = Reflect.get(expressRequest.session, 'passport');
  const id: unknown = typeof passport === 'object' && passport !== null ? Reflect.get(passport, 'user') : undefined;
  if (typeof id !== 'string') return undefined;
  const account = await findAccount(db, id);
  const { sessionID: sessionId } = expressRequest;
  return account?.active === true ? { account, sessionId, holds: () => sessionHolds(expressRequest) } : undefined;
}

function sessionHolds({ sessionStore, sessionID }: Request): Promise<boolean> {
  return new Promise((resolve, reject) =>
    sessionStore.get(sessionID, (error: unknown, session) => {
      if (error) reject(error instanceof Error ? error : new Error('The session could not be read.'));
      else resolve(session !== null && session !== undefined);
    }),
  );
}
