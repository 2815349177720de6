import type { QueryClient } from '@tanstack/react-query';
import type { ProductionEvent } from '../../../shared/api/events.ts';

/**
 * A fetch that was answered before an event happened may arrive after the event was shown, and would wipe it out. So
 * events that arrive while anything is being fetched are shown once more after each answer; patches are idempotent.
 * Call `applied` with every event; `stop` ends it.
 */
export function replayDuringFetch(client: QueryClient, apply: (event: ProductionEvent) => void) {
  let held: ProductionEvent[] = [];
  const stop = client.getQueryCache().subscribe((change) => {
    if (change.type !== 'updated' || held.length === 0) return;
    if (change.action.type !== 'success' || change.action.manual) return;
    for (const event of held) apply(event);
    if (client.isFetching() === 0) held = [];
  });
  return {
    applied: (event: ProductionEvent) => {
      if (client.isFetching() > 0) held.push(event);
    },
    stop,
  };
}
