import type { IncomingMessage, Server } from 'node:http';
import type { Duplex } from 'node:stream';
import type { RequestHandler } from 'express';
import { WebSocketServer, type WebSocket } from 'ws';
import { z } from 'zod';
import { syncClose, syncPath } from '#contract';
import { noticesPath } from '../realtime/index';
import type { ServerContext, ServerEvent } from '../services/context';
import type { Summaries } from '../services/summaries';
import { Admission, type Guest } from './admission';
import { Connection } from './connection';
import { Documents } from './documents';
import { presenceMessage } from './messages';
import { noPresence } from './presence';
import type { SharedDocument } from './shared-document';

const largestMessage = 4_000_000;
const mostAtDocument = 200;
const mostOfPerson = 40;
/** A stock client takes a line on which nothing came for 30 s to be dead. */
const heartbeat = 15_000;
/** Every so many beats everybody is asked anew: a session may have run out. */
const beatsBetweenReviews = 8;

export interface Collaboration {
  close(): Promise<void>;
}

export interface CollaborationOptions {
  /** Milliseconds between signs of life. */
  heartbeat?: number;
}

/** Puts the sync endpoint `/sync/<revision id>` on the server's upgrades. */
export function attachCollaboration(
  server: Server,
  session: RequestHandler,
  context: ServerContext,
  summaries: Summaries,
  options: CollaborationOptions = {},
): Collaboration {
  const endpoint = new Endpoint(session, context, summaries);
  const onUpgrade = (request: IncomingMessage, socket: Duplex, head: Buffer) => endpoint.upgrade(request, socket, head);
  server.on('upgrade', onUpgrade);
  const endListening = context.events.listen((event) => endpoint.hear(event));
  const beat = setInterval(() => endpoint.beat(), options.heartbeat ?? heartbeat);
  beat.unref();
  return {
    async close() {
      clearInterval(beat);
      endListening();
      await endpoint.close();
      server.off('upgrade', onUpgrade);
    },
  };
}

/** The path of a request; undefined when there is none that can be read. */
function pathOf({ url = '' }: IncomingMessage): string | undefined {
  const base = 'http://localhost';
  return URL.canParse(url, base) ? new URL(url, base).pathname : undefined;
}

const bytesOf = (data: Buffer | ArrayBuffer | Buffer[]): Uint8Array =>
  Array.isArray(data) ? Buffer.concat(data) : new Uint8Array(data);

class Endpoint {
  private readonly sockets = new WebSocketServer({ noServer: true, maxPayload: largestMessage });
  private readonly admission: Admission;
  private readonly documents: Documents;
  private readonly connections = new Set<Connection>();
  private readonly serving = new Set<Promise<void>>();
  private beats = 0;
  private closing = false;

  constructor(
    session: RequestHandler,
    private readonly context: ServerContext,
    summaries: Summaries,
  ) {
    this.admission = new Admission(session, context);
    this.documents = new Documents(context, (revisionId) => ({
      written: ({ guest }, voided) => {
        summaries.touch(revisionId, guest.account.id);
        const { projectId } = guest;
        if (voided) context.events.publish({ kind: 'notice', notice: { about: 'revision', projectId, revisionId } });
      },
    }));
  }

  /** Takes an upgrade to the sync path, leaves one to the notices alone, and ends any other. */
  upgrade(request: IncomingMessage, socket: Duplex, head: Buffer): void {
    const path = pathOf(request);
    if (path?.startsWith(noticesPath) === true) return;
    // Until the socket is handed over, nobody else listens for its failure.
    const fail = () => socket.destroy();
    socket.on('error', fail);
    if (path?.startsWith(`${syncPath}/`) !== true || this.closing) {
      fail();
      return;
    }
    this.admit(request, path.slice(syncPath.length + 1)).then(
      (guest) => {
        socket.off('error', fail);
        this.sockets.handleUpgrade(request, socket, head, (webSocket) => this.welcome(webSocket, guest));
      },
      (error: unknown) => {
        this.context.log.error({ error }, 'sync upgrade failed');
        fail();
      },
    );
  }

  private async admit(request: IncomingMessage, revisionId: string): Promise<Guest | number> {
    if (!z.uuid().safeParse(revisionId).success) return syncClose.notFound;
    return this.admission.admit(request, revisionId);
  }

  private welcome(socket: WebSocket, guest: Guest | number): void {
    // What is no frame, or too large a one, has ended the line with its code already.
    socket.on('error', () => undefined);
    // A browser can read the reason of a refusal from the close code only, not from an HTTP status.
    if (typeof guest === 'number') {
      socket.close(guest, 'refused');
      return;
    }
    const connection = new Connection(socket, guest);
    if (this.ofPerson(guest.account.id).length >= mostOfPerson) {
      connection.close(syncClose.tooMany, 'too many sheets open');
      return;
    }
    this.connections.add(connection);
    const life = this.serve(connection)
      .catch((error: unknown) => {
        this.context.log.error({ error, revisionId: guest.revisionId }, 'sync connection failed');
        connection.close(1011, 'the document could not be opened');
      })
      .finally(() => {
        this.connections.delete(connection);
        this.serving.delete(life);
      });
    this.serving.add(life);
  }

  private ofPerson(personId: string): Connection[] {
    return [...this.connections].filter(({ account }) => account.id === personId);
  }

  /** From coming in to going. */
  private async serve(connection: Connection): Promise<void> {
    const { socket, guest } = connection;
    let document: SharedDocument | undefined;
    const work = () => {
      if (document !== undefined) for (const data of connection.takeInbox()) document.receive(connection, data);
    };
    const gone = new Promise<void>((resolve) => socket.once('close', () => resolve()));
    socket.on('pong', () => {
      connection.alive = true;
    });
    // What comes while the document is being loaded waits for it, in its order.
    socket.on('message', (data, binary) => {
      const message = bytesOf(data);
      if (!binary) connection.close(1003, 'the message cannot be read');
      else if (!connection.within(message.length)) connection.close(1013, 'too many messages');
      else {
        connection.put(message);
        work();
      }
    });
    const seat = this.documents.sit(guest.revisionId);
    try {
      const opened = await seat.document;
      if (opened.connections.size >= mostAtDocument) connection.close(syncClose.tooMany, 'too many at this sheet');
      if (!connection.open) return;
      opened.join(connection);
      connection.onDecided = work;
      // What changed since the door was told to those inside only.
      await this.review(connection);
      document = opened;
      work();
      await gone;
      opened.leave(connection);
    } finally {
      seat.leave();
    }
  }

  /** Asks anew what a person may do here; until that is known, nothing of theirs is taken. */
  private async review(connection: Connection): Promise<void> {
    await connection.whileDeciding(async () => {
      try {
        const decision = await connection.guest.decide();
        if (typeof decision === 'number') connection.close(decision, 'no access any more');
        else connection.writing = decision.writing;
      } catch (error) {
        this.context.log.error({ error }, 'access was not reviewed');
        connection.close(1013, 'try again');
      }
    });
  }

  /** Takes effect on open connections at once. */
  hear(event: ServerEvent): void {
    for (const connection of this.connections) {
      if (event.kind === 'signed-out') {
        if (connection.guest.sessionId === event.sessionId) connection.close(syncClose.notSignedIn, 'signed out');
      } else if (
        (event.kind === 'revision-state' && event.revisionId === connection.guest.revisionId) ||
        (event.kind === 'access' && event.personId === connection.account.id)
      ) {
        void this.review(connection);
      }
    }
  }

  beat(): void {
    this.beats += 1;
    for (const connection of this.connections) {
      if (!connection.alive) {
        connection.socket.terminate();
        continue;
      }
      connection.alive = false;
      if (connection.open) connection.socket.ping();
      connection.send(presenceMessage(noPresence));
      if (this.beats % beatsBetweenReviews === 0) void this.review(connection);
    }
  }

  /** Writes and answers what was taken, then ends every connection and closes the documents. */
  async close(): Promise<void> {
    this.closing = true;
    await Promise.all(this.documents.all().map((document) => document.settled()));
    for (const socket of this.sockets.clients) socket.terminate();
    await Promise.allSettled(this.serving);
    await this.documents.freed();
    this.sockets.close();
  }
}
