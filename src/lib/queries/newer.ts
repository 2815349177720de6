import type { FeedCard } from '../../../shared/api/feed.ts';
import type { Shot, ShotWithTakes } from '../../../shared/api/shots.ts';
import type { StampBoard } from '../../../shared/api/stamps.ts';
import type { Take } from '../../../shared/api/takes.ts';

/** The stamp board to keep of two: the newer by revision. */
export function newerBoard(have: StampBoard, got: StampBoard): StampBoard {
  return got.revision > have.revision ? got : have;
}

/**
 * The take to keep of two states of the same take: the newer by revision. Stamps carry a revision of their own, and notes
 * only ever grow in number, so both are kept at their newest.
 */
export function newerTake(have: Take, got: Take): Take {
  const newest = got.revision > have.revision ? got : have;
  const stamps = newerBoard(have.stamps, got.stamps);
  const noteCount = Math.max(have.noteCount, got.noteCount);
  if (newest.stamps === stamps && newest.noteCount === noteCount) return newest;
  return { ...newest, stamps, noteCount };
}

/** The shot to keep of two states of the same shot, without its takes. */
export function newerShot<S extends Shot>(have: S, got: Shot): S {
  return got.revision > have.revision ? { ...have, ...got } : have;
}

/** The shot with takes to keep: shot and each take at their newest; a take only one side knows is kept unless it moved away. */
export function newerShotWithTakes(have: ShotWithTakes, got: ShotWithTakes): ShotWithTakes {
  const takes = new Map(got.takes.map((take) => [take.id, take]));
  for (const take of have.takes) {
    const other = takes.get(take.id);
    if (other) takes.set(take.id, newerTake(take, other));
    else if (take.revision > got.revision) takes.set(take.id, take);
  }
  return {
    ...(got.revision >= have.revision ? got : have),
    takes: [...takes.values()].filter((take) => take.shotNumber === got.number).sort((a, b) => a.number - b.number),
  };
}

/** The feed card to keep of two of the same take. Its talk grows with the notes. */
export function newerCard(have: FeedCard, got: FeedCard): FeedCard {
  const newest = got.take.noteCount >= have.take.noteCount && got.take.revision >= have.take.revision ? got : have;
  return { ...newest, take: newerTake(have.take, got.take) };
}
