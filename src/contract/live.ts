import { z } from 'zod';

/**
 * Live notices over Socket.IO (path `/socket.io`). The client says what it looks at with
 * `watch`, the server answers through the acknowledgement whether it may, and sends `notice`
 * when something changed that the client should fetch again.
 */
export const watchRequest = z.union([z.object({ revisionId: z.uuid() }), z.object({ projectId: z.uuid() })]);
export type WatchRequest = z.infer<typeof watchRequest>;

export const notice = z.object({
  about: z.enum(['remarks', 'ticks', 'revision', 'register', 'trail', 'access']),
  projectId: z.uuid(),
  revisionId: z.uuid().nullable(),
});
export type Notice = z.infer<typeof notice>;

/** Path of the shared document of a revision, below the server's origin. */
export const syncPath = '/sync';

/** Message numbers on the sync connection beyond those of y-websocket (0 sync, 1 awareness, 2 auth, 3 query awareness). */
export const syncMessage = {
  /**
   * Server → client: what this connection sent is in the database. Body: varUint number of updates of this connection
   * that are kept, varUint 1 once the answer to the first exchange (what was written offline) is kept too, float64
   * server time in ms.
   */
  kept: 4,
  /** Server → client: an update was not taken; body: varString reason code. The client drops what it has not sent for good. */
  refused: 5,
} as const;

/** Codes with which the server closes a sync connection. */
export const syncClose = {
  notSignedIn: 4401,
  forbidden: 4403,
  notFound: 4404,
  locked: 4409,
  tooLarge: 4413,
  tooMany: 4429,
} as const;
