import type { IncomingMessage } from 'node:http';
import type { RequestHandler } from 'express';
import { AppError } from '../errors.ts';

const SAFE = new Set(['GET', 'HEAD', 'OPTIONS']);

/**
 * Whether a request says it came from our own pages. Browsers set `Origin` and `Sec-Fetch-Site` themselves and no page
 * can forge them, so this stands in for tokens. Behind a proxy `Host` is not what people typed: set PUBLIC_ORIGIN then.
 * @returns `undefined` when the request says nothing about where it came from
 */
export function isOwnOrigin(req: IncomingMessage, publicOrigin: string | undefined): boolean | undefined {
  const { origin, host } = req.headers;
  const site = req.headers['sec-fetch-site'];
  if (origin !== undefined) {
    if (publicOrigin !== undefined) return origin === publicOrigin;
    return origin === `http://${host}` || origin === `https://${host}`;
  }
  return site === undefined ? undefined : site === 'same-origin';
}

/** Refuses to change anything for a page of another site. */
export function originCheck(publicOrigin: string | undefined): RequestHandler {
  return (req, _res, next) => {
    if (SAFE.has(req.method) || isOwnOrigin(req, publicOrigin)) return next();
    next(new AppError('foreign_origin', 'This request did not come from a page of Spandrel; reload the page.'));
  };
}
