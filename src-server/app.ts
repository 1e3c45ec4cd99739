import compression from 'compression';
import express, { type Express, type RequestHandler, type Router } from 'express';
import type { PassportStatic } from 'passport';
import { answerErrors, answerUnknownRoute } from './middleware/errors';
import { requireSameOrigin } from './middleware/origin';
import { giveNonce, securityHeaders } from './middleware/security';
import { applicationRoutes } from './routes/application';
import { calculationRoutes } from './routes/calculations';
import { peopleRoutes } from './routes/people';
import { projectRoutes } from './routes/projects';
import { revisionRoutes } from './routes/revisions';
import { sessionRoutes } from './routes/session';
import type { ServerContext } from './services/context';
import type { Summaries } from './services/summaries';

export interface AppParts {
  context: ServerContext;
  summaries: Summaries;
  session: RequestHandler;
  passport: PassportStatic;
  /** Routes of development only: the mails caught. */
  development?: Router | undefined;
}

/** Express with everything on it; listens nowhere yet. */
export function createApp({ context, summaries, session, passport, development }: AppParts): Express {
  const { config, log, db } = context;
  const app = express();
  app.disable('x-powered-by');
  app.set('trust proxy', 'loopback');
  app.use(giveNonce, securityHeaders(config.publicOrigin.startsWith('https:')), compression());
  app.get('/healthz', async (_request, response) => {
    await db.raw('SELECT 1');
    response.json({ ok: true });
  });
  if (development !== undefined) app.use(development);
  app.use('/api', (_request, response, next) => {
    response.set('Cache-Control', 'no-store');
    next();
  });
  app.use(
    '/api',
    requireSameOrigin(config.publicOrigin),
    express.json({ limit: '1mb' }),
    session,
    passport.initialize(),
    passport.session(),
  );
  app.use(
    '/api',
    sessionRoutes(context, passport),
    peopleRoutes(context),
    projectRoutes(context, summaries),
    calculationRoutes(context, summaries),
    revisionRoutes(context, summaries),
  );
  app.use('/api', answerUnknownRoute);
  app.use(applicationRoutes(config.applicationFolder));
  app.use(answerErrors(log));
  return app;
}
