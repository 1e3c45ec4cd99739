import connectPgSimple from 'connect-pg-simple';
import type { RequestHandler } from 'express';
import session from 'express-session';
import type { Pool } from 'pg';
import type { Config } from '../config/index';

export const sessionCookie = 'wallflux.sid';
const twelveHours = 12 * 60 * 60 * 1000;

/** Sessions in PostgreSQL; used by the routes, the sync endpoint and Socket.IO alike. */
export function createSessionMiddleware(config: Config, pool: Pool): RequestHandler {
  const Store = connectPgSimple(session);
  return session({
    name: sessionCookie,
    secret: config.sessionSecret,
    store: new Store({ pool, tableName: 'session', pruneSessionInterval: config.production ? 900 : false }),
    resave: false,
    saveUninitialized: false,
    rolling: true,
    cookie: { httpOnly: true, sameSite: 'lax', secure: config.publicOrigin.startsWith('https:'), maxAge: twelveHours },
  });
}
