import type { Server } from 'socket.io';
import type { ProductionEvent } from '../../shared/api/events.ts';
import type { ReadingProgress } from '../../shared/api/takes.ts';
import {
  type ClientToServerEvents,
  productionRoom,
  type ServerToClientEvents,
  sessionRoom,
} from '../../shared/events.ts';
import type { SocketData } from './SocketData.ts';

export type LiveServer = Server<ClientToServerEvents, ServerToClientEvents, Record<string, never>, SocketData>;

/** What services may say over the sockets. */
export interface Broadcast {
  /** Sends a stored event to everyone who has the production open. Call it after the commit only. */
  event(productionId: string, slug: string, event: ProductionEvent): void;
  /** Progress may be dropped on a slow line: the next one says more. */
  progress(productionId: string, progress: ReadingProgress): void;
  /** Tells every tab of a session that it is over, then closes their sockets. */
  endSession(sessionId: string): void;
}

/** What the services may say, over this socket server. */
export function createBroadcast(io: LiveServer): Broadcast {
  return {
    event(productionId, slug, event) {
      io.to(productionRoom(productionId)).emit('production:event', { ...event, slug });
    },
    progress(productionId, progress) {
      io.to(productionRoom(productionId)).volatile.emit('take:progress', progress);
    },
    endSession(sessionId) {
      io.to(sessionRoom(sessionId)).emit('session:ended');
      io.in(sessionRoom(sessionId)).disconnectSockets(true);
    },
  };
}
