import type { ProductionEvent } from '../../shared/api/events.ts';
import type { Person } from '../../shared/api/people.ts';
import type { ReadingProgress } from '../../shared/api/takes.ts';
import type { ErrorCode } from '../../shared/errors.ts';
import { PROTOCOL_VERSION, type ServerToClientEvents } from '../../shared/events.ts';
import { createEventLog, type EventPage } from './eventLog.ts';
import type { ProductionSocket } from './socket.ts';

/**
 * `outdated`: this page is older than the server and has to be loaded again. `closed`: the production is no longer open
 * to this person. `ended`: the session is over.
 */
export type LineState = 'connecting' | 'live' | 'reconnecting' | 'outdated' | 'closed' | 'ended';

export interface LiveProductionOptions {
  slug: string;
  socket: ProductionSocket;
  /** Number of the last event whose effect is on screen already. */
  seen: number;
  fetchAfter: (seq: number) => Promise<EventPage>;
  onEvent: (event: ProductionEvent) => void;
  onProgress: (progress: ReadingProgress) => void;
  onHere: (people: Person[]) => void;
  onState: (state: LineState) => void;
}

const RETRY_MS = 3000;

/** What a refusal means for the line. Anything that is not final is tried again. */
function stateAfter(code: ErrorCode): LineState {
  if (code === 'sign_in_required') return 'ended';
  if (code === 'conflict') return 'outdated';
  return code === 'not_found' || code === 'not_allowed' ? 'closed' : 'reconnecting';
}

/**
 * Joins a production's room and keeps its event log whole: joins again after every reconnect, and fetches whatever the
 * line lost. Returns how to leave, and the number of the last event that was applied.
 */
export function liveProduction(options: LiveProductionOptions): { leave: () => void; seen: () => number } {
  const { slug, socket } = options;
  const log = createEventLog({ seen: options.seen, fetchAfter: options.fetchAfter, apply: options.onEvent });
  let state: LineState = 'connecting';
  let left = false;
  let retry: ReturnType<typeof setTimeout> | undefined;

  const say = (next: LineState) => {
    if (left) return;
    state = next;
    options.onState(next);
  };
  const again = (run: () => void) => {
    if (left) return;
    say('reconnecting');
    clearTimeout(retry);
    retry = setTimeout(run, RETRY_MS);
  };
  const catchUp = (newest: number) => {
    log.catchUp(newest).then(
      () => socket.connected && say('live'),
      () => again(() => catchUp(newest)),
    );
  };

  const handleConnect = () => {
    socket.emit('production:join', { slug, protocol: PROTOCOL_VERSION }, (answer) => {
      if (left) return;
      if (answer.ok) {
        options.onHere(answer.here);
        catchUp(answer.newest);
      } else {
        const after = stateAfter(answer.problem.code);
        if (after === 'reconnecting') again(handleConnect);
        else say(after);
      }
    });
  };
  const handleDisconnect = (reason: string) => {
    // Once the session ended, a line that drops is no news.
    if (state === 'ended') return;
    // The socket comes back by itself unless the server closed it.
    if (reason === 'io server disconnect') again(() => socket.connect());
    else say('reconnecting');
  };
  const handleRefusal = (error: Error) => {
    if (state === 'ended') return;
    if (error.message === 'sign_in_required') say('ended');
    else if (socket.active) say('reconnecting');
    else again(() => socket.connect());
  };
  const handleEvent: ServerToClientEvents['production:event'] = (event) => {
    if (event.slug !== slug) return;
    log.receive(event);
    if (event.seq > log.seen) catchUp(event.seq);
  };
  const handleHere: ServerToClientEvents['production:here'] = (here) => {
    if (here.slug === slug) options.onHere(here.people);
  };
  const handleEnd = () => say('ended');

  socket.on('connect', handleConnect);
  socket.on('disconnect', handleDisconnect);
  socket.on('connect_error', handleRefusal);
  socket.on('production:event', handleEvent);
  socket.on('take:progress', options.onProgress);
  socket.on('production:here', handleHere);
  socket.on('session:ended', handleEnd);
  if (socket.connected) handleConnect();
  else socket.connect();

  return {
    seen: () => log.seen,
    leave: () => {
      left = true;
      clearTimeout(retry);
      socket.off('connect', handleConnect);
      socket.off('disconnect', handleDisconnect);
      socket.off('connect_error', handleRefusal);
      socket.off('production:event', handleEvent);
      socket.off('take:progress', options.onProgress);
      socket.off('production:here', handleHere);
      socket.off('session:ended', handleEnd);
      if (socket.connected) socket.emit('production:leave', { slug });
    },
  };
}
