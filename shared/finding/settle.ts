import { type Candidate, ontoPicture } from './candidates.ts';
import type { Shape } from './measure.ts';
import { discOutline, fitOutline, type Outline, outlineOf } from './outline.ts';
import { type FoundTrack, trackOf } from './tracks.ts';

/** Where the thing is on one frame when all of its frames are known, px of the picture. */
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
const LEAST_ODDITY_TURNING = 0.14;
/** A shape of the usual size keeps its centroid unless its outline fits clearly better elsewhere. */
const BETTER = 0.94;

/**
 * Looks at every frame of a track again, now that its usual size and shape are known: where a shadow touches the thing,
 * where it passes behind something or over the picture's edge, its outline is laid over what shows of it. Frames that
 * show less than half of it get no place.
 */
export function settle(found: FoundTrack): Placed[] {
  const track = withoutWire(found);
  let usual = usualSizes(track);
  let offs = offsOf(track, usual);
  const round = isRound(track, oddOnes(offs), usual);
  if (!round) {
    // What turns in space changes its size by itself, but not from one frame to the next.
    usual = track.local.map((area) => ({ area, smear: { x: 0, y: 0 } }));
    offs = offsOf(track, usual);
  }
  const odd = oddOnes(offs);
  const rim = round ? rimShare(track, odd, usual) : 1;
  return track.path.flatMap((candidate, k) => {
    const shape = track.shapes[k];
    const { zoom } = candidate.pose;
    const radius = rim * zoom * discRadius(usual[k]);
    const cutOff = candidate.onEdge > 0.3 * radius;
    const here = ontoPicture(shape, candidate.pose);
    const plain: Placed = { candidate, ...here, radius, support: Math.exp(-Math.abs(offs[k])) };
    const doubtful = cutOff || (odd[k] && (round || Math.abs(offs[k]) > LEAST_ODDITY_TURNING));
    if (!doubtful && !round) return [plain];
    const outline = round ? discOutline(radius, usual[k].smear) : nearestOutline(track, odd, k);
    if (!outline) return [plain];
    // A patch too much or too little moves a centroid by no more than its share of the area times two radii.
    const pull = 2.2 * radius * Math.abs(Math.exp(offs[k]) - 1);
    const reach = cutOff ? 0.8 * radius : Math.max(2, Math.min(0.6 * radius, pull));
    const fit = fitOutline(candidate.view, outline, here, reach, candidate.body, round ? [0] : TURNS);
    if (!cutOff && Math.abs(offs[k]) < 0.15 && fit.startScore > BETTER * fit.score) return [plain];
    if (fit.support < 0.45) return shape.area < 0.5 * usual[k].area ? [] : [{ ...plain, support: 0.5 * plain.support }];
    return [{ candidate, x: fit.x, y: fit.y, radius, support: fit.support }];
  });
}

/** Share of the frames on which a loop has to show, and how even the rest has to be, log of the area. */
const LOOP_FRAMES = 0.35;
const LOOP_SPREAD = 0.04;

/** A handle is there on most frames and leaves the same shape on all of them; a gap between pencil lines does not. */
function withoutWire(track: FoundTrack): FoundTrack {
  const logs = track.path.flatMap(({ bare }) => (bare ? [Math.log(bare.whole.area)] : []));
  if (logs.length < LOOP_FRAMES * track.path.length) return track;
  const middle = median(logs);
  if (median(logs.map((value) => Math.abs(value - middle))) > LOOP_SPREAD) return track;
  return trackOf(track.path.map((candidate) => (candidate.bare ? { ...candidate, ...candidate.bare } : candidate)));
}

function offsOf(track: FoundTrack, usual: Usual[]): number[] {
  return track.shapes.map((shape, k) => Math.log(shape.area / usual[k].area));
}

function oddOnes(offs: number[]): boolean[] {
  const spread = 1.5 * median(offs.map(Math.abs));
  return offs.map((off) => Math.abs(off) > Math.max(LEAST_ODDITY, 3 * spread));
}

const TURNS = Array.from({ length: 25 }, (_, k) => ((k - 12) * Math.PI) / 60);

/** What the thing looks like on a frame when nothing else touches it. */
interface Usual {
  area: number;
  /** Way that it goes during the exposure, px. */
  smear: { x: number; y: number };
}

/** Frames on either side that say how large the thing is where it comes nearer or goes away. */
const NEIGHBOURS = 9;

/** How large the thing is on each frame: of one size, smeared where it is fast, or growing where it comes nearer. */
function usualSizes(track: FoundTrack): Usual[] {
  const { path, shapes } = track;
  const velocity = velocities(track);
  const speed = velocity.map(({ x, y }) => Math.hypot(x, y));
  const free = path.map((_, k) => k).filter((k) => path[k].onEdge === 0);
  const moving = free.filter((k) => speed[k] > 1);
  const ks = moving.length >= 6 ? moving : free.length >= 3 ? free : path.map((_, k) => k);
  const logs = ks.map((k) => Math.log(shapes[k].area));
  const middle = median(logs);
  const flat = median(logs.map((value) => Math.abs(value - middle)));
  const times = ks.map((k) => path[k].index);
  const local = path.map((candidate) => localSize(candidate.index, times, logs));
  const rest = median(ks.map((k, n) => Math.abs(logs[n] - local[k])));
  const range = Math.max(...ks.map((k) => local[k])) - Math.min(...ks.map((k) => local[k]));
  const still = { x: 0, y: 0 };
  if (range > 0.25 && rest < 0.5 * flat) return local.map((value) => ({ area: Math.exp(value), smear: still }));

  const areas = ks.map((k) => shapes[k].area);
  const line = medianLine(
    ks.map((k) => speed[k]),
    areas,
  );
  const sharp = line.at - line.slope * line.time;
  const fastest = Math.max(...ks.map((k) => speed[k]));
  const smeared = line.slope * fastest > 0.06 * sharp && sharp > 0;
  const width = 2 * Math.sqrt(sharp / Math.PI);
  return path.map((_, k) => {
    if (!smeared) return { area: Math.exp(middle), smear: still };
    const perSpeed = line.slope / width;
    return {
      area: sharp + line.slope * speed[k],
      smear: { x: velocity[k].x * perSpeed, y: velocity[k].y * perSpeed },
    };
  });
}

/** Velocity in the picture on each frame from its neighbours on both sides, px/frame: that is what smears. */
function velocities({ path, shapes }: FoundTrack): { x: number; y: number }[] {
  const places = path.map((candidate, k) => ontoPicture(shapes[k], candidate.pose));
  return path.map((_, k) => {
    const before = Math.max(0, k - 1);
    const after = Math.min(path.length - 1, k + 1);
    const frames = Math.max(1, path[after].index - path[before].index);
    return { x: (places[after].x - places[before].x) / frames, y: (places[after].y - places[before].y) / frames };
  });
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

/** How much longer than wide a disc looks that is smeared too little to tell, log of the ratio. */
const LONGEST_STILL = 0.08;

/**
 * True for a disc, also one that is smeared along its way: short across, and everywhere as a disc moved along would be.
 * What does not smear and is longer than wide is an oval, and a disc laid over it would slide from end to end.
 */
function isRound(track: FoundTrack, odd: boolean[], usual: Usual[]): boolean {
  const clear = track.shapes.filter((_, k) => !odd[k] && track.path[k].onEdge === 0);
  if (clear.length < 3 || median(clear.map(offDisc)) >= 0.012) return false;
  const smeared = usual.some(({ smear }) => smear.x !== 0 || smear.y !== 0);
  return smeared || median(clear.map(({ long, short }) => Math.log(long / short))) < LONGEST_STILL;
}

/** Frames on which the radius of a disc is sought. */
const RIM_FRAMES = 7;

/**
 * How large a disc is against the area that its blurred edge and its smear give it: the radius under which the outline
 * stands out most, as a share of the radius of a disc of that area.
 */
function rimShare(track: FoundTrack, odd: boolean[], usual: Usual[]): number {
  const clear = track.path.map((_, k) => k).filter((k) => !odd[k] && track.path[k].onEdge === 0);
  const stride = Math.max(1, Math.floor(clear.length / RIM_FRAMES));
  const chosen = clear.filter((_, n) => n % stride === 0);
  let best = { share: 1, score: Number.NEGATIVE_INFINITY };
  for (let share = 0.8; share < 1.07; share += 0.03) {
    let score = 0;
    for (const k of chosen) {
      const { view, body } = track.path[k];
      const outline = discOutline(share * discRadius(usual[k]), usual[k].smear);
      const here = ontoPicture(track.shapes[k], track.path[k].pose);
      score += fitOutline(view, outline, here, 2, body, [0]).score / body;
    }
    if (score > best.score) best = { share, score };
  }
  return best.share;
}

/** Radius of the disc that has a frame's usual area when it is smeared as far as there. */
function discRadius({ area, smear }: Usual): number {
  const way = Math.hypot(smear.x, smear.y);
  return (Math.sqrt(way ** 2 + Math.PI * area) - way) / Math.PI;
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
  const { filled, view, pose } = track.path[nearest];
  const { x, y } = ontoPicture(track.shapes[nearest], pose);
  return outlineOf({ filled, x: x - view.left, y: y - view.top }, view.width, view.height);
}

function median(values: number[]): number {
  return values.toSorted((a, b) => a - b)[values.length >> 1];
}
