import type { IncomingMessage, Server } from 'node:http';
import type { Duplex } from 'node:stream';
import type { RequestHandler } from 'express';
import { WebSocketServer, type WebSocket } from 'ws';
import { z } from 'zod';
import { may, syncClose, syncPath, type Account } from '#contract';
import { sameOrigin } from '../middleware/origin';
import { ApiError } from '../errors/index';
import { authorizeRevision } from '../services/access';
import type { ServerContext } from '../services/context';
import type { Summaries } from '../services/summaries';
import { accountOfRequest } from '../realtime/account';
import { Connection } from './connection';
import { SharedDocument } from './shared-document';

const largestMessage = 4_000_000;
const mostConnectionsOfDocument = 200;
const heartbeat = 30_000;

export interface Collaboration {
  close(): Promise<void>;
}

interface Guest {
  account: Account;
  sessionId: string;
  revisionId: string;
  canWrite: boolean;
}

/** Open documents of this process, each loaded once. */
class Documents {
  private readonly open = new Map<string, Promise<SharedDocument>>();

  constructor(
    private readonly context: ServerContext,
    private readonly summaries: Summaries,
  ) {}

  get(revisionId: string): Promise<SharedDocument> {
    let document = this.open.get(revisionId);
    if (document === undefined) {
      document = SharedDocument.open(revisionId, this.context, {
        written: (personId, voided) => {
          this.summaries.touch(revisionId, personId);
          if (voided) void this.tellVoided(revisionId, personId);
        },
      });
      this.open.set(revisionId, document);
      document.catch(() => this.open.delete(revisionId));
    }
    return document;
  }

  private async tellVoided(revisionId: string, personId: string): Promise<void> {
    const { project } = await authorizeRevision(this.context.db, personId, revisionId, 'revision.read');
    this.context.events.publish({ kind: 'notice', notice: { about: 'revision', projectId: project.id, revisionId } });
  }

  /** Frees a document when its last browser has gone. */
  async release(document: SharedDocument): Promise<void> {
    if (document.connections.size > 0) return;
    this.open.delete(document.revisionId);
    await document.close();
  }

  async all(): Promise<SharedDocument[]> {
    return Promise.all(this.open.values());
  }
}

function revisionIdOf(request: IncomingMessage): string | undefined {
  const path = new URL(request.url ?? '', 'http://localhost').pathname;
  if (!path.startsWith(`${syncPath}/`)) return undefined;
  const id = path.slice(syncPath.length + 1);
  return z.uuid().safeParse(id).success ? id : '';
}

/** Puts the sync endpoint `/sync/<revision id>` on the server's upgrades. */
export function attachCollaboration(
  server: Server,
  session: RequestHandler,
  context: ServerContext,
  summaries: Summaries,
): Collaboration {
  const sockets = new WebSocketServer({ noServer: true, maxPayload: largestMessage });
  const documents = new Documents(context, summaries);

  async function admit(request: IncomingMessage, revisionId: string): Promise<Guest | number> {
    if (!sameOrigin(request, context.config.publicOrigin)) return syncClose.forbidden;
    const signedIn = await accountOfRequest(request, session, context.db);
    if (signedIn === undefined) return syncClose.notSignedIn;
    try {
      const { role, revision } = await authorizeRevision(context.db, signedIn.account.id, revisionId, 'revision.read');
      return { ...signedIn, revisionId, canWrite: may(role, 'content.write', revision.state) };
    } catch (error) {
      if (error instanceof ApiError) return error.code === 'NOT_FOUND' ? syncClose.notFound : syncClose.forbidden;
      throw error;
    }
  }

  async function serve(socket: WebSocket, guest: Guest): Promise<void> {
    const connection = new Connection(socket, guest.account, guest.sessionId, guest.canWrite);
    const opening = documents.get(guest.revisionId);
    // Messages that come while the document is being loaded wait for it, in their order.
    const early: Uint8Array[] = [];
    const seat: { document?: SharedDocument } = {};
    socket.on('message', (data: Buffer) => {
      if (!connection.withinRate()) connection.close(syncClose.tooMany, 'too many messages');
      else if (seat.document === undefined) early.push(data);
      else seat.document.receive(connection, data);
    });
    socket.on('pong', () => {
      connection.alive = true;
    });
    socket.on('error', () => socket.terminate());
    socket.on('close', () => {
      if (seat.document === undefined) return;
      seat.document.leave(connection);
      documents.release(seat.document).catch((error: unknown) => context.log.error({ error }, 'document was not folded'));
    });
    const document = await opening;
    seat.document = document;
    if (document.connections.size >= mostConnectionsOfDocument) {
      connection.close(syncClose.tooMany, 'too many at this sheet');
      return;
    }
    document.join(connection);
    for (const data of early) document.receive(connection, data);
    if (socket.readyState !== socket.OPEN) {
      document.leave(connection);
      await documents.release(document);
    }
  }

  const onUpgrade = (request: IncomingMessage, socket: Duplex, head: Buffer) => {
    const revisionId = revisionIdOf(request);
    if (revisionId === undefined) return;
    admit(request, revisionId).then(
      (guest) => {
        sockets.handleUpgrade(request, socket, head, (webSocket) => {
          // A browser can read the reason of a refusal from the close code only, not from an HTTP status.
          if (typeof guest === 'number') webSocket.close(guest, 'refused');
          else
            serve(webSocket, guest).catch((error: unknown) => {
              context.log.error({ error }, 'sync connection failed');
              webSocket.close(1011, 'the document could not be opened');
            });
        });
      },
      (error: unknown) => {
        context.log.error({ error }, 'sync upgrade failed');
        socket.destroy();
      },
    );
  };
  server.on('upgrade', onUpgrade);

  async function decide(revisionId: string, connection: Connection): Promise<boolean | undefined> {
    try {
      const { role, revision } = await authorizeRevision(
        context.db,
        connection.account.id,
        revisionId,
        'revision.read',
      );
      return may(role, 'content.write', revision.state);
    } catch {
      return undefined;
    }
  }

  const endListening = context.events.listen((event) => {
    documents
      .all()
      .then(async (open) => {
        for (const document of open) {
          if (event.kind === 'signed-out') {
            for (const connection of document.connections)
              if (connection.sessionId === event.sessionId) connection.close(syncClose.notSignedIn, 'signed out');
          } else if (
            (event.kind === 'revision-state' && event.revisionId === document.revisionId) ||
            event.kind === 'access'
          ) {
            await document.review((connection) => decide(document.revisionId, connection));
          }
        }
      })
      .catch((error: unknown) => context.log.error({ error }, 'access was not reviewed'));
  });

  const beat = setInterval(() => {
    void documents.all().then((open) => {
      for (const connection of open.flatMap((document) => [...document.connections])) {
        if (!connection.alive) connection.socket.terminate();
        connection.alive = false;
        connection.socket.ping();
      }
    });
  }, heartbeat);
  beat.unref();

  return {
    async close() {
      clearInterval(beat);
      endListening();
      server.off('upgrade', onUpgrade);
      for (const document of await documents.all()) await document.settled();
      for (const socket of sockets.clients) socket.terminate();
      sockets.close();
    },
  };
}
