import type { Candidate } from './candidates.ts';
import type { Path } from './link.ts';
import { type FoundTrack, trackOf } from './tracks.ts';

/** How much a thing may differ from its usual look: log of the area (a shadow that touches it adds), and grey levels. */
const AREA = 0.9;
const COLOUR = 90;

/**
 * Gives a thing the frames that another path had taken: where it rests on its shadow the two are one region, and the
 * shadow's path may have come first. Goes outwards from the frames that are known, to what lies where the thing moves on
 * to or stays.
 * @param frames all candidates of each frame that no other thing owns
 */
export function extend(track: FoundTrack, frames: Candidate[][]): FoundTrack {
  const known = new Map(track.path.map((candidate) => [candidate.index, candidate]));
  const look = lookOf(track);
  for (const way of [1, -1]) {
    const order = way === 1 ? [...frames.keys()] : [...frames.keys()].toReversed();
    for (const index of order) {
      if (known.has(index)) continue;
      const last = known.get(index - way);
      if (!last) continue;
      const before = known.get(index - 2 * way);
      const next = nearest(frames[index], last, before, track.radius, look);
      if (next) known.set(index, next);
    }
  }
  if (known.size === track.path.length) return track;
  const path: Path = [...known.values()].toSorted((a, b) => a.index - b.index);
  return trackOf(path);
}

interface Look {
  area: number;
  colour: number[];
}

function lookOf(track: FoundTrack): Look {
  const middle = (values: number[]): number => values.toSorted((a, b) => a - b)[values.length >> 1];
  return {
    area: Math.PI * track.radius ** 2,
    colour: [0, 1, 2].map((channel) => middle(track.path.map((candidate) => candidate.colour[channel]))),
  };
}

function nearest(
  candidates: Candidate[],
  last: Candidate,
  before: Candidate | undefined,
  radius: number,
  look: Look,
): Candidate | null {
  const step = before ? { x: last.whole.x - before.whole.x, y: last.whole.y - before.whole.y } : { x: 0, y: 0 };
  const reach = Math.max(radius, 0.6 * Math.hypot(step.x, step.y));
  let best: { candidate: Candidate; miss: number } | null = null;
  for (const candidate of candidates) {
    if (!isAlike(candidate, look)) continue;
    const { x, y } = candidate.whole;
    const moved = Math.hypot(x - last.whole.x - step.x, y - last.whole.y - step.y);
    const stayed = Math.hypot(x - last.whole.x, y - last.whole.y);
    const miss = Math.min(moved / reach, stayed / radius);
    if (miss <= 1 && (!best || miss < best.miss)) best = { candidate, miss };
  }
  return best?.candidate ?? null;
}

function isAlike(candidate: Candidate, look: Look): boolean {
  const [r, g, b] = candidate.colour.map((value, channel) => value - look.colour[channel]);
  return Math.abs(Math.log(candidate.whole.area / look.area)) < AREA && Math.hypot(r, g, b) < COLOUR;
}
