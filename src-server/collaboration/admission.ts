import type { IncomingMessage } from 'node:http';
import type { RequestHandler } from 'express';
import { may, revisionStates, syncClose, type Account } from '#contract';
import { ApiError } from '../errors/index';
import { sameOrigin } from '../middleware/origin';
import { accountOfRequest } from '../realtime/account';
import { authorizeRevision } from '../services/access';
import type { ServerContext } from '../services/context';

/** Whether updates are taken; otherwise the reason that their sender is told. */
export type Writing = 'may' | 'FORBIDDEN' | 'WRONG_STATE';

/** What a person may do at a document; a number is the code with which the line is closed. */
export type Decision = { writing: Writing; projectId: string } | number;

/** Somebody at the door of a document. */
export interface Guest {
  account: Account;
  sessionId: string;
  revisionId: string;
  writing: Writing;
  projectId: string;
  /** Asked anew whenever something changed that it may depend on. */
  decide(): Promise<Decision>;
}

/** Says who may come in to a document and who may write there, by the access table and the state of things now. */
export class Admission {
  constructor(
    private readonly session: RequestHandler,
    private readonly context: ServerContext,
  ) {}

  /** Answers a guest, or the code with which the line is closed. */
  async admit(request: IncomingMessage, revisionId: string): Promise<Guest | number> {
    if (!sameOrigin(request, this.context.config.publicOrigin)) return syncClose.forbidden;
    const signedIn = await accountOfRequest(request, this.session, this.context.db);
    if (signedIn === undefined) return syncClose.notSignedIn;
    const { account, sessionId, holds } = signedIn;
    const first = await this.look(account.id, revisionId);
    if (typeof first === 'number') return first;
    const decide = async (): Promise<Decision> =>
      (await holds()) ? this.look(account.id, revisionId) : syncClose.notSignedIn;
    return { account, sessionId, ...first, revisionId, decide };
  }

  private async look(personId: string, revisionId: string): Promise<Decision> {
    try {
      const { role, revision, project } = await authorizeRevision(
        this.context.db,
        personId,
        revisionId,
        'revision.read',
      );
      return { writing: writingOf(role, revision.state), projectId: project.id };
    } catch (error) {
      // Anything else is no answer but a failure: it is not for ever.
      if (!(error instanceof ApiError)) throw error;
      return error.code === 'NOT_FOUND' ? syncClose.notFound : syncClose.forbidden;
    }
  }
}

function writingOf(role: Parameters<typeof may>[0], state: Parameters<typeof may>[2]): Writing {
  if (may(role, 'content.write', state)) return 'may';
  return revisionStates.some((other) => may(role, 'content.write', other)) ? 'WRONG_STATE' : 'FORBIDDEN';
}
