import type { Server } from 'node:http';
import type { RequestHandler } from 'express';
import { Server as SocketServer, type Socket } from 'socket.io';
import { watchRequest, type Notice, type WatchRequest } from '#contract';
import { sameOrigin } from '../middleware/origin';
import { authorizeProject, authorizeRevision } from '../services/access';
import type { ServerContext, ServerEvent } from '../services/context';
import { accountOfRequest, type SignedIn } from './account';

/** Where Socket.IO listens. */
export const noticesPath = '/socket.io';

/** A browser looks at one or two things; when it asks for more, the oldest are let go. */
const mostWatched = 20;
/** How often it is asked whether the sessions behind open connections still stand, in ms. */
const betweenReviews = 120_000;

export interface Realtime {
  close(): Promise<void>;
}

interface FromBrowser {
  watch(request: unknown, answer: unknown): void;
}
interface ToBrowser {
  notice(notice: Notice): void;
}
interface SocketData {
  signedIn: SignedIn;
  /** Rooms in the order in which they were asked for. */
  watched: string[];
}
type Watcher = Socket<FromBrowser, ToBrowser, object, SocketData>;

const projectRoom = (id: string) => `project:${id}`;
const revisionRoom = (id: string) => `revision:${id}`;

/** Live notices over Socket.IO: who watches a revision or a project is told what to fetch again. */
export function attachRealtime(server: Server, session: RequestHandler, context: ServerContext): Realtime {
  const io = new SocketServer<FromBrowser, ToBrowser, object, SocketData>(server, {
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
        socket.data = { signedIn, watched: [] };
        next();
      }
    }, next);
  });
  io.on('connection', (socket) => {
    socket.on('watch', (given, answer) => {
      void watch(context, socket, given).then((allowed) => {
        if (typeof answer === 'function') (answer as (allowed: boolean) => void)(allowed);
      });
    });
  });

  const endListening = context.events.listen((event) => {
    if (event.kind === 'notice') io.to(roomsOf(event.notice)).emit('notice', event.notice);
    // Comes back by itself, and is asked anew what it may watch.
    else for (const socket of io.sockets.sockets.values()) if (ends(event, socket.data.signedIn)) socket.conn.close();
  });
  const reviews = setInterval(() => {
    for (const socket of io.sockets.sockets.values()) void closeWithoutSession(socket);
  }, betweenReviews);
  reviews.unref();

  return {
    async close() {
      clearInterval(reviews);
      endListening();
      io.disconnectSockets(true);
      await io.close();
    },
  };
}

/** Lets a browser hear of a project or a revision, when its person may read it; answers whether. */
async function watch({ db }: ServerContext, socket: Watcher, given: unknown): Promise<boolean> {
  const request = watchRequest.safeParse(given);
  if (!request.success) return false;
  const { signedIn, watched } = socket.data;
  try {
    const room = await authorizedRoom(db, signedIn, request.data);
    if (watched.includes(room)) return true;
    watched.push(room);
    await socket.join(room);
    const oldest = watched.length > mostWatched ? watched.shift() : undefined;
    if (oldest !== undefined) await socket.leave(oldest);
    return true;
  } catch {
    return false;
  }
}

/** The room of what is asked for; throws when the person may not read it. */
async function authorizedRoom(db: ServerContext['db'], { account }: SignedIn, request: WatchRequest): Promise<string> {
  if ('projectId' in request) {
    await authorizeProject(db, account, request.projectId, 'project.read');
    return projectRoom(request.projectId);
  }
  await authorizeRevision(db, account.id, request.revisionId, 'revision.read');
  return revisionRoom(request.revisionId);
}

const roomsOf = ({ projectId, revisionId }: Notice): string[] =>
  revisionId === null ? [projectRoom(projectId)] : [projectRoom(projectId), revisionRoom(revisionId)];

function ends(event: ServerEvent, { account, sessionId }: SignedIn): boolean {
  if (event.kind === 'signed-out') return event.sessionId === sessionId;
  return event.kind === 'access' && event.personId === account.id;
}

async function closeWithoutSession(socket: Watcher): Promise<void> {
  try {
    if (!(await socket.data.signedIn.holds())) socket.conn.close();
  } catch {
    // Not known now; asked again at the next turn.
  }
}
