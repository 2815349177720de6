import { randomUUID } from 'node:crypto';
import { Shot } from '../entities/Shot.ts';
import { AppError } from '../errors.ts';
import type { Recording } from './record.ts';

/**
 * The shot with this number, made when it is not there. Call it inside a recording: the production's lock keeps two
 * posts from making the same shot.
 * @throws {AppError} `invalid_request` for a new shot without a title
 */
export async function openShot(
  { manager, seq }: Recording,
  productionId: string,
  number: string,
  title: string | undefined,
): Promise<Shot> {
  const there = await manager.findOneBy(Shot, { productionId, number });
  if (there) return there;
  if (!title) {
    throw new AppError('invalid_request', `Shot ${number} is new; give it a title.`, {
      fields: [{ path: 'shotTitle', message: `Shot ${number} is new; give it a title.` }],
    });
  }
  const shot = manager.create(Shot, {
    id: randomUUID(),
    productionId,
    number,
    title,
    lastTakeNumber: 0,
    revision: seq,
  });
  await manager.insert(Shot, shot);
  return shot;
}
