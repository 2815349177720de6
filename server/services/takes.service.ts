import { randomUUID } from 'node:crypto';
import type { z } from 'zod';
import type { Take as WireTake, takeContracts } from '../../shared/api/takes.ts';
import { Decision } from '../entities/Decision.ts';
import { Shot } from '../entities/Shot.ts';
import { Take } from '../entities/Take.ts';
import type { Deps } from '../deps.ts';
import { AppError, notFound } from '../errors.ts';
import { presentFeedCard } from '../presenters/feed.presenter.ts';
import { presentShot } from '../presenters/shots.presenter.ts';
import { presentTake } from '../presenters/takes.presenter.ts';
import { accessBySlug, accessByTake, allow } from './access.ts';
import { latestTake, loadShot } from './loadShots.ts';
import { loadCards, loadTake } from './loadTakes.ts';
import { openShot } from './openShot.ts';
import { type Recording, record } from './record.ts';

type DecisionGiven = z.output<NonNullable<(typeof takeContracts.decide)['body']>>;
type MoveGiven = z.output<NonNullable<(typeof takeContracts.move)['body']>>;

/** One take of a shot by its numbers. */
export async function readTake(
  deps: Deps,
  userId: string,
  slug: string,
  shotNumber: string,
  takeNumber: number,
): Promise<WireTake> {
  const { manager } = deps.dataSource;
  const { production } = await accessBySlug(manager, userId, slug);
  const take = await manager.findOne(Take, {
    where: { number: takeNumber, shot: { productionId: production.id, number: shotNumber } },
  });
  if (!take) throw notFound('take');
  return presentTake(await loadTake(manager, take.id));
}

/**
 * Clears a take, asks for another pass, or waives what is off. Only the latest take of a shot is decided on. Saying once
 * more what one said last, as a second click does, changes nothing and makes no event.
 */
export async function decideTake(deps: Deps, userId: string, takeId: string, given: DecisionGiven): Promise<WireTake> {
  const { actor, take, production } = await accessByTake(deps.dataSource.manager, userId, takeId);
  allow(actor, 'take:decide', take);
  return record(deps, production.id, userId, async ({ manager, seq, at }) => {
    const { shotId } = await manager.findOneByOrFail(Take, { id: takeId });
    const latest = await latestTake(manager, shotId);
    if (latest && latest.id !== takeId) {
      throw new AppError('conflict', `Take ${latest.number} is newer; decide on that one.`);
    }
    const last = await manager.findOne(Decision, { where: { takeId }, order: { seq: 'DESC' } });
    if (last && last.byId === userId && last.state === given.state && last.remark === given.remark) {
      return { change: null, answer: presentTake(await loadTake(manager, takeId)) };
    }
    await manager.insert(Decision, { id: randomUUID(), takeId, byId: userId, ...given, seq, decidedAt: at });
    await manager.update(Take, { id: takeId }, { review: given.state, revision: seq });
    const payload = await aboutTake({ manager, seq, at }, takeId);
    return { change: { kind: 'take:decided', payload }, answer: payload.card.take };
  });
}

/** Moves a take that was posted to the wrong shot; it becomes the next take there. */
export async function moveTake(deps: Deps, userId: string, takeId: string, given: MoveGiven): Promise<WireTake> {
  const { actor, take, production } = await accessByTake(deps.dataSource.manager, userId, takeId);
  allow(actor, 'take:move', take);
  return record(deps, production.id, userId, async (recording) => {
    const { manager, seq } = recording;
    const { shotId, number: fromTakeNumber } = await manager.findOneByOrFail(Take, { id: takeId });
    const target = await openShot(recording, production.id, given.shotNumber, given.shotTitle);
    if (target.id === shotId) throw new AppError('conflict', `This take is on shot ${target.number} already.`);
    const number = target.lastTakeNumber + 1;
    await manager.update(Shot, { id: target.id }, { lastTakeNumber: number });
    await manager.update(Shot, { id: shotId }, { revision: seq });
    await manager.update(Take, { id: takeId }, { shotId: target.id, number, revision: seq });
    const about = await aboutTake(recording, takeId);
    const from = presentShot(await loadShot(manager, shotId));
    return { change: { kind: 'take:moved', payload: { ...about, from, fromTakeNumber } }, answer: about.card.take };
  });
}

/** Payload of every event about a take: its card and its shot as they stand now. Marks the shot as changed. */
export async function aboutTake({ manager, seq }: Recording, takeId: string) {
  const take = await manager.findOneByOrFail(Take, { id: takeId });
  await manager.update(Shot, { id: take.shotId }, { revision: seq });
  const [card] = await loadCards(manager, take.productionId, [takeId]);
  return { card: presentFeedCard(card!), shot: presentShot(await loadShot(manager, take.shotId)) };
}
