import type { Path } from './link.ts';
import { type FoundTrack, trackOf } from './tracks.ts';

/** How alike two parts have to look: log of the areas' ratio, and colour in grey levels. */
const AREA = 0.7;
const COLOUR = 45;
/** How much faster than before and after a thing may have gone where nobody saw it. */
const FASTER = 2;

/**
 * Joins tracks that are one thing seen twice: what leaves the picture at the top and falls back into it, or stays
 * behind a wall for long. They do not overlap in time, look alike, and the way between them can be gone in the time.
 */
export function joinParts(tracks: FoundTrack[]): FoundTrack[] {
  let parts = tracks;
  for (let joined = true; joined; ) {
    joined = false;
    for (const before of parts) {
      const after = parts
        .filter((track) => follows(before, track))
        .toSorted((a, b) => a.path[0].index - b.path[0].index)[0];
      if (!after) continue;
      const path: Path = [...before.path, ...after.path];
      parts = [...parts.filter((track) => track !== before && track !== after), trackOf(path)];
      joined = true;
      break;
    }
  }
  return parts;
}

function follows(before: FoundTrack, after: FoundTrack): boolean {
  const last = before.path.at(-1);
  const first = after.path[0];
  if (before === after || !last || first.index <= last.index) return false;
  if (Math.min(before.path.length, after.path.length) < 3) return false;
  if (2 * Math.abs(Math.log(before.radius / after.radius)) > AREA) return false;
  const [r, g, b] = colourOf(before).map((value, channel) => value - colourOf(after)[channel]);
  if (Math.hypot(r, g, b) > COLOUR) return false;
  const way = Math.hypot(first.whole.x - last.whole.x, first.whole.y - last.whole.y);
  const speed = Math.max(speedOf(before), speedOf(after), 1);
  return way <= FASTER * speed * (first.index - last.index);
}

function colourOf(track: FoundTrack): number[] {
  return [0, 1, 2].map((channel) => {
    const values = track.path.map((candidate) => candidate.colour[channel]).toSorted((a, b) => a - b);
    return values[values.length >> 1];
  });
}

/** Largest step of a track, px/frame. */
function speedOf({ path }: FoundTrack): number {
  let most = 0;
  for (let k = 1; k < path.length; k++) {
    const step = Math.hypot(path[k].whole.x - path[k - 1].whole.x, path[k].whole.y - path[k - 1].whole.y);
    most = Math.max(most, step / (path[k].index - path[k - 1].index));
  }
  return most;
}
