import type { PathFit, Samples } from './fit.ts';
import type { Path } from './path.ts';
import { follow, makeKnotsFor, placeKnots } from './path.ts';
import { differentiate, gather, roomFor } from './slopes.ts';
import { factorCholesky, substitute } from './solve.ts';

/** A fit made ready for score tests: its slopes, the factor of its normal matrix and its residuals, worked out once. */
export interface ScoreBase {
  fit: PathFit;
  samples: Samples;
  slopes: Float64Array;
  from: Int32Array;
  to: Int32Array;
  factor: Float64Array;
  /** Where one Gauss-Newton step of the base itself would go; next to nothing at the end of a fit. */
  rest: Float64Array;
}

/** What one step of one more number promises: where it goes, its error over noise, and what it gains in squares. */
export interface Score {
  step: number;
  unit: number;
  gain: number;
}

/** Prepares a fit; null where its marks do not decide its parameters. */
export function scoreBase(fit: PathFit, samples: Samples): ScoreBase | null {
  const n = samples.t.length;
  const p = fit.path.size;
  const room = roomFor(n, p);
  differentiate(fit.path, fit.theta, samples, fit.xs, fit.ys, room);
  gather(samples, fit.xs, fit.ys, p, room);
  const factor = room.normal.slice(0, p * p);
  for (let k = 0; k < p; k += 1) {
    const own = factor[k * p + k]!;
    factor[k * p + k] = own > 1e-9 ? own * (1 + 1e-9) : 1;
  }
  if (!factorCholesky(factor, p)) return null;
  const rest = room.gradient.slice(0, p);
  substitute(factor, rest, p);
  const slopes = new Float64Array(2 * n * p);
  const from = room.from.slice(0, p);
  const to = room.to.slice(0, p);
  for (let k = 0; k < p; k += 1) {
    for (let i = from[k]!; i < to[k]!; i += 1) {
      if (room.moves[k]! & 1) slopes[2 * n * k + i] = room.rows[2 * k * room.stride + i]!;
      if (room.moves[k]! & 2) slopes[2 * n * k + n + i] = room.rows[2 * k * room.stride + room.stride + i]!;
    }
  }
  return { fit, samples, slopes, from, to, factor, rest };
}

/** Scores the shape number of `path`, which is the base's path with a shape at nothing on one of its spans. */
export function scoreShape(base: ScoreBase, path: Path, theta: Float64Array): Score | null {
  const { samples } = base;
  const n = samples.t.length;
  const knots = makeKnotsFor(path);
  placeKnots(path, theta, knots);
  const span = path.shape!.span;
  const from = firstAfter(samples.t, knots.t[span]!);
  const to = firstAfter(samples.t, knots.t[span + 1]!);
  const plain = { xs: new Float64Array(n), ys: new Float64Array(n) };
  const bent = { xs: new Float64Array(n), ys: new Float64Array(n) };
  follow(path, theta, knots, samples.t, plain.xs, plain.ys, from, to);
  const nothing = theta[path.shapeAt]!;
  theta[path.shapeAt] = nothing + 1e-6;
  follow(path, theta, knots, samples.t, bent.xs, bent.ys, from, to);
  const inverse = 1 / (theta[path.shapeAt]! - nothing);
  theta[path.shapeAt] = nothing;
  for (let i = from; i < to; i += 1) {
    bent.xs[i] = (bent.xs[i]! - plain.xs[i]!) * inverse;
    bent.ys[i] = (bent.ys[i]! - plain.ys[i]!) * inverse;
  }
  return scoreColumn(base, bent.xs, bent.ys, from, to);
}

/** Scores a gravity of its own for one span: the base's gravity column, over that span's drawings alone. */
export function scoreGravity(base: ScoreBase, span: number): Score | null {
  const { fit, samples, slopes } = base;
  const n = samples.t.length;
  const at = fit.path.spans[span]!.gravity;
  const from = firstAfter(samples.t, fit.knots.t[span]!);
  const to = firstAfter(samples.t, fit.knots.t[span + 1]!);
  const start = 2 * n * at;
  return scoreColumn(base, slopes.subarray(start, start + n), slopes.subarray(start + n, start + 2 * n), from, to);
}

function scoreColumn(base: ScoreBase, cx: Float64Array, cy: Float64Array, from: number, to: number): Score | null {
  const { fit, samples, slopes, factor } = base;
  const n = samples.t.length;
  const p = fit.path.size;
  const cross = new Float64Array(p);
  let own = 0;
  let pull = 0;
  for (let i = from; i < to; i += 1) {
    const w = samples.weight[i]!;
    own += w * (cx[i]! * cx[i]! + cy[i]! * cy[i]!);
    pull += w * (cx[i]! * (samples.x[i]! - fit.xs[i]!) + cy[i]! * (samples.y[i]! - fit.ys[i]!));
  }
  for (let k = 0; k < p; k += 1) {
    let sum = 0;
    const end = Math.min(to, base.to[k]!);
    for (let i = Math.max(from, base.from[k]!); i < end; i += 1) {
      sum += samples.weight[i]! * (cx[i]! * slopes[2 * n * k + i]! + cy[i]! * slopes[2 * n * k + n + i]!);
    }
    cross[k] = sum;
  }
  for (let k = 0; k < p; k += 1) pull -= cross[k]! * base.rest[k]!;
  const solved = Float64Array.from(cross);
  substitute(factor, solved, p);
  let left = own;
  for (let k = 0; k < p; k += 1) left -= cross[k]! * solved[k]!;
  if (!(left > 1e-12 * own) || !(own > 0)) return null;
  return { step: pull / left, unit: 1 / Math.sqrt(left), gain: (pull * pull) / left };
}

function firstAfter(times: Float64Array, time: number): number {
  let i = 0;
  while (i < times.length && times[i]! <= time) i += 1;
  return i;
}
