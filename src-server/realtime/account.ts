import type { IncomingMessage } from 'node:http';
import type { Request, RequestHandler, Response } from 'express';
import type { Account } from '#contract';
import type { Database } from '../db/index';
import { findAccount } from '../repositories/people';

/** The signed-in person behind a request that is not one of Express (an upgrade); undefined when there is none. */
export async function accountOfRequest(
  request: IncomingMessage,
  session: RequestHandler,
  db: Database,
): Promise<{ account: Account; sessionId: string } | undefined> {
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
  return account?.active === true ? { account, sessionId: expressRequest.sessionID } : undefined;
}
