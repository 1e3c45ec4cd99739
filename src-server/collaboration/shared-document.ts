import { setTimeout as pause } from 'node:timers/promises';
import * as Y from 'yjs';
import { may, type RevisionState } from '#contract';
import { appendUpdates, saveState } from '../repositories/documents';
import type { ServerContext } from '../services/context';
import { loadDocument } from '../services/documents';
import type { Connection } from './connection';
import {
  answerMessage,
  askMessage,
  keptMessage,
  presenceMessage,
  readMessage,
  refusedMessage,
  updateMessage,
  type Incoming,
} from './messages';
import { Presence } from './presence';
import { again } from './again';
import { isNews, Trial } from './trial';

/** How long updates are gathered before they are written together, in ms. */
const gatherFor = 4;
/** So many updates make the next opening slow: they are folded while people go on. */
const foldAfter = 2000;
/** How long to wait before what may have been written in a failure is looked for, in ms; then twice as long, and so on. */
const firstLook = 500;
const longestWait = 30_000;

interface Pending {
  from: Connection;
  update: Uint8Array;
  /** Whether it says something new; otherwise only its sender waits for an answer. */
  news: boolean;
  first: boolean;
}

export interface DocumentCallbacks {
  /** Content was written by somebody; signatures may have become void by it. */
  written(by: Connection, voided: boolean): void;
}

/**
 * The document of one revision while browsers are at it. An update is in the database before it is
 * applied here and spread to others: what anybody sees, a killed server still has.
 */
export class SharedDocument {
  readonly connections = new Set<Connection>();
  private readonly presence = new Presence();
  private readonly trial: Trial;
  private pending: Pending[] = [];
  private flushing: Promise<void> | undefined;
  private folding: Promise<void> | undefined;
  /** Updates in the database that are not in a folded state yet. */
  private unfolded: number;
  private looking = false;
  private closed = false;

  private constructor(
    readonly revisionId: string,
    private readonly doc: Y.Doc,
    throughId: string,
    private readonly context: ServerContext,
    private readonly callbacks: DocumentCallbacks,
  ) {
    this.trial = new Trial(doc);
    this.unfolded = throughId === '0' ? 0 : 1;
  }

  /** Loads everything that is stored before anybody is answered. */
  static async open(revisionId: string, context: ServerContext, callbacks: DocumentCallbacks): Promise<SharedDocument> {
    const { doc, throughId } = await loadDocument(context.db, revisionId);
    return new SharedDocument(revisionId, doc, throughId, context, callbacks);
  }

  join(connection: Connection): void {
    this.connections.add(connection);
    connection.send(askMessage(this.doc));
    this.tellPresence(connection);
  }

  leave(connection: Connection): void {
    if (!this.connections.delete(connection)) return;
    const gone = this.presence.leave(connection);
    if (gone !== undefined) this.spread(presenceMessage(gone));
    if (![...this.connections].some(({ writing }) => writing === 'may')) this.trial.forget();
  }

  private spread(data: Uint8Array, except?: Connection): void {
    for (const connection of this.connections) if (connection !== except) connection.send(data);
  }

  private tellPresence(connection: Connection): void {
    const here = this.presence.all();
    if (here !== undefined) connection.send(presenceMessage(here));
  }

  /** Takes one message of a browser. Never throws: a malformed one ends the connection. */
  receive(connection: Connection, data: Uint8Array): void {
    if (this.closed || !connection.open) return;
    try {
      this.deal(connection, readMessage(data));
    } catch {
      connection.close(1003, 'the message cannot be read');
    }
  }

  private deal(connection: Connection, incoming: Incoming): void {
    if (incoming.kind === 'ask') connection.send(answerMessage(this.doc, incoming.stateVector));
    else if (incoming.kind === 'update') this.takeUpdate(connection, incoming.update, incoming.first);
    else if (incoming.kind === 'query presence') this.tellPresence(connection);
    else if (incoming.kind === 'presence') {
      const told = this.presence.take(connection, incoming.update);
      if (told !== undefined) this.spread(presenceMessage(told), connection);
    }
  }

  private takeUpdate(connection: Connection, update: Uint8Array, first: boolean): void {
    if (connection.writing !== 'may') {
      // What a reader's browser has from before is no news; what is news, it must not write.
      if (isNews(this.doc, update)) connection.send(refusedMessage(connection.writing));
      else this.tellKept([{ from: connection, update, news: false, first }]);
      return;
    }
    const verdict = this.trial.take(update);
    if (verdict === 'too large') {
      connection.send(refusedMessage('TOO_LARGE'));
      return;
    }
    this.pending.push({ from: connection, update, news: verdict === 'news', first });
    this.flushing ??= this.flush();
  }

  /** Writes what was gathered, batch by batch, in order. Never rejects. */
  private async flush(): Promise<void> {
    await pause(gatherFor);
    while (this.pending.length > 0) {
      const batch = this.pending;
      this.pending = [];
      try {
        await this.write(batch);
      } catch (error) {
        this.context.log.error({ error, revisionId: this.revisionId }, 'updates were not written');
        this.giveUp(batch, (from) => from.close(1013, 'not kept, try again'));
        void this.lookAfterFailure();
      }
    }
    this.flushing = undefined;
  }

  /** Waits until everything that was taken so far is decided. */
  async settled(): Promise<void> {
    while (this.flushing !== undefined) await this.flushing;
  }

  private async write(batch: readonly Pending[]): Promise<void> {
    const news = batch.filter((one) => one.news);
    if (news.length === 0) {
      this.tellKept(batch);
      return;
    }
    const updates = news.map(({ from, update }) => ({ personId: from.account.id, content: update }));
    const writable = (state: RevisionState) => may('engineer', 'content.write', state);
    const { written, voided } = await again(() => appendUpdates(this.context.db, this.revisionId, updates, writable));
    if (!written) {
      this.giveUp(batch, (from) => from.send(refusedMessage('WRONG_STATE')));
      return;
    }
    this.unfolded += updates.length;
    this.apply(
      news.map(({ update }) => update),
      new Set(news.map(({ from }) => from)),
    );
    this.tellKept(batch);
    const writers = new Map(news.map(({ from }) => [from.account.id, from]));
    for (const writer of writers.values()) this.callbacks.written(writer, voided);
    if (this.unfolded > foldAfter) void this.fold();
  }

  /** Applies updates as one and spreads what they change; a single sender has it already. */
  private apply(updates: readonly Uint8Array[], senders: ReadonlySet<Connection>): void {
    const news: Uint8Array[] = [];
    const note = (update: Uint8Array) => news.push(update);
    this.doc.on('update', note);
    try {
      this.doc.transact(() => {
        for (const update of updates) Y.applyUpdate(this.doc, update);
      });
    } finally {
      this.doc.off('update', note);
    }
    const [only] = senders.size === 1 ? senders : [];
    for (const update of news) this.spread(updateMessage(update), only);
  }

  /** Tells each sender once how far its own updates are in the database. */
  private tellKept(batch: readonly Pending[]): void {
    for (const { from, first } of batch) {
      if (first) from.kept.first = true;
      else from.kept.updates += 1;
    }
    const now = Date.now();
    for (const from of new Set(batch.map((one) => one.from)))
      from.send(keptMessage(from.kept.updates, from.kept.first, now));
  }

  /** What was not written, and all that was taken after it and may rest on it. Its senders still have it. */
  private giveUp(batch: readonly Pending[], tell: (from: Connection) => void): void {
    const all = [...batch, ...this.pending];
    this.pending = [];
    this.trial.forget();
    // What was no news beside something that is now given up may be news after all.
    const told = new Set(all.filter(({ news, update }) => news || isNews(this.doc, update)).map(({ from }) => from));
    for (const from of told) tell(from);
    this.tellKept(all.filter(({ from }) => !told.has(from)));
  }

  /**
   * After a failure the database may hold what could not be confirmed. It is read until that succeeds, so
   * that what browsers see and what a signature is computed from never part.
   */
  private async lookAfterFailure(): Promise<void> {
    if (this.looking) return;
    this.looking = true;
    for (let wait = firstLook; !this.closed; wait = Math.min(2 * wait, longestWait)) {
      await pause(wait, undefined, { ref: false });
      try {
        const { doc } = await loadDocument(this.context.db, this.revisionId);
        if (!this.closed) this.apply([Y.encodeStateAsUpdate(doc, Y.encodeStateVector(this.doc))], new Set());
        break;
      } catch (error) {
        this.context.log.warn({ error, revisionId: this.revisionId }, 'document could not be read again yet');
      }
    }
    this.looking = false;
  }

  /** Folds what is stored into one state, so that the next opening is quick. Never rejects. */
  fold(): Promise<void> {
    this.folding ??= this.foldNow().finally(() => {
      this.folding = undefined;
    });
    return this.folding;
  }

  private async foldNow(): Promise<void> {
    if (this.unfolded === 0) return;
    const folded = this.unfolded;
    this.unfolded = 0;
    try {
      const { doc, throughId } = await loadDocument(this.context.db, this.revisionId);
      if (throughId !== '0') await saveState(this.context.db, this.revisionId, Y.encodeStateAsUpdate(doc), throughId);
    } catch (error) {
      this.unfolded += folded;
      this.context.log.error({ error, revisionId: this.revisionId }, 'document was not folded');
    }
  }

  /** Takes nothing more. */
  async close(): Promise<void> {
    this.closed = true;
    await this.settled();
    await this.folding;
    await this.fold();
    this.trial.forget();
    this.doc.destroy();
  }
}
