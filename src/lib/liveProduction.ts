import { PROTOCOL_VERSION, type ServerToClientEvents } from '../../shared/events.ts';
import type { ProductionEvent } from '../../shared/api/events.ts';
import type { Person } from '../../shared/api/people.ts';
import type { ReadingProgress } from '../../shared/api/takes.ts';
import { createEventLog, type EventPage } from './eventLog.ts';
import type { ProductionSocket } from './socket.ts';

/** `outdated`: this page is older than the server and has to be loaded again. */
export type LineState = 'connecting' | 'live' | 'reconnecting' | 'outdated' | 'ended';

export interface LiveProductionOptions {
  slug: string;
  socket: ProductionSocket;
  seen: number;
  fetchAfter: (seq: number) => Promise<EventPage>;
  onEvent: (event: ProductionEvent) => void;
  onProgress: (progress: ReadingProgress) => void;
  onHere: (people: Person[]) => void;
  onState: (state: LineState) => void;
}

const RETRY_MS = 3000;

/**
 * Joins a production's room and keeps its event log whole: joins again after every reconnect, and fetches whatever the
 * line lost. Returns how to leave, and the number of the last event that was applied.
 */
export function liveProduction(options: LiveProductionOptions): { leave: () => void; seen: () => number } {
  const { slug, socket, onState } = options;
  const log = createEventLog({ seen: options.seen, fetchAfter: options.fetchAfter, apply: options.onEvent });
  let left = false;
  // Once the session ended, a line that drops is no news.
  let ended = false;
  const lost = () => {
    if (!ended) onState('reconnecting');
  };
  let retry: ReturnType<typeof setTimeout> | undefined;

  const catchUp = (newest: number) => {
    log.catchUp(newest).then(
      () => !left && socket.connected && onState('live'),
      () => {
        if (left) return;
        onState('reconnecting');
        clearTimeout(retry);
        retry = setTimeout(() => catchUp(newest), RETRY_MS);
      },
    );
  };

  const join = () => {
    socket.emit('production:join', { slug, protocol: PROTOCOL_VERSION }, (answer) => {
      if (left) return;
      ended = !answer.ok && answer.problem.code !== 'conflict';
      if (!answer.ok) return onState(ended ? 'ended' : 'outdated');
      options.onHere(answer.here);
      catchUp(answer.newest);
    });
  };

  const handlers: Partial<ServerToClientEvents> & {
    connect: () => void;
    disconnect: () => void;
    connect_error: () => void;
  } = {
    connect: join,
    disconnect: lost,
    connect_error: lost,
    'production:event': (event) => {
      if (event.slug !== slug) return;
      log.receive(event);
      if (event.seq > log.seen) catchUp(event.seq);
    },
    'take:progress': options.onProgress,
    'production:here': (here) => here.slug === slug && options.onHere(here.people),
    'session:ended': () => {
      ended = true;
      onState('ended');
    },
  };
  socket.on('connect', handlers.connect);
  socket.on('disconnect', handlers.disconnect);
  socket.on('connect_error', handlers.connect_error);
  socket.on('production:event', handlers['production:event']!);
  socket.on('take:progress', handlers['take:progress']!);
  socket.on('production:here', handlers['production:here']!);
  socket.on('session:ended', handlers['session:ended']!);

  if (socket.connected) join();
  else socket.connect();

  return {
    seen: () => log.seen,
    leave: () => {
      left = true;
      clearTimeout(retry);
      socket.off('connect', handlers.connect);
      socket.off('disconnect', handlers.disconnect);
      socket.off('connect_error', handlers.connect_error);
      socket.off('production:event', handlers['production:event']!);
      socket.off('take:progress', handlers['take:progress']!);
      socket.off('production:here', handlers['production:here']!);
      socket.off('session:ended', handlers['session:ended']!);
      if (socket.connected) socket.emit('production:leave', { slug });
    },
  };
}
