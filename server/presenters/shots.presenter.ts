import { sequenceOf } from '../../shared/api/names.ts';
import type { Shot as WireShot, ShotWithTakes } from '../../shared/api/shots.ts';
import type { Decision } from '../entities/Decision.ts';
import type { Shot } from '../entities/Shot.ts';
import type { Take } from '../entities/Take.ts';
import { presentPerson } from './people.presenter.ts';
import { presentTake, type TakeParts } from './takes.presenter.ts';

/** A shot with what its line shows of its takes. */
export interface ShotParts {
  shot: Shot;
  /** Take with the highest number, `postedBy` loaded. */
  latest: Take | null;
  /** The newest decision on any take of it, `by` loaded. */
  lastDecision: Decision | null;
}

/** The line of a shot, without its takes. */
export function presentShot({ shot, latest, lastDecision }: ShotParts): WireShot {
  return {
    id: shot.id,
    revision: shot.revision,
    number: shot.number,
    sequence: sequenceOf(shot.number),
    title: shot.title,
    state: latest?.review ?? null,
    animator: latest && presentPerson(latest.postedBy),
    mentor: lastDecision && presentPerson(lastDecision.by),
    waitingSince: latest?.review === 'waiting' ? latest.postedAt.toISOString() : null,
    nextTakeNumber: shot.lastTakeNumber + 1,
  };
}

/** Takes are given first to last. */
export function presentShotWithTakes(shot: Shot, takes: TakeParts[]): ShotWithTakes {
  const decisions = takes.flatMap(({ decision }) => decision ?? []).sort((a, b) => b.seq - a.seq);
  const line = { shot, latest: takes.at(-1)?.take ?? null, lastDecision: decisions[0] ?? null };
  return { ...presentShot(line), takes: takes.map(presentTake) };
}
