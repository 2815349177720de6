import { MoreThan } from 'typeorm';
import type { ProductionEvent as WireEvent } from '../../shared/api/events.ts';
import { ProductionEvent } from '../entities/ProductionEvent.ts';
import type { Deps } from '../deps.ts';
import { presentEvent } from '../presenters/events.presenter.ts';
import { accessBySlug } from './access.ts';

/** What happened after an event number, in order. `newest` tells whether there is more to ask for. */
export async function readEvents(
  deps: Deps,
  userId: string,
  slug: string,
  { after, limit }: { after: number; limit: number },
): Promise<{ events: WireEvent[]; newest: number }> {
  const { manager } = deps.dataSource;
  const { production } = await accessBySlug(manager, userId, slug);
  const events = await manager.find(ProductionEvent, {
    where: { productionId: production.id, seq: MoreThan(after) },
    relations: { actor: true },
    order: { seq: 'ASC' },
    take: limit,
  });
  return { events: events.map(presentEvent), newest: Math.max(production.eventSeq, events.at(-1)?.seq ?? 0) };
}
