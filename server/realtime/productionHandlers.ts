import type { Socket } from 'socket.io';
import { z } from 'zod';
import { slugSchema } from '../../shared/api/names.ts';
import type { Person } from '../../shared/api/people.ts';
import {
  type ClientToServerEvents,
  type JoinAnswer,
  joinSchema,
  productionRoom,
  PROTOCOL_VERSION,
  type ServerToClientEvents,
} from '../../shared/events.ts';
import type { Deps } from '../deps.ts';
import { AppError, asAppError, problemOf } from '../errors.ts';
import type { Sessions } from '../http/sessions.ts';
import { readProduction } from '../services/productions.service.ts';
import type { LiveServer } from './broadcast.ts';
import type { SocketData } from './SocketData.ts';

export type LiveSocket = Socket<ClientToServerEvents, ServerToClientEvents, Record<string, never>, SocketData>;

/** What a client may say about productions: that it opened one, and that it left. Types are no check, so parse. */
export function registerProductionHandlers(io: LiveServer, socket: LiveSocket, deps: Deps, sessions: Sessions): void {
  socket.on('production:join', async (given: unknown, answer: unknown) => {
    const reply = typeof answer === 'function' ? (answer as (answer: JoinAnswer) => void) : () => {};
    try {
      reply(await join(io, socket, deps, sessions, given));
    } catch (thrown) {
      const error = asAppError(thrown);
      if (error.status >= 500) deps.log.error({ err: error.cause }, 'a socket could not join');
      reply({ ok: false, problem: problemOf(error) });
    }
  });

  socket.on('production:leave', async (given: unknown) => {
    const leave = z.object({ slug: slugSchema }).safeParse(given);
    if (!leave.success) return;
    for (const [productionId, slug] of socket.data.open) {
      if (slug === leave.data.slug) await leaveProduction(io, socket, productionId);
    }
  });

  socket.on('disconnect', () => {
    for (const [productionId, slug] of socket.data.open) void tellWhoIsHere(io, productionId, slug);
  });
}

async function join(
  io: LiveServer,
  socket: LiveSocket,
  deps: Deps,
  sessions: Sessions,
  given: unknown,
): Promise<JoinAnswer> {
  const parsed = joinSchema.safeParse(given);
  if (!parsed.success) throw new AppError('invalid_request', 'This is not how a production is opened.');
  const { slug, protocol } = parsed.data;
  if (protocol !== PROTOCOL_VERSION) throw new AppError('conflict', 'Spandrel is newer than this page; reload it.');
  if (!(await sessions.isAlive(socket.data.sessionId))) {
    deps.broadcast.endSession(socket.data.sessionId);
    throw new AppError('sign_in_required', 'Sign in first.');
  }
  const { id } = await readProduction(deps, socket.data.person.id, slug);
  await socket.join(productionRoom(id));
  socket.data.open.set(id, slug);
  // Read once more inside the room: an event between the first look and the join would be missed otherwise.
  const { eventSeq } = await readProduction(deps, socket.data.person.id, slug);
  const here = await tellWhoIsHere(io, id, slug);
  return { ok: true, newest: eventSeq, here };
}

/** Takes a socket out of a production and tells those who stay. */
export async function leaveProduction(
  io: LiveServer,
  socket: { leave: (room: string) => void | Promise<void>; data: SocketData },
  productionId: string,
): Promise<void> {
  const slug = socket.data.open.get(productionId);
  if (slug === undefined) return;
  socket.data.open.delete(productionId);
  await socket.leave(productionRoom(productionId));
  await tellWhoIsHere(io, productionId, slug);
}

/** Everyone with the production open, each once however many tabs they have. */
async function tellWhoIsHere(io: LiveServer, productionId: string, slug: string): Promise<Person[]> {
  const sockets = await io.in(productionRoom(productionId)).fetchSockets();
  const people = [...new Map(sockets.map(({ data }) => [data.person.id, data.person])).values()];
  people.sort((a, b) => a.name.localeCompare(b.name));
  io.to(productionRoom(productionId)).emit('production:here', { slug, people });
  return people;
}
