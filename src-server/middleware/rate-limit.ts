import type { RequestHandler } from 'express';
import { ipKeyGenerator, rateLimit } from 'express-rate-limit';
import { ApiError } from '../errors/index';

const quarterOfAnHour = 15 * 60 * 1000;

/** Counts failed tries only, for each name from each address. */
export function limitTries(
  tries: number,
  nameOf: (body: unknown, userId: string | undefined) => string,
): RequestHandler {
  return rateLimit({
    windowMs: quarterOfAnHour,
    limit: tries,
    standardHeaders: 'draft-8',
    legacyHeaders: false,
    skipSuccessfulRequests: true,
    requestWasSuccessful: (_request, response) => response.statusCode !== 401,
    keyGenerator: (request) => `${nameOf(request.body, request.user?.id)}|${ipKeyGenerator(request.ip ?? '')}`,
    handler: (_request, _response, next) =>
      next(new ApiError('TOO_MANY_TRIES', 'Too many wrong tries. Wait a quarter of an hour, then try again.')),
  });
}
