import type { Request, RequestHandler, Response } from 'express';
import { sessionContracts } from '../../shared/api/session.ts';
import type { Deps } from '../deps.ts';
import { endpoint } from '../http/endpoint.ts';
import { SESSION_COOKIE } from '../http/sessions.ts';
import { checkHealth } from '../services/health.service.ts';
import { readSession } from '../services/session.service.ts';

/** @param authenticate Passport's local strategy; it changes the session's id and signs in */
export const sessionRoutes = (deps: Deps, authenticate: RequestHandler) => [
  endpoint(sessionContracts.signIn, async ({ req, res }) => {
    const before = req.sessionID;
    await signIn(authenticate, req, res);
    // Whoever was signed in here no longer is; their other tabs must not go on under the new name.
    deps.broadcast.endSession(before);
    return readSession(deps, req.user!);
  }),
  endpoint(sessionContracts.read, ({ user }) => readSession(deps, user)),
  endpoint(sessionContracts.signOut, async ({ req, res }) => {
    const { sessionID } = req;
    await new Promise<void>((resolve, reject) => req.session.destroy((error) => (error ? reject(error) : resolve())));
    res.clearCookie(SESSION_COOKIE);
    deps.broadcast.endSession(sessionID);
  }),
  endpoint(sessionContracts.health, () => checkHealth(deps)),
];

function signIn(authenticate: RequestHandler, req: Request, res: Response): Promise<void> {
  return new Promise((resolve, reject) => {
    void authenticate(req, res, (error?: unknown) => (error ? reject(error) : resolve()));
  });
}
