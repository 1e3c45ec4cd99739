import type { ClientBase } from 'pg';
import PgBoss from 'pg-boss';
import type { Logger } from 'pino';
import { z } from 'zod';
import type { Database } from '../db/index';
import type { MailQueue } from '../services/context';
import type { SendMail } from '../mail/transport';

const queue = 'mail';
const outgoing = z.object({ to: z.string(), subject: z.string(), text: z.string() });

/** Runs pg-boss's own SQL on the connection of a transaction. */
function within(transaction: Database): PgBoss.Db {
  return {
    async executeSql(text, values) {
      const connection = (await (
        transaction.client as { acquireConnection(): Promise<unknown> }
      ).acquireConnection()) as ClientBase;
      return connection.query(text, values as unknown[]);
    },
  };
}

export interface MailJobs extends MailQueue {
  stop(): Promise<void>;
}

/** Mails as jobs on the same PostgreSQL: they survive a restart and are tried again with growing pauses. */
export async function startMailJobs(databaseUrl: string, sendMail: SendMail, log: Logger): Promise<MailJobs> {
  const boss = new PgBoss({ connectionString: databaseUrl, max: 3 });
  boss.on('error', (error) => log.error({ error }, 'job queue'));
  await boss.start();
  await boss.createQueue(queue);
  await boss.work(queue, { pollingIntervalSeconds: 0.5 }, async ([job]) => {
    if (job !== undefined) await sendMail(outgoing.parse(job.data));
  });
  return {
    async enqueue(mails, transaction) {
      const db = within(transaction);
      for (const mail of mails)
        await boss.send(queue, { ...mail }, { db, retryLimit: 8, retryDelay: 30, retryBackoff: true });
    },
    stop: () => boss.stop({ graceful: true, timeout: 5000, wait: true }),
  };
}
