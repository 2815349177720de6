import type { ProductionEvent } from '../../shared/api/events.ts';

export interface EventPage {
  events: ProductionEvent[];
  /** Number of the newest event there is. */
  newest: number;
}

export interface EventLogOptions {
  /** Number of the last event whose effect is already on screen. */
  seen: number;
  /** What happened after an event number, in order. */
  fetchAfter: (seq: number) => Promise<EventPage>;
  /** Shows one event. Called in order, once for each number. */
  apply: (event: ProductionEvent) => void;
}

export interface EventLog {
  readonly seen: number;
  /** An event that arrived by itself. Kept back while one before it is missing. */
  receive: (event: ProductionEvent) => void;
  /** Fetches what is missing up to `newest`. Concurrent calls share one run; it rejects when a fetch does. */
  catchUp: (newest: number) => Promise<void>;
}

/**
 * Follows a production's numbered events: each is applied in order and exactly once, whatever the line loses, repeats or
 * reorders. Pure bookkeeping: where events come from and what they change is the caller's.
 */
export function createEventLog({ seen: from, fetchAfter, apply }: EventLogOptions): EventLog {
  let seen = from;
  let wanted = from;
  let running: Promise<void> | null = null;
  const early = new Map<number, ProductionEvent>();

  const take = (event: ProductionEvent) => {
    if (event.seq > seen) early.set(event.seq, event);
    for (let next = early.get(seen + 1); next; next = early.get(seen + 1)) {
      early.delete(next.seq);
      seen = next.seq;
      apply(next);
    }
  };

  const run = async () => {
    while (seen < wanted) {
      const before = seen;
      const page = await fetchAfter(seen);
      wanted = Math.max(wanted, page.newest);
      for (const event of page.events) take(event);
      // An answer that brings nothing would be asked for ever; the next event or reconnect asks again.
      if (seen === before) return;
    }
  };

  const catchUp = (newest: number) => {
    wanted = Math.max(wanted, newest);
    running ??= run().finally(() => {
      running = null;
    });
    return running;
  };

  return {
    get seen() {
      return seen;
    },
    receive: take,
    catchUp,
  };
}
