import { productionEventSchema, type ProductionEvent as WireEvent } from '../../shared/api/events.ts';
import type { ProductionEvent } from '../entities/ProductionEvent.ts';
import { presentPerson } from './people.presenter.ts';

/** A stored row as it was sent. `actor` is loaded. Rows of an older shape would fail here, where it is noticed. */
export function presentEvent(event: ProductionEvent): WireEvent {
  return productionEventSchema.parse({
    seq: event.seq,
    kind: event.kind,
    at: event.at.toISOString(),
    actor: event.actor && presentPerson(event.actor),
    payload: JSON.parse(event.payload),
  });
}
