import type { ErrorRequestHandler, RequestHandler } from 'express';
import type { Logger } from 'pino';
import type { ErrorBody } from '#contract';
import { ApiError, databaseCode } from '../errors/index';

/** Known database troubles in words. */
function translated(error: unknown): unknown {
  const code = databaseCode(error);
  if (code === '53100')
    return new ApiError(
      'STORE_FULL',
      'The server has no room left; nothing was written. Tell an administrator, your text stays in this window.',
    );
  if (code === '23000') return new ApiError('WRONG_STATE', 'The revision was locked meanwhile; nothing was changed.');
  return error;
}

function tooLarge(error: unknown): boolean {
  return typeof error === 'object' && error !== null && Reflect.get(error, 'type') === 'entity.too.large';
}

function badBody(error: unknown): boolean {
  return typeof error === 'object' && error !== null && Reflect.get(error, 'type') === 'entity.parse.failed';
}

/** Turns every error into one shape; what is not known is logged whole and answered with one general sentence. */
export function answerErrors(log: Logger): ErrorRequestHandler {
  return (thrown: unknown, request, response, next) => {
    if (response.headersSent) {
      next(thrown);
      return;
    }
    let error = translated(thrown);
    if (tooLarge(error)) error = new ApiError('TOO_LARGE', 'That is more than is taken at once (1 MB).');
    if (badBody(error)) error = new ApiError('INVALID_INPUT', 'The request is no JSON.');
    if (!(error instanceof ApiError)) {
      log.error({ error: thrown, method: request.method, path: request.path }, 'request failed');
      error = new ApiError('INTERNAL', 'Something went wrong on the server; it is written in its log. Try again.');
    }
    const { code, message, fields, status } = error as ApiError;
    const body: ErrorBody = { error: { code, message, ...(fields === undefined ? {} : { fields }) } };
    response.status(status).json(body);
  };
}

export const answerUnknownRoute: RequestHandler = (_request, _response, next) =>
  next(new ApiError('NOT_FOUND', 'There is no such address.'));
