import { Router, type Request, type RequestHandler } from 'express';
import type { PassportStatic } from 'passport';
import { signInRequest, type Session } from '#contract';
import { ApiError } from '../errors/index';
import { limitSignIn } from '../middleware/rate-limit';
import type { ServerContext } from '../services/context';
import { route } from './route';

const nameIn = (body: unknown): string => {
  const parsed = signInRequest.safeParse(body);
  return parsed.success ? parsed.data.signInName.toLowerCase() : '';
};

const established = (request: Request, account: Express.User): Promise<void> =>
  // Passport renews the session's id here, so that one planted before sign-in is worth nothing.
  new Promise((resolve, reject) => request.logIn(account, (error: unknown) => (error ? reject(error) : resolve())));

const ended = (request: Request): Promise<void> =>
  new Promise((resolve, reject) => request.session.destroy((error: unknown) => (error ? reject(error) : resolve())));

export function sessionRoutes(context: ServerContext, passport: PassportStatic): Router {
  const router = Router();

  const authenticate: RequestHandler = (request, response, next) => {
    const verify = passport.authenticate('local', (error: unknown, account: Express.User | false) => {
      if (error) next(error);
      else if (account === false) next(new ApiError('WRONG_PASSWORD', 'Name and passphrase do not fit together.'));
      else
        established(request, account).then(
          () => response.status(200).json({ person: account } satisfies Session),
          next,
        );
    }) as RequestHandler;
    if (signInRequest.safeParse(request.body).success) void verify(request, response, next);
    else next(new ApiError('INVALID_INPUT', 'A name and a passphrase are needed.'));
  };
  router.post('/session', ...limitSignIn(nameIn), authenticate);

  route(router, {
    method: 'get',
    path: '/session',
    permission: 'signed in',
    handle: ({ account }) => Promise.resolve({ person: account } satisfies Session),
  });

  route(router, {
    method: 'delete',
    path: '/session',
    permission: 'signed in',
    async handle({ request }) {
      const sessionId = request.sessionID;
      await ended(request);
      context.events.publish({ kind: 'signed-out', sessionId });
    },
  });
  return router;
}
