import { createServer, type Server } from 'node:http';
import { pathToFileURL } from 'node:url';
import { Pool } from 'pg';
import { pino, stdSerializers, type Logger } from 'pino';
import { createApp } from './app';
import { attachCollaboration } from './collaboration/index';
import { readConfig, type Config } from './config/index';
import { createDatabase, migrate } from './db/index';
import { startMailJobs } from './jobs/mail-queue';
import { catcherRoutes, startMailCatcher, type MailCatcher } from './mail/catcher';
import { createMailer } from './mail/transport';
import { configurePassport } from './middleware/passport';
import { createSessionMiddleware } from './middleware/session';
import { attachRealtime } from './realtime/index';
import { seedDemo } from './seed/index';
import { EventBus, type ServerContext } from './services/context';
import { Summaries } from './services/summaries';

export interface RunningServer {
  port: number;
  context: ServerContext;
  summaries: Summaries;
  /** Mails that were caught instead of sent; undefined when a real SMTP server is set. */
  catcher: MailCatcher | undefined;
  close(): Promise<void>;
}

function listen(server: Server, { port, host }: Config): Promise<number> {
  return new Promise((resolve, reject) => {
    server.once('error', reject);
    server.listen(port, host, () => {
      const address = server.address();
      resolve(typeof address === 'object' && address !== null ? address.port : port);
    });
  });
}

/** Brings everything up: database, jobs, routes, sync endpoint, notices; answers when it listens. */
export async function startServer(config: Config, log: Logger): Promise<RunningServer> {
  const db = createDatabase(config.databaseUrl);
  await migrate(db);
  const pool = new Pool({ connectionString: config.databaseUrl, max: 5 });
  pool.on('error', (error) => log.error({ error }, 'session store'));
  const catcher = config.smtpUrl === undefined ? await startMailCatcher() : undefined;
  const jobs = await startMailJobs(config.databaseUrl, createMailer(config, config.smtpUrl ?? catcher?.url ?? ''), log);
  const context: ServerContext = { config, db, events: new EventBus(), mails: jobs, log };
  const summaries = new Summaries(context);
  if (config.seedDemo) await seedDemo(context, summaries);
  await summaries.catchUp();

  const session = createSessionMiddleware(config, pool);
  const app = createApp({
    context,
    summaries,
    session,
    passport: configurePassport(context),
    development: catcher && catcherRoutes(catcher),
  });
  const server = createServer(app);
  const realtime = attachRealtime(server, session, context);
  const collaboration = attachCollaboration(server, session, context, summaries);
  const port = await listen(server, config);

  return {
    port,
    context,
    summaries,
    catcher,
    async close() {
      // Websockets first: Socket.IO waits for connections that would never end by themselves.
      await collaboration.close();
      await realtime.close();
      server.closeAllConnections();
      // After the last document is written, before the database goes.
      await summaries.stop();
      await jobs.stop();
      await catcher?.close();
      await pool.end();
      await db.destroy();
    },
  };
}

async function main(): Promise<void> {
  const config = readConfig(process.env);
  const log = pino({ level: config.logLevel, serializers: { error: stdSerializers.err } });
  const running = await startServer(config, log);
  log.info({ port: running.port }, 'listening');
  const stop = () => {
    running.close().then(
      () => process.exit(0),
      (error: unknown) => {
        log.error({ error }, 'did not close cleanly');
        process.exit(1);
      },
    );
  };
  process.once('SIGTERM', stop);
  process.once('SIGINT', stop);
}

if (process.argv[1] !== undefined && import.meta.url === pathToFileURL(process.argv[1]).href) {
  main().catch((error: unknown) => {
    process.stderr.write(`wallflux: ${error instanceof Error ? error.message : String(error)}\n`);
    process.exit(1);
  });
}
