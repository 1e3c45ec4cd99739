import type { Notice } from '#contract';
import type { Logger } from 'pino';
import type { Config } from '../config/index';
import type { Database } from '../db/index';

/** What happened, for the parts that hold open connections: sync endpoint and Socket.IO. */
export type ServerEvent =
  | { kind: 'notice'; notice: Notice }
  /** The state of a revision changed: who may write in it is asked anew. */
  | { kind: 'revision-state'; revisionId: string }
  /** Roles or membership changed, or a person was deactivated. */
  | { kind: 'access'; personId: string }
  | { kind: 'signed-out'; sessionId: string };

/** Hands events on to listeners within this process. */
export class EventBus {
  private readonly listeners = new Set<(event: ServerEvent) => void>();

  /** Answers the end of listening. */
  listen(listener: (event: ServerEvent) => void): () => void {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  }

  publish(event: ServerEvent): void {
    for (const listener of this.listeners) listener(event);
  }
}

export interface OutgoingMail {
  to: string;
  subject: string;
  text: string;
}

/** Takes mails for delivery; they survive a restart. */
export interface MailQueue {
  /** Within a transaction: no mail goes out for an act that is rolled back, none is lost for one that is not. */
  enqueue(mails: readonly OutgoingMail[], transaction: Database): Promise<void>;
}

/** What every service works with; made once in the composition root. */
export interface ServerContext {
  config: Config;
  db: Database;
  events: EventBus;
  mails: MailQueue;
  log: Logger;
}
