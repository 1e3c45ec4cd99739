import { randomBytes } from 'node:crypto';
import type { ErrorRequestHandler, Request, RequestHandler } from 'express';
import type { Logger } from 'pino';
import type { ErrorBody, ErrorCode } from '#contract';
import { ApiError, databaseCode } from '../errors/index';

const unkeepable: readonly [ErrorCode, string] = [
  'INVALID_INPUT',
  'There is a character in it that cannot be kept (a zero byte, or half of a pair).',
];

/** Known troubles of the database in words, by PostgreSQL's code. */
const databaseTroubles: Readonly<Record<string, readonly [ErrorCode, string]>> = {
  '53100': [
    'STORE_FULL',
    'The server has no room left; nothing was written. Tell an administrator, your text stays in this window.',
  ],
  '22021': unkeepable,
  '22P02': unkeepable,
  '22P05': unkeepable,
  '23000': ['WRONG_STATE', 'The revision was locked or changed its state meanwhile; nothing was changed.'],
};

/** Refusals of Express and its parts, by the HTTP status that they carry. */
const requestTroubles: Readonly<Record<number, readonly [ErrorCode, string]>> = {
  // A way out of the folder of the application: not said more clearly than a file that is not there.
  403: ['NOT_FOUND', 'There is no such address.'],
  404: ['NOT_FOUND', 'There is no such address.'],
  413: ['TOO_LARGE', 'That is more than is taken at once (1 MB).'],
  415: ['INVALID_INPUT', 'The request is no JSON in UTF-8.'],
};

function statusOf(error: unknown): number | undefined {
  const status: unknown = typeof error === 'object' && error !== null ? Reflect.get(error, 'status') : undefined;
  return typeof status === 'number' ? status : undefined;
}

/** The error as one of ours; undefined when it is none that is known. */
function known(error: unknown): ApiError | undefined {
  if (error instanceof ApiError) return error;
  const trouble = databaseTroubles[databaseCode(error) ?? ''];
  if (trouble !== undefined) return new ApiError(...trouble);
  const status = statusOf(error);
  if (status === undefined || status < 400 || status > 499) return undefined;
  return new ApiError(...(requestTroubles[status] ?? ['INVALID_INPUT', 'The request cannot be read.']));
}

/** Refusals that whoever keeps the server wants to see. */
const suspicious: readonly ErrorCode[] = [
  'FORBIDDEN',
  'WRONG_ORIGIN',
  'WRONG_PASSWORD',
  'TOO_MANY_TRIES',
  'NOT_INDEPENDENT',
];

const whereOf = (request: Request) => ({
  method: request.method,
  path: request.path,
  personId: request.user?.id,
  address: request.ip,
});

/** Turns every error into one shape; what is not known is logged whole and answered with one general sentence. */
export function answerErrors(log: Logger): ErrorRequestHandler {
  return (thrown: unknown, request, response, next) => {
    if (response.headersSent) {
      next(thrown);
      return;
    }
    let error = known(thrown);
    if (error === undefined) {
      const reference = randomBytes(4).toString('hex');
      log.error({ error: thrown, reference, ...whereOf(request) }, 'request failed');
      error = new ApiError(
        'INTERNAL',
        `Something went wrong on the server; it is written in its log under ${reference}. Try again.`,
      );
    } else if (suspicious.includes(error.code)) log.warn({ code: error.code, ...whereOf(request) }, 'request refused');
    const { code, message, fields, status } = error;
    const body: ErrorBody = { error: { code, message, ...(fields === undefined ? {} : { fields }) } };
    response.status(status).json(body);
  };
}

export const answerUnknownRoute: RequestHandler = (_request, _response, next) =>
  next(new ApiError('NOT_FOUND', 'There is no such address.'));
