import type { IncomingMessage } from 'node:http';
import type { RequestHandler } from 'express';
import { ApiError } from '../errors/index';

/** Whether a request comes from a page of this very server, by its Origin header. */
export function sameOrigin(request: IncomingMessage, publicOrigin: string): boolean {
  const { origin, host } = request.headers;
  if (origin === undefined) return false;
  if (origin === publicOrigin) return true;
  return URL.canParse(origin) && new URL(origin).host === host;
}

/** Refuses every request that may change something and does not come from the product's own pages. */
export function requireSameOrigin(publicOrigin: string): RequestHandler {
  return (request, _response, next) => {
    const reads = request.method === 'GET' || request.method === 'HEAD';
    if (reads || sameOrigin(request, publicOrigin)) next();
    else next(new ApiError('WRONG_ORIGIN', 'Changes are taken from the pages of this product only.'));
  };
}
