import type { Request, RequestHandler, Response } from 'express';
import type { PassportStatic } from 'passport';
import { Server } from 'socket.io';
import { sessionRoom } from '../../shared/events.ts';
import type { Deps } from '../deps.ts';
import { isOwnOrigin } from '../http/originCheck.ts';
import type { Sessions } from '../http/sessions.ts';
import { presentPerson } from '../presenters/people.presenter.ts';
import type { LiveServer } from './broadcast.ts';
import { registerProductionHandlers } from './productionHandlers.ts';
import { recheckSockets } from './recheckSockets.ts';

const RECHECK_EVERY = 60_000;
const LARGEST_MESSAGE = 16 * 1024;

/** The socket server, not yet attached: services need its broadcast before there is an app. */
export function createLiveServer(publicOrigin: string | undefined): LiveServer {
  return new Server({
    serveClient: false,
    maxHttpBufferSize: LARGEST_MESSAGE,
    // A page of another site would bring the cookies along. Our own pages may leave the origin out when polling.
    allowRequest: (req, decide) => decide(null, isOwnOrigin(req, publicOrigin) ?? true),
  });
}

interface OpenOptions {
  deps: Deps;
  sessions: Sessions;
  passport: PassportStatic;
}

/** Lets those in who have a session, and registers what they may say. Answers with what stops the rechecks. */
export function openLiveServer(io: LiveServer, { deps, sessions, passport }: OpenOptions): () => void {
  for (const middleware of [sessions.middleware, passport.session() as RequestHandler]) {
    io.engine.use(onlyForHandshake(middleware));
  }
  io.use((socket, next) => {
    const request = socket.request as Request;
    if (!request.user) return next(new Error('sign_in_required'));
    socket.data.person = presentPerson(request.user);
    socket.data.sessionId = request.sessionID;
    socket.data.open = new Map();
    next();
  });
  io.on('connection', (socket) => {
    void socket.join(sessionRoom(socket.data.sessionId));
    registerProductionHandlers(io, socket, deps, sessions);
  });
  const timer = setInterval(() => {
    recheckSockets(io, deps, sessions).catch((error: unknown) => deps.log.error({ err: error }, 'recheck failed'));
  }, RECHECK_EVERY).unref();
  return () => clearInterval(timer);
}

/** A long-polling client comes back with the id of its connection; who it is was settled at the first request. */
function onlyForHandshake(middleware: RequestHandler) {
  return (req: Request & { _query?: { sid?: string } }, res: Response, next: (error?: unknown) => void) => {
    if (req._query?.sid === undefined) void middleware(req, res, next);
    else next();
  };
}
