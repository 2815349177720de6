import type { Samples } from './fit.ts';
import type { Knots } from './follow.ts';
import type { Path } from './path.ts';
import { follow, makeKnotsFor, placeKnots } from './follow.ts';

/** Working room of a fit, used again from fit to fit: slopes of every place by every parameter, and the normal equations. */
export interface Slopes {
  /** Row k holds the slopes of all x, then of all y, by parameter k; outside `from[k]`…`to[k]` they are zero and not written. */
  rows: Float64Array;
  stride: number;
  from: Int32Array;
  to: Int32Array;
  /** Per parameter: whether it moves x (1), y (2) or both (3). */
  moves: Uint8Array;
  tx: Float64Array;
  ty: Float64Array;
  wx: Float64Array;
  wy: Float64Array;
  normal: Float64Array;
  damped: Float64Array;
  gradient: Float64Array;
  step: Float64Array;
  trial: Float64Array;
}

let shared: Slopes | null = null;
let sharedMarks = 0;
let sharedSize = 0;

/** Room for `n` drawings and `p` parameters. */
export function roomFor(n: number, p: number): Slopes {
  if (!shared || n > sharedMarks || p > sharedSize) {
    sharedMarks = Math.max(n, sharedMarks, 64);
    sharedSize = Math.max(p, sharedSize, 24);
    shared = {
      rows: new Float64Array(sharedSize * 2 * sharedMarks),
      stride: sharedMarks,
      from: new Int32Array(sharedSize),
      to: new Int32Array(sharedSize),
      moves: new Uint8Array(sharedSize),
      tx: new Float64Array(sharedMarks),
      ty: new Float64Array(sharedMarks),
      wx: new Float64Array(sharedMarks),
      wy: new Float64Array(sharedMarks),
      normal: new Float64Array(sharedSize * sharedSize),
      damped: new Float64Array(sharedSize * sharedSize),
      gradient: new Float64Array(sharedSize),
      step: new Float64Array(sharedSize),
      trial: new Float64Array(sharedSize),
    };
  }
  return shared;
}

/** Step of the forward difference of each parameter: times and places in their own units, depth and gravity relative. */
function differenceOf(path: Path, k: number, value: number): number {
  if (path.depthAt >= 0 && (k === path.depthAt || k === path.depthAt + 1)) return 1e-8;
  if (k < path.gravities) return 1e-6 * Math.max(1e-3, Math.abs(value));
  if (k === path.shapeAt) return 1e-6;
  return 1e-5;
}

/** Slopes of every place by every parameter, by forward differences over the drawings that the parameter reaches. */
export function differentiate(
  path: Path,
  theta: Float64Array,
  samples: Samples,
  xs: Float64Array,
  ys: Float64Array,
  room: Slopes,
): void {
  const p = path.size;
  const knots: Knots = makeKnotsFor(path);
  const moved: Knots = makeKnotsFor(path);
  placeKnots(path, theta, knots);
  const first = firstDrawings(path, knots, samples.t);
  const { rows, stride, tx, ty } = room;
  for (let k = 0; k < p; k += 1) {
    const from = first[path.reach[2 * k]!]!;
    const to = first[path.reach[2 * k + 1]! + 1]!;
    room.from[k] = from;
    room.to[k] = to;
    room.moves[k] = 3;
    if (path.straight[k]! >= 0) {
      room.moves[k] = path.xAt[path.straight[k]!] === k ? 1 : 2;
      straightSlopes(path, knots, samples.t, path.straight[k]!, k, first, room);
      continue;
    }
    const value = theta[k]!;
    theta[k] = value + differenceOf(path, k, value);
    const inverse = 1 / (theta[k]! - value);
    placeKnots(path, theta, moved);
    follow(path, theta, moved, samples.t, tx, ty, from, to);
    theta[k] = value;
    const x = 2 * k * stride;
    const y = x + stride;
    for (let i = from; i < to; i += 1) {
      rows[x + i] = (tx[i]! - xs[i]!) * inverse;
      rows[y + i] = (ty[i]! - ys[i]!) * inverse;
    }
  }
}

/**
 * Slopes by the place of a knot where the path depends on it in a straight line: the share of the way between the knots
 * around it. `knot` is the first knot that the parameter places; those tied to it move along.
 */
function straightSlopes(
  path: Path,
  knots: Knots,
  times: Float64Array,
  knot: number,
  parameter: number,
  first: Int32Array,
  room: Slopes,
): void {
  const { rows, stride } = room;
  const across = path.xAt[knot] === parameter;
  const at = across ? path.xAt : path.yAt;
  const main = 2 * parameter * stride + (across ? 0 : stride);
  let tied = knot;
  while (tied + 1 < at.length && at[tied + 1]! < 0) tied += 1;
  for (let s = Math.max(0, knot - 1); s <= Math.min(path.spans.length - 1, tied); s += 1) {
    const begins = s >= knot && s <= tied ? 1 : 0;
    const ends = s + 1 >= knot && s + 1 <= tied ? 1 : 0;
    const start = knots.t[s]!;
    const rate = (ends - begins) / (knots.t[s + 1]! - start || 1);
    for (let i = first[s]!; i < first[s + 1]!; i += 1) {
      const t = times[i]! - (i >= path.delayFrom ? path.delay : 0);
      rows[main + i] = path.spans[s]!.kind === 'rest' ? 1 : begins + rate * (t - start);
    }
  }
}

/** Index of the first drawing of every span, and of the end. */
function firstDrawings(path: Path, knots: Knots, times: Float64Array): Int32Array {
  const spans = path.spans.length;
  const first = new Int32Array(spans + 1);
  first[spans] = times.length;
  let i = 0;
  for (let s = 1; s < spans; s += 1) {
    while (i < times.length && times[i]! - (i >= path.delayFrom ? path.delay : 0) <= knots.t[s]!) i += 1;
    first[s] = i;
  }
  return first;
}

/** Normal matrix and gradient of the weighted residuals, from slopes worked out before. */
export function gather(samples: Samples, xs: Float64Array, ys: Float64Array, p: number, room: Slopes): void {
  const { rows, stride, from, to, normal, gradient, tx, ty, wx, wy } = room;
  const { weight } = samples;
  for (let i = 0; i < xs.length; i += 1) {
    tx[i] = weight[i]! * (samples.x[i]! - xs[i]!);
    ty[i] = weight[i]! * (samples.y[i]! - ys[i]!);
  }
  for (let a = 0; a < p; a += 1) {
    const ax = 2 * a * stride;
    const ay = ax + stride;
    let slope = 0;
    const moves = room.moves[a]!;
    if (moves & 1) for (let i = from[a]!; i < to[a]!; i += 1) slope += rows[ax + i]! * tx[i]!;
    if (moves & 2) for (let i = from[a]!; i < to[a]!; i += 1) slope += rows[ay + i]! * ty[i]!;
    gradient[a] = slope;
    // The row times the weights, once for all the rows it meets.
    for (let i = from[a]!; i < to[a]!; i += 1) {
      const w = weight[i]!;
      wx[i] = w * rows[ax + i]!;
      wy[i] = w * rows[ay + i]!;
    }
    for (let b = 0; b <= a; b += 1) {
      const bx = 2 * b * stride;
      const by = bx + stride;
      const start = Math.max(from[a]!, from[b]!);
      const end = Math.min(to[a]!, to[b]!);
      let sum = 0;
      const both = moves & room.moves[b]!;
      if (both & 1) for (let i = start; i < end; i += 1) sum += wx[i]! * rows[bx + i]!;
      if (both & 2) for (let i = start; i < end; i += 1) sum += wy[i]! * rows[by + i]!;
      normal[a * p + b] = sum;
      normal[b * p + a] = sum;
    }
  }
}
