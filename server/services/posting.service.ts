import { randomUUID } from 'node:crypto';
import type { z } from 'zod';
import type { postSchema } from '../../shared/api/drafts.ts';
import type { Take as WireTake } from '../../shared/api/takes.ts';
import { shownFrame } from '../../shared/reading/document.ts';
import { Shot } from '../entities/Shot.ts';
import { Take } from '../entities/Take.ts';
import { TakeFrame } from '../entities/TakeFrame.ts';
import type { Deps } from '../deps.ts';
import { dropFrames, type FrameFile, keepFrames, type KeptFrame } from '../storage/takeFiles.ts';
import { accessBySlug, allow } from './access.ts';
import { openShot } from './openShot.ts';
import { type Recording, record } from './record.ts';
import { aboutTake } from './takes.service.ts';

/** The pictures of a post, in order, all of one size in px. */
export interface Strip {
  kind: Take['kind'];
  frames: FrameFile[];
  width: number;
  height: number;
  /** Frame of the document each picture belongs to, from 1 and rising; left out: none is missing between them. */
  frameNumbers?: number[];
}

export type PostGiven = z.output<typeof postSchema>;

/**
 * Posts a strip as the next take of its shot, which is made when it is new, and has it read. The files are linked
 * first and the rows written last: a post that fails leaves neither.
 * @throws {AppError} `invalid_request` when the shot is new and has no title
 */
export async function postTake(
  deps: Deps,
  userId: string,
  slug: string,
  strip: Strip,
  given: PostGiven,
): Promise<WireTake> {
  const { actor, production } = await accessBySlug(deps.dataSource.manager, userId, slug);
  allow(actor, 'take:post');
  const takeId = randomUUID();
  const kept = await keepFrames(deps.dataDir, takeId, strip.frames);
  try {
    const answer = await record(deps, production.id, userId, async (recording) => {
      const shot = await openShot(recording, production.id, given.shotNumber, given.shotTitle);
      await insertTake(recording, { takeId, shot, userId, strip, given, kept });
      const payload = await aboutTake(recording, takeId);
      return { change: { kind: 'take:posted', payload }, answer: payload.card.take };
    });
    deps.readings.add(takeId);
    return answer;
  } catch (error) {
    await dropFrames(deps.dataDir, takeId);
    throw error;
  }
}

interface NewTake {
  takeId: string;
  shot: Shot;
  userId: string;
  strip: Strip;
  given: PostGiven;
  kept: KeptFrame[];
}

/** The production's lock is held, so the next number of the shot is nobody else's. */
async function insertTake({ manager, seq, at }: Recording, parts: NewTake): Promise<void> {
  const { takeId, shot, userId, strip, given, kept } = parts;
  const number = shot.lastTakeNumber + 1;
  const frameNumbers = strip.frameNumbers ?? kept.map((_, index) => index + 1);
  const frames = frameNumbers.at(-1) ?? 0;
  await manager.update(Shot, { id: shot.id }, { lastTakeNumber: number });
  await manager.insert(Take, {
    id: takeId,
    productionId: shot.productionId,
    shotId: shot.id,
    number,
    postedById: userId,
    postedAt: at,
    postedSeq: seq,
    revision: seq,
    review: 'waiting',
    readingStatus: 'queued',
    kind: strip.kind,
    fpsNum: given.fps.num,
    fpsDen: given.fps.den,
    hold: given.hold,
    firstFrame: given.firstFrame,
    frames,
    width: strip.width,
    height: strip.height,
    changed: given.changed,
    intended: given.intended,
    missingFrames: missingAmong(frameNumbers).map((frame) => shownFrame(frame, given.firstFrame)),
  });
  await manager.insert(
    TakeFrame,
    kept.map((picture, index) => ({ takeId, frame: frameNumbers[index]!, ...picture })),
  );
}

function missingAmong(frameNumbers: number[]): number[] {
  const there = new Set(frameNumbers);
  const all = Array.from({ length: frameNumbers.at(-1) ?? 0 }, (_, index) => index + 1);
  return all.filter((frame) => !there.has(frame));
}
