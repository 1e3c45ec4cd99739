import { onScopeDispose } from 'vue';
import { io, type Socket } from 'socket.io-client';
import { notice as noticeSchema, type Notice, type WatchRequest } from '#contract';

/** How long to wait after a refusal, in ms. */
const afterRefusal = 5000;

let shared: { socket: Socket; users: number } | undefined;

/** One connection for the whole application, closed when nobody uses it. */
function takeSocket(): Socket {
  shared ??= { socket: openSocket(), users: 0 };
  shared.users += 1;
  return shared.socket;
}

function openSocket(): Socket {
  const socket = io({ path: '/socket.io', transports: ['websocket'] });
  // Refused by the server (signed out): the socket does not try again by itself, but somebody may sign in again.
  socket.on('connect_error', () => {
    if (!socket.active) setTimeout(() => shared?.socket === socket && socket.connect(), afterRefusal);
  });
  return socket;
}

function leaveSocket(): void {
  if (shared === undefined) return;
  shared.users -= 1;
  if (shared.users > 0) return;
  shared.socket.close();
  shared = undefined;
}

/**
 * Calls `handle` with every notice about a project or a revision, until the scope ends; and once with
 * `undefined` whenever the line comes back, since notices may have been missed.
 */
export function useNotices(watch: WatchRequest, handle: (notice: Notice | undefined) => void): void {
  const socket = takeSocket();
  let joinedBefore = false;
  const onNotice = (given: unknown) => {
    const parsed = noticeSchema.safeParse(given);
    if (parsed.success && concerns(watch, parsed.data)) handle(parsed.data);
  };
  const onConnect = () => {
    socket.emit('watch', watch, () => undefined);
    if (joinedBefore) handle(undefined);
    joinedBefore = true;
  };
  socket.on('notice', onNotice);
  socket.on('connect', onConnect);
  if (socket.connected) onConnect();
  onScopeDispose(() => {
    socket.off('notice', onNotice);
    socket.off('connect', onConnect);
    leaveSocket();
  });
}

function concerns(watch: WatchRequest, { projectId, revisionId }: Notice): boolean {
  return 'projectId' in watch ? watch.projectId === projectId : watch.revisionId === revisionId;
}
