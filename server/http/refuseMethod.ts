import type { RequestHandler } from 'express';
import { AppError } from '../errors.ts';

/** Answers a method that an address does not know with 405, and names those it does (RFC 9110, 15.5.6). */
export function refuseMethod(known: string[]): RequestHandler {
  const allowed = known.map((method) => method.toUpperCase()).join(', ');
  return (_req, res) => {
    res.set('Allow', allowed);
    throw new AppError('invalid_request', `This address knows ${allowed} only.`, { status: 405 });
  };
}
