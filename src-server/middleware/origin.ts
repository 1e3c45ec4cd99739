import type { IncomingMessage } from 'node:http';
import type { RequestHandler } from 'express';
import { ApiError } from '../errors/index';

/** Whether an address is one of this very server's: the public origin, or the host that was asked. */
function ofThisServer(address: string, host: string | undefined, publicOrigin: string): boolean {
  if (!URL.canParse(address)) return false;
  const url = new URL(address);
  return url.origin === publicOrigin || url.host === host;
}

/** Whether a request comes from a page of this very server, by its Origin header. */
export function sameOrigin(request: IncomingMessage, publicOrigin: string): boolean {
  const { origin, host } = request.headers;
  return origin !== undefined && ofThisServer(origin, host, publicOrigin);
}

/**
 * For browsers that leave Origin out: what they say of the site that asked, else the page that asked.
 * No page can set either header itself. A request that says nothing at all is not taken.
 */
function sameSiteWithoutOrigin(request: IncomingMessage, publicOrigin: string): boolean {
  const { origin, host, referer } = request.headers;
  if (origin !== undefined) return false;
  const site = request.headers['sec-fetch-site'];
  if (site !== undefined) return site === 'same-origin';
  return referer !== undefined && ofThisServer(referer, host, publicOrigin);
}

/** Refuses every request that may change something and does not come from the product's own pages. */
export function requireSameOrigin(publicOrigin: string): RequestHandler {
  return (request, _response, next) => {
    const reads = request.method === 'GET' || request.method === 'HEAD';
    if (reads || sameOrigin(request, publicOrigin) || sameSiteWithoutOrigin(request, publicOrigin)) next();
    else next(new ApiError('WRONG_ORIGIN', 'Changes are taken from the pages of this product only.'));
  };
}
