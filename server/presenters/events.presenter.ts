import type { ProductionEvent as WireEvent } from '../../shared/api/events.ts';
import type { ProductionEvent } from '../entities/ProductionEvent.ts';
import { presentPerson } from './people.presenter.ts';

/** A stored row exactly as it was sent; `record()` made sure of its shape. `actor` is loaded. */
export function presentEvent(event: ProductionEvent): WireEvent {
  return {
    seq: event.seq,
    kind: event.kind,
    at: event.at.toISOString(),
    actor: event.actor && presentPerson(event.actor),
    payload: JSON.parse(event.payload),
  } as WireEvent;
}
