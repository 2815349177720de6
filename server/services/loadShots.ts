import type { EntityManager } from 'typeorm';
import { Decision } from '../entities/Decision.ts';
import { Shot } from '../entities/Shot.ts';
import { Take } from '../entities/Take.ts';
import type { ShotParts } from '../presenters/shots.presenter.ts';

/** A shot with what its line shows: its latest take and the decision made last. */
export async function loadShot(manager: EntityManager, shotId: string): Promise<ShotParts> {
  const shot = await manager.findOneByOrFail(Shot, { id: shotId });
  const latest = await latestTake(manager, shotId);
  const [lastDecision] = await manager.find(Decision, {
    where: { take: { shotId } },
    relations: { by: true },
    order: { seq: 'DESC' },
    take: 1,
  });
  return { shot, latest, lastDecision: lastDecision ?? null };
}

/** The take with the highest number, with whoever posted it. */
export async function latestTake(manager: EntityManager, shotId: string): Promise<Take | null> {
  const [latest] = await manager.find(Take, {
    where: { shotId },
    relations: { postedBy: true },
    order: { number: 'DESC' },
    take: 1,
  });
  return latest ?? null;
}
