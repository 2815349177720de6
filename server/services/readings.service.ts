import type { Take as WireTake } from '../../shared/api/takes.ts';
import { type Reading as ReadingDocument, readingSchema } from '../../shared/reading/document.ts';
import { Reading } from '../entities/Reading.ts';
import { Shot } from '../entities/Shot.ts';
import { Take } from '../entities/Take.ts';
import type { Deps } from '../deps.ts';
import { AppError } from '../errors.ts';
import { accessByTake, allow } from './access.ts';
import { record } from './record.ts';
import { aboutTake } from './takes.service.ts';

/** What a reading is called: the shot and the take it is of. */
export function readingId(shot: Shot, takeNumber: number): string {
  return `${shot.number}/${takeNumber}`;
}

/** The reading of a take as a document, under the take's present name: a take that moved is not read again. */
export async function readReading(deps: Deps, userId: string, takeId: string): Promise<ReadingDocument> {
  const { manager } = deps.dataSource;
  const { take } = await accessByTake(manager, userId, takeId);
  const reading = await manager.findOne(Reading, { where: { takeId }, select: { takeId: true, document: true } });
  if (!reading) throw new AppError('not_found', 'This take has not been read yet.');
  const shot = await manager.findOneByOrFail(Shot, { id: take.shotId });
  return { ...readingSchema.parse(JSON.parse(reading.document)), id: readingId(shot, take.number) };
}

/** Puts a take in the queue once more. Until the new reading is there, the old one stays. */
export async function readAgain(deps: Deps, userId: string, takeId: string): Promise<WireTake> {
  const { actor, production } = await accessByTake(deps.dataSource.manager, userId, takeId);
  allow(actor, 'take:readAgain');
  const answer = await record(deps, production.id, userId, async (recording) => {
    const { manager, seq } = recording;
    const { readingStatus } = await manager.findOneByOrFail(Take, { id: takeId });
    if (readingStatus === 'queued' || readingStatus === 'reading') {
      throw new AppError('conflict', 'This take is being read already.');
    }
    await manager.update(Take, { id: takeId }, { readingStatus: 'queued', readingMessage: null, revision: seq });
    const payload = await aboutTake(recording, takeId);
    return { change: { kind: 'take:read', payload }, answer: payload.card.take };
  });
  deps.readings.add(takeId);
  return answer;
}
