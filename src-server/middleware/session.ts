import connectPgSimple from 'connect-pg-simple';
import type { RequestHandler } from 'express';
import session from 'express-session';
import type { Pool } from 'pg';
import type { Config } from '../config/index';

const twelveHours = 12 * 60 * 60 * 1000;

/** Sessions in PostgreSQL; used by the routes, the sync endpoint and Socket.IO alike. */
export function createSessionMiddleware(config: Config, pool: Pool): RequestHandler {
  const Store = connectPgSimple(session);
  const https = config.publicOrigin.startsWith('https:');
  return session({
    // The prefix makes the browser refuse a cookie of this name that came from elsewhere or without TLS.
    name: https ? '__Host-wallflux.sid' : 'wallflux.sid',
    secret: config.sessionSecret,
    store: new Store({ pool, tableName: 'session', pruneSessionInterval: config.production ? 900 : false }),
    resave: false,
    saveUninitialized: false,
    rolling: true,
    cookie: { httpOnly: true, sameSite: 'lax', secure: https, maxAge: twelveHours },
  });
}
