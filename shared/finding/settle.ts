import type { Candidate } from './candidates.ts';
import type { Shape } from './measure.ts';
import { discOutline, fitOutline, type Outline, outlineOf } from './outline.ts';
import type { FoundTrack } from './tracks.ts';

/** Where the thing is on one frame when all of its frames are known. */
export interface Placed {
  candidate: Candidate;
  x: number;
  y: number;
  radius: number;
  /** 0 to 1: how much of the thing's usual outline shows here. */
  support: number;
}

/** Spread of the usual size beyond which a frame's shape is not the thing alone, log of the area. */
const LEAST_ODDITY = 0.06;
/** A shape of the usual size keeps its centroid unless its outline fits clearly better elsewhere. */
const BETTER = 0.88;

/**
 * Looks at every frame of a track again, now that its usual size and shape are known: where a shadow touches the thing,
 * where it passes behind something or over the picture's edge, its outline is laid over what shows of it. Frames that
 * show less than half of it get no place.
 */
export function settle(track: FoundTrack): Placed[] {
  const usual = usualSizes(track);
  const offs = track.shapes.map((shape, k) => Math.log(shape.area / usual[k].area));
  const spread = 1.5 * median(offs.map(Math.abs));
  const odd = offs.map(
    (off, k) => Math.abs(off) > Math.max(LEAST_ODDITY, 3 * spread) && !isBlurred(track, k, usual[k].short),
  );
  const round = isRound(track, odd);
  return track.path.flatMap((candidate, k) => {
    const shape = track.shapes[k];
    const radius = Math.sqrt(usual[k].area / Math.PI);
    const cutOff = candidate.onEdge > 0.3 * radius;
    const plain: Placed = { candidate, x: shape.x, y: shape.y, radius, support: Math.exp(-Math.abs(offs[k])) };
    const doubtful = odd[k] || cutOff;
    if (!doubtful && !round) return [plain];
    const outline = round ? discOutline(radius) : nearestOutline(track, odd, k);
    if (!outline) return [plain];
    // A patch too much or too little moves a centroid by no more than its share of the area times two radii.
    const pull = 2.2 * radius * Math.abs(Math.exp(offs[k]) - 1);
    const reach = cutOff ? 0.8 * radius : Math.max(2, Math.min(0.6 * radius, pull));
    const fit = fitOutline(candidate.view, outline, shape, reach, candidate.body, round ? [0] : TURNS);
    if (!cutOff && Math.abs(offs[k]) < 0.15 && fit.startScore > BETTER * fit.score) return [plain];
    if (fit.support < 0.45) return shape.area < 0.5 * usual[k].area ? [] : [{ ...plain, support: 0.5 * plain.support }];
    return [{ candidate, x: fit.x, y: fit.y, radius, support: fit.support }];
  });
}

const TURNS = Array.from({ length: 25 }, (_, k) => ((k - 12) * Math.PI) / 60);

/** True where a shape is larger only because it is smeared along its own way during the exposure. */
function isBlurred(track: FoundTrack, k: number, short: number): boolean {
  const shape = track.shapes[k];
  const before = track.shapes[Math.max(0, k - 1)];
  const after = track.shapes[Math.min(track.shapes.length - 1, k + 1)];
  const [dx, dy] = [after.x - before.x, after.y - before.y];
  if (Math.hypot(dx, dy) < 4 || Math.abs(Math.log(shape.short / short)) > 0.09) return false;
  const along = Math.abs(Math.cos(Math.atan2(dy, dx) - shape.tilt));
  return shape.long / shape.short < 1.04 || along > 0.94;
}

interface Usual {
  area: number;
  short: number;
}

/** Frames on either side that say how large the thing is where it comes nearer or goes away. */
const NEIGHBOURS = 9;

/** How large the thing is on each frame: of one size, or smoothly changing where it comes nearer or goes away. */
function usualSizes(track: FoundTrack): Usual[] {
  const { path, shapes } = track;
  const speed = path.map((_, k) =>
    k === 0 ? 0 : Math.hypot(shapes[k].x - shapes[k - 1].x, shapes[k].y - shapes[k - 1].y),
  );
  const free = path.map((_, k) => k).filter((k) => path[k].onEdge === 0);
  const moving = free.filter((k) => speed[k] > 1);
  const ks = moving.length >= 6 ? moving : free.length >= 3 ? free : path.map((_, k) => k);
  const logs = ks.map((k) => Math.log(shapes[k].area));
  const middle = median(logs);
  const flat = median(logs.map((value) => Math.abs(value - middle)));
  const local = path.map((candidate) =>
    localSize(
      candidate.index,
      ks.map((k) => path[k].index),
      logs,
    ),
  );
  const rest = median(ks.map((k, n) => Math.abs(logs[n] - local[k])));
  const range = Math.max(...ks.map((k) => local[k])) - Math.min(...ks.map((k) => local[k]));
  if (range > 0.25 && rest < 0.5 * flat) {
    const flatness = median(ks.map((k) => shapes[k].short / Math.sqrt(shapes[k].area)));
    return local.map((value) => ({ area: Math.exp(value), short: flatness * Math.exp(value / 2) }));
  }
  // The slower half of the frames is the less blurred one.
  const limit = median(ks.map((k) => speed[k]));
  const slow = ks.filter((k) => speed[k] <= limit);
  const area = median(slow.map((k) => shapes[k].area));
  const short = median(slow.map((k) => shapes[k].short));
  return path.map(() => ({ area, short }));
}

function localSize(index: number, times: number[], logs: number[]): number {
  const near = times
    .map((time, k) => ({ time, value: logs[k] }))
    .toSorted((a, b) => Math.abs(a.time - index) - Math.abs(b.time - index))
    .slice(0, NEIGHBOURS);
  const line = medianLine(
    near.map(({ time }) => time),
    near.map(({ value }) => value),
  );
  // Before the first and after the last moving frame the thing keeps its size.
  const at = Math.max(times[0], Math.min(times.at(-1) as number, index));
  return line.at + line.slope * (at - line.time);
}

/** The line with the median slope of all pairs (Theil 1950, Sen 1968), which strays do not tilt. */
function medianLine(times: number[], values: number[]): { slope: number; at: number; time: number } {
  const slopes: number[] = [];
  for (let a = 0; a < times.length; a++) {
    for (let b = a + 1; b < times.length; b++) {
      if (times[b] !== times[a]) slopes.push((values[b] - values[a]) / (times[b] - times[a]));
    }
  }
  const slope = slopes.length === 0 ? 0 : median(slopes);
  const time = times[times.length >> 1];
  return { slope, time, at: median(values.map((value, k) => value - slope * (times[k] - time))) };
}

/** True for a disc, also one that is smeared along its way: short across, and everywhere as a disc moved along would be. */
function isRound(track: FoundTrack, odd: boolean[]): boolean {
  const errors = track.shapes.filter((_, k) => !odd[k] && track.path[k].onEdge === 0).map(offDisc);
  return errors.length >= 3 && median(errors) < 0.02;
}

/**
 * How far a shape is from a disc moved along a straight line: the two moments of area give radius and way, and the way
 * gives the area back. 0 for a disc and a smeared disc; a square has 0.045.
 */
function offDisc(shape: Shape): number {
  let radius = 2 * shape.short;
  let way = 0;
  for (let round = 0; round < 12; round++) {
    way = Math.max(0, (shape.area - Math.PI * radius ** 2) / (2 * radius));
    // Across the way a disc has radius²/4 and the band between its two ends radius²/3.
    const band = (2 * radius * way) / shape.area;
    radius = shape.short / Math.sqrt((1 - band) / 4 + band / 3);
  }
  const ends = (Math.PI * radius ** 4) / 4 + (4 / 3) * way * radius ** 3 + (Math.PI * radius ** 2 * way ** 2) / 4;
  const long = Math.sqrt((ends + (radius * way ** 3) / 6) / shape.area);
  const area = Math.PI * radius ** 2 + 2 * radius * way;
  return Math.max(Math.abs(Math.log(long / shape.long)), 0.5 * Math.abs(Math.log(area / shape.area)));
}

/** The outline of the frame nearest in time that shows the thing alone. */
function nearestOutline(track: FoundTrack, odd: boolean[], k: number): Outline | null {
  let nearest = -1;
  for (let other = 0; other < odd.length; other++) {
    if (odd[other] || track.path[other].onEdge > 0 || track.shapes[other] !== track.path[other].whole) continue;
    if (nearest < 0 || Math.abs(other - k) < Math.abs(nearest - k)) nearest = other;
  }
  if (nearest < 0) return null;
  const { filled, view } = track.path[nearest];
  const shape = track.shapes[nearest];
  return outlineOf({ filled, x: shape.x - view.left, y: shape.y - view.top }, view.width, view.height);
}

function median(values: number[]): number {
  return values.toSorted((a, b) => a - b)[values.length >> 1];
}
