import type { Shape } from './measure.ts';
import type { FoundTrack } from './tracks.ts';
import type { Placed } from './settle.ts';

/** Grey levels by which the background has more of an outline than the frames, for it to hold the thing itself. */
const GHOST_OUTLINE = -6;
/** Px within which a ghost stays, and log of the area by which it may differ from the thing. */
const STAYS = 4;
const AREA = 0.5;

/**
 * Where a thing rests for more than half of the take the background takes it in: then it does not stand out while it
 * rests, and a ghost stands there while it is away. The ghost's shape is the thing's, so it says where the thing rested.
 * @param placed the thing's places so far
 * @param tracks all tracks of the take
 * @param frames number of pictures
 */
export function restsFromGhosts(placed: Placed[], tracks: FoundTrack[], frames: number): Placed[] {
  const first = placed[0];
  const last = placed.at(-1);
  if (!first || !last) return placed;
  const radius = placed[placed.length >> 1].radius;
  const out = [...placed];
  for (const ghost of tracks.filter((track) => isGhost(track, radius))) {
    const shape = middleOf(ghost);
    const candidate = ghost.path[ghost.path.length >> 1];
    const seen = new Map(ghost.path.map(({ index }, k) => [index, isAt(ghost.shapes[k], shape)]));
    const isNear = (place: Placed): boolean => Math.hypot(place.x - shape.x, place.y - shape.y) < 6 * radius;
    for (const [end, way] of [
      [first, -1],
      [last, 1],
    ] as const) {
      if (!isNear(end)) continue;
      for (let index = end.candidate.index + way; index >= 0 && index < frames; index += way) {
        if (seen.get(index)) break;
        // Where the thing still overlaps its ghost the two are one shape that is neither.
        if (seen.has(index)) continue;
        out.push({ candidate: { ...candidate, index }, x: shape.x, y: shape.y, radius, support: 0.8 });
      }
    }
  }
  return out.toSorted((a, b) => a.candidate.index - b.candidate.index);
}

function isGhost(track: FoundTrack, radius: number): boolean {
  const outlines = track.path.map(({ outline }) => outline).toSorted((a, b) => a - b);
  return (
    track.path.length >= 3 &&
    track.shapes.filter((shape) => isAt(shape, middleOf(track))).length > 0.8 * track.shapes.length &&
    outlines[outlines.length >> 1] < GHOST_OUTLINE &&
    2 * Math.abs(Math.log(track.radius / radius)) < AREA
  );
}

function middleOf({ shapes }: FoundTrack): Shape {
  const [x, y] = (['x', 'y'] as const).map((axis) => shapes.map((shape) => shape[axis]).toSorted((a, b) => a - b));
  return { ...shapes[shapes.length >> 1], x: x[x.length >> 1], y: y[y.length >> 1] };
}

function isAt(shape: Shape, place: Shape): boolean {
  return Math.hypot(shape.x - place.x, shape.y - place.y) <= STAYS;
}
