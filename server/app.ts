import path from 'node:path';
import express, { type Express, Router } from 'express';
import type { PassportStatic } from 'passport';
import type { Deps } from './deps.ts';
import { AppError } from './errors.ts';
import { client } from './http/client.ts';
import type { Endpoint } from './http/endpoint.ts';
import { errorSink } from './http/errorSink.ts';
import { describeApi } from './http/openapi.ts';
import { originCheck } from './http/originCheck.ts';
import { signInLimits } from './http/rateLimits.ts';
import { refuseMethod } from './http/refuseMethod.ts';
import { requestLog } from './http/requestLog.ts';
import { requireUser } from './http/requireUser.ts';
import { securityHeaders } from './http/securityHeaders.ts';
import type { Sessions } from './http/sessions.ts';
import { draftRoutes } from './routes/drafts.routes.ts';
import { productionRoutes } from './routes/productions.routes.ts';
import { sessionRoutes } from './routes/session.routes.ts';
import { takeRoutes } from './routes/takes.routes.ts';
import { threadRoutes } from './routes/threads.routes.ts';
import { groupBy } from './services/groupBy.ts';

export interface AppOptions {
  sessions: Sessions;
  passport: PassportStatic;
  /** What people type to reach us, where a proxy stands before us. */
  publicOrigin?: string | undefined;
  /** Folder of the built client. */
  distDir?: string;
}

const DIST = path.resolve(import.meta.dirname, '../dist');

/** Everything the server answers over HTTP, without listening. */
export function createApp(deps: Deps, { sessions, passport, publicOrigin, distDir = DIST }: AppOptions): Express {
  const app = express();
  // A public origin means a proxy, and it runs on this machine; its word about who asks is then taken.
  app.set('trust proxy', publicOrigin ? 'loopback' : false);
  app.disable('x-powered-by');
  app.use(requestLog(deps.log), securityHeaders(publicOrigin));
  app.use('/api', api(deps, { sessions, passport, publicOrigin }));
  app.use(client(distDir));
  app.use(errorSink(deps.log));
  return app;
}

/** Every endpoint there is: what the app serves and what the description lists. */
export function allEndpoints(deps: Deps, passport: PassportStatic): Endpoint[] {
  return [
    ...sessionRoutes(deps, passport.authenticate('local')),
    ...productionRoutes(deps),
    ...takeRoutes(deps),
    ...draftRoutes(deps),
    ...threadRoutes(deps),
  ];
}

function api(deps: Deps, { sessions, passport, publicOrigin }: AppOptions): Router {
  const router = Router();
  const endpoints = allEndpoints(deps, passport);
  let description: ReturnType<typeof describeApi> | undefined;
  router.use(originCheck(publicOrigin), express.json({ limit: '100kb' }));
  router.use(sessions.middleware, passport.session());
  router.post('/session', ...signInLimits());
  for (const { contract, handler } of endpoints) router[contract.method](contract.path, handler);
  for (const [path, there] of groupBy(endpoints, ({ contract }) => contract.path)) {
    router.all(path, refuseMethod(there.map(({ contract }) => contract.method)));
  }
  router.get('/openapi.json', (req, res) => {
    requireUser(req);
    description ??= describeApi(endpoints.map(({ contract }) => contract));
    res.set('Cache-Control', 'no-store').json(description);
  });
  router.use(() => {
    throw new AppError('not_found', 'There is nothing at this address.');
  });
  return router;
}
