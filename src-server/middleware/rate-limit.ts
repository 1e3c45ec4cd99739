import type { Request, RequestHandler } from 'express';
import { ipKeyGenerator, rateLimit } from 'express-rate-limit';
import { ApiError } from '../errors/index';

const quarterOfAnHour = 15 * 60 * 1000;

/** Counts failed tries (answers 401) in a quarter of an hour by what `keyOf` says of a request; refuses when there were `tries`. */
function limitFailures(tries: number, keyOf: (request: Request) => string): RequestHandler {
  return rateLimit({
    windowMs: quarterOfAnHour,
    limit: tries,
    standardHeaders: 'draft-8',
    legacyHeaders: false,
    skipSuccessfulRequests: true,
    requestWasSuccessful: (_request, response) => response.statusCode !== 401,
    keyGenerator: keyOf,
    handler: (_request, _response, next) =>
      next(new ApiError('TOO_MANY_TRIES', 'Too many wrong tries. Wait a quarter of an hour, then try again.')),
  });
}

const address = (request: Request): string => ipKeyGenerator(request.ip ?? '');

/**
 * For the sign-in: a name from one address, many names from one address, and a name from many
 * addresses. The last is wide enough that nobody is kept out by somebody who guesses.
 */
export function limitSignIn(nameOf: (body: unknown) => string): RequestHandler[] {
  return [
    limitFailures(100, address),
    limitFailures(100, (request) => nameOf(request.body)),
    limitFailures(10, (request) => `${nameOf(request.body)}|${address(request)}`),
  ];
}

/** For signatures: a person, from wherever; requests of people not signed in are not counted here. */
export function limitSigning(): RequestHandler {
  const limit = limitFailures(10, (request) => request.user?.id ?? '');
  return (request, response, next) => {
    if (request.user === undefined) next();
    else void limit(request, response, next);
  };
}
