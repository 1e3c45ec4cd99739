import type { Server } from 'node:http';
import type { RequestHandler } from 'express';
import { Server as SocketServer, type Socket } from 'socket.io';
import { watchRequest, type Account, type Notice } from '#contract';
import { sameOrigin } from '../middleware/origin';
import { authorizeProject, authorizeRevision } from '../services/access';
import type { ServerContext } from '../services/context';
import { accountOfRequest } from './account';

/** Where Socket.IO listens. */
export const noticesPath = '/socket.io';

export interface Realtime {
  close(): Promise<void>;
}

interface SocketData {
  account: Account;
  sessionId: string;
}

const projectRoom = (id: string) => `project:${id}`;
const revisionRoom = (id: string) => `revision:${id}`;

/** Live notices over Socket.IO: who watches a revision or a project is told what to fetch again. */
export function attachRealtime(server: Server, session: RequestHandler, context: ServerContext): Realtime {
  const io = new SocketServer<object, { notice(notice: Notice): void }, object, SocketData>(server, {
    path: noticesPath,
    destroyUpgrade: false,
    serveClient: false,
    maxHttpBufferSize: 10_000,
    allowRequest: (request, decide) => {
      // A polling GET carries no Origin; it only reads. Whatever writes carries one.
      const plainRead =
        request.method === 'GET' && request.headers.upgrade === undefined && request.headers.origin === undefined;
      decide(null, plainRead || sameOrigin(request, context.config.publicOrigin));
    },
  });

  io.use((socket, next) => {
    accountOfRequest(socket.request, session, context.db).then((signedIn) => {
      if (signedIn === undefined) next(new Error('NOT_SIGNED_IN'));
      else {
        socket.data = signedIn;
        next();
      }
    }, next);
  });

  async function watch(socket: Socket<object, object, object, SocketData>, given: unknown): Promise<boolean> {
    const request = watchRequest.safeParse(given);
    if (!request.success) return false;
    try {
      if ('projectId' in request.data) {
        await authorizeProject(context.db, socket.data.account, request.data.projectId, 'project.read');
        await socket.join(projectRoom(request.data.projectId));
      } else {
        await authorizeRevision(context.db, socket.data.account.id, request.data.revisionId, 'revision.read');
        await socket.join(revisionRoom(request.data.revisionId));
      }
      return true;
    } catch {
      return false;
    }
  }

  io.on('connection', (socket) => {
    const untyped = socket as unknown as Socket<object, object, object, SocketData> & {
      on(event: 'watch', listener: (given: unknown, answer: unknown) => void): void;
    };
    untyped.on('watch', (given, answer) => {
      void watch(untyped, given).then((allowed) => {
        if (typeof answer === 'function') (answer as (allowed: boolean) => void)(allowed);
      });
    });
  });

  const endListening = context.events.listen((event) => {
    if (event.kind === 'notice') {
      const { projectId, revisionId } = event.notice;
      const rooms = [projectRoom(projectId), ...(revisionId === null ? [] : [revisionRoom(revisionId)])];
      io.to(rooms).emit('notice', event.notice);
    }
    for (const socket of io.sockets.sockets.values()) {
      const ended =
        (event.kind === 'signed-out' && socket.data.sessionId === event.sessionId) ||
        (event.kind === 'access' && socket.data.account.id === event.personId);
      // Comes back by itself, and is asked anew what it may watch.
      if (ended) socket.conn.close();
    }
  });

  return {
    async close() {
      endListening();
      io.disconnectSockets(true);
      await io.close();
    },
  };
}
