import { may, syncClose, type RevisionState } from '#contract';
import * as awarenessProtocol from 'y-protocols/awareness';
import * as Y from 'yjs';
import { appendUpdates, saveState } from '../repositories/documents';
import type { ServerContext } from '../services/context';
import { loadDocument } from '../services/documents';
import type { Connection } from './connection';
import {
  answerMessage,
  askMessage,
  awarenessMessage,
  keptMessage,
  readMessage,
  refusedMessage,
  updateMessage,
  type Incoming,
} from './messages';

/** How long updates are gathered before they are written together, in ms. */
const gatherFor = 4;
/** A document larger than this takes no more updates, in bytes. */
const largestDocument = 30_000_000;

interface Pending {
  from: Connection;
  update: Uint8Array;
  first: boolean;
}

export interface DocumentCallbacks {
  /** Content was written by a person; signatures may have become void by it. */
  written(personId: string, voided: boolean): void;
}

/**
 * The document of one revision while browsers are at it. An update is in the database before it is
 * applied here and spread to others: what anybody sees, a killed server still has.
 */
export class SharedDocument {
  readonly connections = new Set<Connection>();
  private readonly awareness: awarenessProtocol.Awareness;
  private pending: Pending[] = [];
  private flushing: Promise<void> | undefined;
  private size = 0;

  private constructor(
    readonly revisionId: string,
    private readonly doc: Y.Doc,
    private readonly context: ServerContext,
    private readonly callbacks: DocumentCallbacks,
  ) {
    this.awareness = new awarenessProtocol.Awareness(doc);
    this.awareness.setLocalState(null);
    this.size = Y.encodeStateAsUpdate(doc).length;
  }

  /** Loads everything that is stored before anybody is answered. */
  static async open(revisionId: string, context: ServerContext, callbacks: DocumentCallbacks): Promise<SharedDocument> {
    const { doc } = await loadDocument(context.db, revisionId);
    return new SharedDocument(revisionId, doc, context, callbacks);
  }

  join(connection: Connection): void {
    this.connections.add(connection);
    connection.send(askMessage(this.doc));
    const present = [...this.awareness.getStates().keys()];
    if (present.length > 0)
      connection.send(awarenessMessage(awarenessProtocol.encodeAwarenessUpdate(this.awareness, present)));
  }

  leave(connection: Connection): void {
    this.connections.delete(connection);
    const ids = [...connection.awarenessIds];
    if (ids.length === 0) return;
    awarenessProtocol.removeAwarenessStates(this.awareness, ids, connection);
    this.spread(awarenessMessage(awarenessProtocol.encodeAwarenessUpdate(this.awareness, ids)), connection);
  }

  private spread(data: Uint8Array, except: Connection): void {
    for (const connection of this.connections) if (connection !== except) connection.send(data);
  }

  /** Takes one message of a browser. Never throws: a malformed one ends the connection. */
  receive(connection: Connection, data: Uint8Array): void {
    let incoming: Incoming;
    try {
      incoming = readMessage(data);
      if (incoming.kind === 'awareness') this.takeAwareness(connection, incoming.update);
    } catch {
      connection.close(1003, 'the message cannot be read');
      return;
    }
    if (incoming.kind === 'ask') connection.send(answerMessage(this.doc, incoming.stateVector));
    else if (incoming.kind === 'update') this.takeUpdate(connection, incoming.update, incoming.first);
    else if (incoming.kind === 'query awareness') {
      const ids = [...this.awareness.getStates().keys()];
      connection.send(awarenessMessage(awarenessProtocol.encodeAwarenessUpdate(this.awareness, ids)));
    }
  }

  private takeUpdate(connection: Connection, update: Uint8Array, first: boolean): void {
    if (isEmpty(update)) {
      this.tellKept(connection, first);
      return;
    }
    if (!connection.canWrite) {
      // What a reader's browser has from before is no news; what is news, it must not write.
      if (this.isNews(update)) connection.send(refusedMessage('FORBIDDEN'));
      else this.tellKept(connection, first);
      return;
    }
    if (this.size > largestDocument) {
      connection.send(refusedMessage('TOO_LARGE'));
      return;
    }
    this.pending.push({ from: connection, update, first });
    this.flushing ??= this.flushSoon();
  }

  private tellKept(connection: Connection, first: boolean): void {
    if (first) connection.kept.first = true;
    else connection.kept.updates += 1;
    connection.send(keptMessage(connection.kept.updates, connection.kept.first, Date.now()));
  }

  private isNews(update: Uint8Array): boolean {
    const copy = new Y.Doc();
    Y.applyUpdate(copy, Y.encodeStateAsUpdate(this.doc));
    let news = false;
    copy.on('update', () => {
      news = true;
    });
    Y.applyUpdate(copy, update);
    copy.destroy();
    return news;
  }

  private async flushSoon(): Promise<void> {
    await new Promise((resolve) => setTimeout(resolve, gatherFor));
    while (this.pending.length > 0) {
      const batch = this.pending;
      this.pending = [];
      await this.write(batch);
    }
    this.flushing = undefined;
  }

  /** Waits until everything that was taken so far is decided. */
  async settled(): Promise<void> {
    await this.flushing;
  }

  private async write(batch: readonly Pending[]): Promise<void> {
    const writable = (state: RevisionState) => may('engineer', 'content.write', state);
    const updates = batch.map(({ from, update }) => ({ personId: from.account.id, content: update }));
    try {
      const { written, voided } = await appendUpdates(this.context.db, this.revisionId, updates, writable);
      if (written) this.accept(batch, voided);
      else for (const { from } of batch) from.send(refusedMessage('WRONG_STATE'));
    } catch (error) {
      this.context.log.error({ error, revisionId: this.revisionId }, 'updates were not written');
      // Nothing was applied: the browsers still have their text, and send it again when they come back.
      for (const { from } of batch) from.close(1013, 'not kept, try again');
    }
  }

  private accept(batch: readonly Pending[], voided: boolean): void {
    for (const { from, update, first } of batch) {
      Y.applyUpdate(this.doc, update, from);
      this.spread(updateMessage(update), from);
      this.size += update.length;
      this.tellKept(from, first);
    }
    const writers = new Set(batch.map(({ from }) => from));
    for (const personId of new Set([...writers].map((writer) => writer.account.id)))
      this.callbacks.written(personId, voided);
  }

  /** A browser speaks for its own presence only, and under the name of its session. */
  private takeAwareness(connection: Connection, update: Uint8Array): void {
    const { id, name, initials } = connection.account;
    const named = awarenessProtocol.modifyAwarenessUpdate(update, (state: unknown) =>
      typeof state === 'object' && state !== null
        ? { ...state, user: { ...pickColour(state), id, name, initials } }
        : null,
    );
    const scratch = new awarenessProtocol.Awareness(new Y.Doc());
    scratch.setLocalState(null);
    awarenessProtocol.applyAwarenessUpdate(scratch, named, null);
    const ids = [...scratch.meta.keys()].filter((clientId) => clientId !== scratch.clientID);
    scratch.destroy();
    const foreign = ids.some((clientId) =>
      [...this.connections].some((other) => other !== connection && other.awarenessIds.has(clientId)),
    );
    if (foreign || ids.length > 4) return;
    for (const clientId of ids) connection.awarenessIds.add(clientId);
    awarenessProtocol.applyAwarenessUpdate(this.awareness, named, connection);
    this.spread(awarenessMessage(named), connection);
  }

  /** Asks anew for each browser whether it may read and write; `decide` answers undefined for no access at all. */
  async review(decide: (connection: Connection) => Promise<boolean | undefined>): Promise<void> {
    for (const connection of [...this.connections]) {
      const canWrite = await decide(connection);
      if (canWrite === undefined) connection.close(syncClose.forbidden, 'no access any more');
      else connection.canWrite = canWrite;
    }
  }

  /** Folds what is stored into one state, so that the next opening is quick. */
  async close(): Promise<void> {
    await this.settled();
    this.awareness.destroy();
    this.doc.destroy();
    const { doc, throughId } = await loadDocument(this.context.db, this.revisionId);
    if (throughId !== '0') await saveState(this.context.db, this.revisionId, Y.encodeStateAsUpdate(doc), throughId);
  }
}

function isEmpty(update: Uint8Array): boolean {
  const { structs, ds } = Y.decodeUpdate(update);
  return structs.length === 0 && ds.clients.size === 0;
}

/** A colour of the page's own, for carets. */
const colour = /^(?:#[0-9a-f]{3,8}|var\(--[a-z0-9-]{1,20}\))$/i;

/** Of what a browser says of its user only colours count; who it is, the session says. */
function pickColour(state: object): Record<string, string> {
  const user: unknown = Reflect.get(state, 'user');
  if (typeof user !== 'object' || user === null) return {};
  const named = ['color', 'colorLight'].map((key): [string, unknown] => [key, Reflect.get(user, key)]);
  return Object.fromEntries(
    named.filter((entry): entry is [string, string] => typeof entry[1] === 'string' && colour.test(entry[1])),
  );
}
