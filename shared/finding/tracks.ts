import type { Candidate } from './candidates.ts';
import type { Path } from './link.ts';
import type { Shape } from './measure.ts';

/** One thing over the frames it shows on, with what tells a thing from a shadow, a reflection or a counter. */
export interface FoundTrack {
  path: Path;
  /** The shape taken on each frame, in the order of `path`. */
  shapes: Shape[];
  /** Area that the thing has on the nearest frames on which nothing darkens the ground beside it, px². */
  local: number[];
  /** Largest distance between two of its places, px. */
  extent: number;
  /** Usual radius of a disc of the same area, px. */
  radius: number;
  contrast: number;
  shadowShare: number;
  /** How much the path is that of something thrown: frames in motion times how clearly it shows. */
  weight: number;
}

/** Describes a path as a track; the better of the two measured shapes is taken on each frame. */
export function trackOf(path: Path): FoundTrack {
  const moving = path.filter((candidate, k) => k > 0 && distance(candidate, path[k - 1]) > 1);
  const typical = moving.length >= 5 ? moving : path;
  const area = median(typical.map((candidate) => candidate.whole.area));
  const local = localAreas(path, area);
  const shapes = path.map((candidate, k) => likelier(candidate, local[k]));
  const xs = shapes.map((shape) => shape.x);
  const ys = shapes.map((shape) => shape.y);
  const extent = Math.hypot(Math.max(...xs) - Math.min(...xs), Math.max(...ys) - Math.min(...ys));
  const contrast = median(path.map((candidate) => candidate.contrast));
  const shadowShare = median(typical.map((candidate) => candidate.shadowShare));
  const radius = Math.sqrt(area / Math.PI);
  const weight = moving.length * Math.min(1, contrast / 60) * Math.min(1, extent / (4 * radius)) * Math.sqrt(radius);
  return { path, shapes, local, extent, radius, contrast, shadowShare, weight };
}

/** Share of darkened ground up to which a frame shows the thing without its shadow. */
const CLEAR = 0.2;
const NEAREST = 5;

function localAreas(path: Path, otherwise: number): number[] {
  const clear = path.filter((candidate) => candidate.shadowShare < CLEAR && candidate.onEdge === 0);
  return path.map((candidate) => {
    if (clear.length < NEAREST) return otherwise;
    const near = clear
      .toSorted((a, b) => Math.abs(a.index - candidate.index) - Math.abs(b.index - candidate.index))
      .slice(0, NEAREST);
    return median(near.map(({ whole }) => whole.area));
  });
}

function likelier(candidate: Candidate, area: number): Shape {
  const { whole, lit } = candidate;
  if (!lit) return whole;
  const off = (shape: Shape): number => Math.abs(Math.log(shape.area / area));
  return off(lit) + 0.04 < off(whole) ? lit : whole;
}

/**
 * The things among the tracks, the likeliest first: what stays in place is a counter or a blemish, what follows a
 * stronger thing is its shadow or its reflection.
 */
export function thingsAmong(tracks: FoundTrack[]): FoundTrack[] {
  const movers = tracks.filter(isMover);
  const byWeight = movers.toSorted((a, b) => b.weight - a.weight);
  const things: FoundTrack[] = [];
  for (const track of byWeight) {
    if (things.some((thing) => isCompanion(track, thing))) continue;
    if (things.length > 0 && !isComparable(track, things[0])) continue;
    things.push(track);
  }
  // A shadow that shows on more frames than its thing comes first by weight, and goes once the thing is known.
  return things.filter((track) => !things.some((thing) => thing !== track && isCastBy(track, thing))).slice(0, 3);
}

/** Steps in px over which a place counts as another one. */
const PLACE = 2;

/** What moves comes to new places; the digits of a counter go back and forth between a few. */
function isMover({ path, shapes, extent, radius }: FoundTrack): boolean {
  if (path.length < 4 || extent <= Math.max(8, 0.8 * radius)) return false;
  const places: Shape[] = [];
  let steps = 0;
  shapes.forEach((shape, k) => {
    const isAt = (place: Shape): boolean => Math.hypot(shape.x - place.x, shape.y - place.y) <= PLACE;
    if (k > 0 && !isAt(shapes[k - 1])) steps++;
    if (!places.some(isAt)) places.push(shape);
  });
  return places.length >= Math.max(4, 0.35 * steps);
}

function isComparable(track: FoundTrack, first: FoundTrack): boolean {
  return (
    track.weight > 0.15 * first.weight && track.radius > 0.4 * first.radius && track.contrast > 0.3 * first.contrast
  );
}

function isCompanion(track: FoundTrack, thing: FoundTrack): boolean {
  const fainter = track.contrast < 0.6 * thing.contrast || track.shadowShare > 0.8;
  return fainter && goesAlong(track, thing);
}

function isCastBy(track: FoundTrack, thing: FoundTrack): boolean {
  return track.shadowShare > 0.8 && thing.shadowShare < 0.6 && goesAlong(track, thing);
}

/** True when the track's place across follows the thing's, whatever its height does. */
function goesAlong(track: FoundTrack, thing: FoundTrack): boolean {
  const at = new Map(thing.path.map((candidate, k) => [candidate.index, thing.shapes[k]]));
  const pairs: [number, number][] = [];
  track.path.forEach((candidate, k) => {
    const other = at.get(candidate.index);
    if (other) pairs.push([other.x, track.shapes[k].x]);
  });
  if (pairs.length < 4) return false;
  const meanX = mean(pairs.map(([x]) => x));
  const meanY = mean(pairs.map(([, y]) => y));
  const xx = mean(pairs.map(([x]) => (x - meanX) ** 2));
  const xy = mean(pairs.map(([x, y]) => (x - meanX) * (y - meanY)));
  const yy = mean(pairs.map(([, y]) => (y - meanY) ** 2));
  if (xx < 1 || yy < 1) return Math.abs(xx - yy) < 4;
  return xy > 0 && (xy * xy) / (xx * yy) > 0.85;
}

function distance(a: Candidate, b: Candidate): number {
  return Math.hypot(a.whole.x - b.whole.x, a.whole.y - b.whole.y);
}

function mean(values: number[]): number {
  return values.reduce((sum, value) => sum + value, 0) / values.length;
}

function median(values: number[]): number {
  return values.toSorted((a, b) => a - b)[values.length >> 1];
}
