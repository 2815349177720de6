import type { PathFit, Samples } from './fit.ts';
import { follow } from './follow.ts';
import type { Shape, ShapeName } from './shapes.ts';
import { SHAPE_NOTHING } from './shapes.ts';
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

/** Scores the number of a shape at nothing on one span of the base that carries no shape yet. */
export function scoreShape(base: ScoreBase, name: ShapeName, span: number): Score | null {
  const { samples, fit } = base;
  const { path, knots } = fit;
  const n = samples.t.length;
  const from = firstAfter(samples.t, knots.t[span]!);
  const to = firstAfter(samples.t, knots.t[span + 1]!);
  const last = path.spans.length - 1;
  const shape: Shape = { name, span, parameters: 1, openStart: span === 0, openEnd: span === last };
  const theta = new Float64Array(path.size + 1);
  theta.set(fit.theta);
  theta[path.size] = SHAPE_NOTHING[name] + SMALL;
  const bent = { ...path, shape, shapeAt: path.size, size: path.size + 1 };
  const xs = new Float64Array(n);
  const ys = new Float64Array(n);
  follow(bent, theta, knots, samples.t, xs, ys, from, to);
  const inverse = 1 / (theta[path.size]! - SHAPE_NOTHING[name]);
  for (let i = from; i < to; i += 1) {
    xs[i] = (xs[i]! - fit.xs[i]!) * inverse;
    ys[i] = (ys[i]! - fit.ys[i]!) * inverse;
  }
  return scoreColumn(base, xs, ys, from, to);
}

/** Step of the forward difference of a shape's number. */
const SMALL = 1e-6;

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
