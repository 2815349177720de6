import type { DataSource, EntityManager } from 'typeorm';
import type { PayloadOf, ProductionEvent as WireEvent, ProductionEventKind } from '../../shared/api/events.ts';
import { Production } from '../entities/Production.ts';
import { ProductionEvent } from '../entities/ProductionEvent.ts';
import { User } from '../entities/User.ts';
import type { Deps } from '../deps.ts';
import { codeOf } from '../errors.ts';
import { presentPerson } from '../presenters/people.presenter.ts';

type Change = { [K in ProductionEventKind]: { kind: K; payload: PayloadOf<K> } }[ProductionEventKind];

/** What a write answers: the event to store, or null where nothing changed, and what the caller gets. */
export interface Written<Answer> {
  change: Change | null;
  answer: Answer;
}

/** The transaction of a write. `seq` is the number its event will have; stamp it as the revision of what changes. */
export interface Recording {
  manager: EntityManager;
  seq: number;
  at: Date;
}

const ATTEMPTS = 4;
const RETRIED = new Set(['ER_LOCK_DEADLOCK', 'ER_LOCK_WAIT_TIMEOUT']);

/** Writes of one production wait for each other here, so that events go out in their order and no connection idles. */
const tails = new WeakMap<DataSource, Map<string, Promise<unknown>>>();

type RecordDeps = Pick<Deps, 'dataSource' | 'broadcast' | 'log' | 'now'>;

/**
 * The only way to write to a production. One transaction locks the production's counter, lets `write` make its change,
 * and stores exactly one event row with the presented payload. A rolled-back write gives its number back, so numbers
 * have no gaps. After the commit the event goes to everyone who has the production open.
 * `write` may run again after a deadlock: it must touch nothing but its `manager`.
 */
export function record<Answer>(
  deps: RecordDeps,
  productionId: string,
  actorId: string | null,
  write: (recording: Recording) => Promise<Written<Answer>>,
): Promise<Answer> {
  const queue = tails.get(deps.dataSource) ?? new Map<string, Promise<unknown>>();
  tails.set(deps.dataSource, queue);
  const turn = (queue.get(productionId) ?? Promise.resolve()).then(() =>
    writeAndTell(deps, productionId, actorId, write),
  );
  const tail = turn.catch(() => {});
  queue.set(productionId, tail);
  void tail.then(() => {
    if (queue.get(productionId) === tail) queue.delete(productionId);
  });
  return turn;
}

async function writeAndTell<Answer>(
  deps: RecordDeps,
  productionId: string,
  actorId: string | null,
  write: (recording: Recording) => Promise<Written<Answer>>,
): Promise<Answer> {
  for (let attempt = 1; ; attempt += 1) {
    try {
      const { answer, slug, event } = await deps.dataSource.transaction((manager) =>
        writeOnce(manager, deps.now, productionId, actorId, write),
      );
      if (event) deps.broadcast.event(productionId, slug, event);
      return answer;
    } catch (error) {
      if (attempt === ATTEMPTS || !RETRIED.has(codeOf(error))) throw error;
      deps.log.warn({ productionId, attempt, code: codeOf(error) }, 'a write lost a lock and is repeated');
    }
  }
}

async function writeOnce<Answer>(
  manager: EntityManager,
  now: () => Date,
  productionId: string,
  actorId: string | null,
  write: (recording: Recording) => Promise<Written<Answer>>,
): Promise<{ answer: Answer; slug: string; event: WireEvent | null }> {
  // The lock is the first statement: the snapshot of this transaction begins once it is held.
  const production = await manager.findOneOrFail(Production, {
    where: { id: productionId },
    lock: { mode: 'pessimistic_write' },
  });
  const seq = production.eventSeq + 1;
  const at = now();
  const { change, answer } = await write({ manager, seq, at });
  if (!change) return { answer, slug: production.slug, event: null };
  await manager.update(Production, { id: productionId }, { eventSeq: seq });
  const payload = JSON.stringify(change.payload);
  await manager.insert(ProductionEvent, { productionId, seq, kind: change.kind, actorId, at, payload });
  const actor = actorId ? await manager.findOneByOrFail(User, { id: actorId }) : null;
  const event = { seq, at: at.toISOString(), actor: actor && presentPerson(actor), ...change };
  return { answer, slug: production.slug, event };
}
