import type { Path } from './path.ts';
import { warpTime } from './shapes.ts';

/** Places of the knots for given parameters, written into the four arrays of `out`. */
export interface Knots {
  t: Float64Array;
  x: Float64Array;
  y: Float64Array;
}

export function placeKnots(path: Path, theta: Float64Array, out: Knots): void {
  const knots = path.spans.length + 1;
  for (let k = 0; k < knots; k += 1) {
    out.t[k] = path.timeAt[k]! >= 0 ? theta[path.timeAt[k]!]! : path.fixedTime[k]!;
    out.x[k] = path.xAt[k]! >= 0 ? theta[path.xAt[k]!]! : out.x[k - 1]!;
    if (path.yAt[k]! >= 0) out.y[k] = theta[path.yAt[k]!]!;
    else {
      const before = path.spans[k - 1]!;
      const span = out.t[k]! - out.t[k - 1]!;
      out.y[k] = out.y[k - 1]!;
      if (before.kind === 'flight') {
        const slope =
          path.spans[k - 2]?.kind === 'roll' ? (out.y[k - 1]! - out.y[k - 2]!) / (out.t[k - 1]! - out.t[k - 2]!) : 0;
        out.y[k] = out.y[k]! + span * (slope + 0.5 * theta[before.gravity]! * span);
      }
    }
  }
}

/** Room for the places of a path's knots. */
export function makeKnotsFor(path: Path): Knots {
  const size = path.spans.length + 1;
  return { t: new Float64Array(size), x: new Float64Array(size), y: new Float64Array(size) };
}

const warped = new Float64Array(2);

/**
 * Where the thing is at every time of `times` (ascending), written into `xs` and `ys` from `from` up to `to`.
 * `knots` must hold the places of the knots for these parameters.
 */
export function follow(
  path: Path,
  theta: Float64Array,
  knots: Knots,
  times: Float64Array,
  xs: Float64Array,
  ys: Float64Array,
  from = 0,
  to = times.length,
): void {
  const { spans } = path;
  const last = spans.length - 1;
  let i = from;
  for (let s = 0; s <= last && i < to; s += 1) {
    const end = s === last ? Infinity : knots.t[s + 1]!;
    const begin = i;
    while (i < to && times[i]! - (i >= path.delayFrom ? path.delay : 0) <= end) i += 1;
    if (i > begin) followSpan(path, theta, knots, s, times, xs, ys, begin, i);
  }
  if (path.depthAt >= 0) lookFrom(path, theta, knots, times, xs, ys, from, to);
}

/** Places along one span, as if seen flat. */
function followSpan(
  path: Path,
  theta: Float64Array,
  knots: Knots,
  s: number,
  times: Float64Array,
  xs: Float64Array,
  ys: Float64Array,
  from: number,
  to: number,
): void {
  const span = path.spans[s]!;
  const x0 = knots.x[s]!;
  const y0 = knots.y[s]!;
  if (span.kind === 'rest') {
    xs.fill(x0, from, to);
    ys.fill(y0, from, to);
    return;
  }
  const start = knots.t[s]!;
  const length = knots.t[s + 1]! - start;
  const dx = knots.x[s + 1]! - x0;
  const dy = knots.y[s + 1]! - y0;
  const g = span.kind === 'flight' ? theta[span.gravity]! : 0;
  const { shape, delayFrom, delay } = path;
  if (!shape || shape.span !== s) {
    const vx = dx / length;
    const vy = dy / length - 0.5 * g * length;
    for (let i = from; i < to; i += 1) {
      const u = times[i]! - (i >= delayFrom ? delay : 0) - start;
      xs[i] = x0 + vx * u;
      ys[i] = y0 + u * (vy + 0.5 * g * u);
    }
    return;
  }
  const held = shape.name === 'hang' || shape.name === 'hang-up' ? theta[path.shapeAt]! : 0;
  const lengthY = length - held;
  const vx = dx / (shape.name === 'hang' ? lengthY : length);
  const vy = dy / lengthY - 0.5 * g * lengthY;
  const across = Math.max(Math.abs(dx), 1e-3 * Math.abs(g) * length * length);
  const apex = lengthY / 2 - dy / (lengthY * g);
  const bend = (g * length) / across;
  for (let i = from; i < to; i += 1) {
    const u = times[i]! - (i >= delayFrom ? delay : 0) - start;
    warpTime(shape, theta, path.shapeAt, u, lengthY, apex, bend, warped);
    const uy = warped[1]!;
    xs[i] = x0 + vx * warped[0]!;
    ys[i] = y0 + uy * (vy + 0.5 * g * uy);
  }
}

/** Divides places by their depth: relative depth speed while the thing moves, and the share of depth per px of height. */
function lookFrom(
  path: Path,
  theta: Float64Array,
  knots: Knots,
  times: Float64Array,
  xs: Float64Array,
  ys: Float64Array,
  from: number,
  to: number,
): void {
  const { spans, depthAt, delayFrom, delay } = path;
  const last = spans.length - 1;
  const moveFrom = spans[0]!.kind === 'rest' ? knots.t[1]! : -Infinity;
  const moveTo = spans[last]!.kind === 'rest' && last > 0 ? knots.t[last]! : Infinity;
  const speed = theta[depthAt]!;
  const tilt = theta[depthAt + 1]!;
  for (let i = from; i < to; i += 1) {
    const t = times[i]! - (i >= delayFrom ? delay : 0);
    const moving = t < moveFrom ? moveFrom : t > moveTo ? moveTo : t;
    const away = 1 + speed * moving + tilt * ys[i]!;
    xs[i] = xs[i]! / away;
    ys[i] = ys[i]! / away;
  }
}
