import type { Deps } from '../deps.ts';
import type { Sessions } from '../http/sessions.ts';
import { isMember } from '../services/access.ts';
import type { LiveServer } from './broadcast.ts';
import { leaveProduction } from './productionHandlers.ts';

/** A socket outlives the request that opened it: ends those whose session is over, and closes what access was taken from. */
export async function recheckSockets(io: LiveServer, deps: Deps, sessions: Sessions): Promise<void> {
  for (const socket of io.of('/').sockets.values()) {
    const { sessionId, person, open } = socket.data;
    if (!(await sessions.isAlive(sessionId))) {
      deps.broadcast.endSession(sessionId);
      continue;
    }
    for (const productionId of open.keys()) {
      if (!(await isMember(deps.dataSource.manager, person.id, productionId))) {
        await leaveProduction(io, socket, productionId);
      }
    }
  }
}
