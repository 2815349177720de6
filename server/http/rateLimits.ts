import type { RequestHandler } from 'express';
import { ipKeyGenerator, rateLimit } from 'express-rate-limit';
import { AppError } from '../errors.ts';

const QUARTER_OF_AN_HOUR = 15 * 60 * 1000;

/** Failed sign-ins in a quarter of an hour: from one machine for one address, and from one machine in all. */
export const SIGN_IN_FAILURES = { perAddress: 10, perMachine: 50 };

/**
 * Slows guessing down. Counted by machine and address together, so that nobody can lock someone else out by typing
 * their address; and by machine, so that one machine cannot try every address.
 */
export function signInLimits(): RequestHandler[] {
  const shared = {
    windowMs: QUARTER_OF_AN_HOUR,
    skipSuccessfulRequests: true,
    standardHeaders: 'draft-8',
    legacyHeaders: false,
    handler: ((_req, res, next) => {
      const seconds = Number(res.getHeader('Retry-After') ?? QUARTER_OF_AN_HOUR / 1000);
      const minutes = Math.max(1, Math.ceil(seconds / 60));
      const wait = minutes === 1 ? 'a minute' : `${minutes} minutes`;
      next(new AppError('too_many_attempts', `Too many wrong passwords; wait ${wait} and try again.`));
    }) satisfies RequestHandler,
  } as const;
  return [
    rateLimit({ ...shared, limit: SIGN_IN_FAILURES.perMachine, keyGenerator: (req) => ipKeyGenerator(req.ip ?? '') }),
    rateLimit({
      ...shared,
      limit: SIGN_IN_FAILURES.perAddress,
      keyGenerator: (req) => `${ipKeyGenerator(req.ip ?? '')} ${addressOf(req.body)}`,
    }),
  ];
}

function addressOf(body: unknown): string {
  const email = typeof body === 'object' && body !== null && 'email' in body ? body.email : '';
  return typeof email === 'string' ? email.trim().toLowerCase().slice(0, 254) : '';
}
