import type { Knots } from './follow.ts';
import type { Path } from './path.ts';
import { follow, makeKnotsFor as makeKnots, placeKnots } from './follow.ts';
import { factorCholesky, solveCholesky, substitute } from './solve.ts';
import type { Slopes } from './slopes.ts';
import { differentiate, gather, roomFor } from './slopes.ts';

/** What a path is fitted to: drawing times (ascending, frames) and places (px), with the weight of each (0 leaves it out). */
export interface Samples {
  t: Float64Array;
  x: Float64Array;
  y: Float64Array;
  weight: Float64Array;
}

/** A path with the parameters that fit best. */
export interface PathFit {
  path: Path;
  theta: Float64Array;
  knots: Knots;
  /** Where the path stands at every drawing. */
  xs: Float64Array;
  ys: Float64Array;
  rss: number;
}

const SHORTEST_SPAN = 0.4;

/** Fits a path by the method of Levenberg and Marquardt (Marquardt 1963), from `start`; stops when a step gains nothing. */
export function fitPath(path: Path, start: Float64Array, samples: Samples, most = 12): PathFit {
  const n = samples.t.length;
  const p = path.size;
  const room = roomFor(n, p);
  const { tx, ty, normal, damped, gradient, step, trial } = room;
  const theta = Float64Array.from(start);
  const knots = makeKnots(path);
  const xs = new Float64Array(n);
  const ys = new Float64Array(n);
  placeKnots(path, theta, knots);
  follow(path, theta, knots, samples.t, xs, ys);
  let rss = sumOfSquares(samples, xs, ys);
  let damping = 1e-4;
  for (let round = 0; round < most; round += 1) {
    differentiate(path, theta, samples, xs, ys, room);
    gather(samples, xs, ys, p, room);
    let gained = 0;
    for (let attempt = 0; attempt < 6; attempt += 1) {
      for (let k = 0; k < p * p; k += 1) damped[k] = normal[k]!;
      for (let k = 0; k < p; k += 1) {
        step[k] = gradient[k]!;
        damped[k * p + k] = damped[k * p + k]! * (1 + damping) + 1e-12;
      }
      if (solveCholesky(damped, step, p)) {
        for (let k = 0; k < p; k += 1) trial[k] = theta[k]! + step[k]!;
        placeKnots(path, trial, knots);
        if (inOrder(path, knots, trial)) {
          follow(path, trial, knots, samples.t, tx, ty, 0, n);
          const now = sumOfSquares(samples, tx, ty);
          if (now < rss) {
            gained = rss - now;
            rss = now;
            for (let k = 0; k < p; k += 1) theta[k] = trial[k]!;
            for (let i = 0; i < n; i += 1) {
              xs[i] = tx[i]!;
              ys[i] = ty[i]!;
            }
            damping = Math.max(1e-9, damping * 0.2);
            break;
          }
        }
      }
      damping = damping * 6 + 1e-7;
    }
    if (gained <= 1e-4 * rss + 1e-9) break;
  }
  placeKnots(path, theta, knots);
  return { path, theta, knots, xs, ys, rss };
}

/** Factor of the normal matrix of a fit, left in `room.normal`; false where the marks do not decide all parameters. */
function factorOf(fit: PathFit, samples: Samples, room: Slopes): boolean {
  const p = fit.path.size;
  differentiate(fit.path, fit.theta, samples, fit.xs, fit.ys, room);
  gather(samples, fit.xs, fit.ys, p, room);
  const { normal } = room;
  for (let k = 0; k < p; k += 1) {
    const own = normal[k * p + k]!;
    normal[k * p + k] = own > 1e-9 ? own * (1 + 1e-9) : 1;
  }
  return factorCholesky(normal, p);
}

/** Covariance of the parameters over noise² (row by row), or null where the marks do not decide them all. */
export function covariance(fit: PathFit, samples: Samples): Float64Array | null {
  const p = fit.path.size;
  const room = roomFor(samples.t.length, p);
  if (!factorOf(fit, samples, room)) return null;
  const inverse = new Float64Array(p * p);
  const column = new Float64Array(p);
  for (let k = 0; k < p; k += 1) {
    column.fill(0);
    column[k] = 1;
    substitute(room.normal, column, p);
    for (let i = 0; i < p; i += 1) inverse[i * p + k] = column[i]!;
  }
  return inverse;
}

/**
 * One Gauss-Newton step of one parameter, all others moving along: its value after it, its error over noise, and by how much
 * the step should lower the residual sum of squares.
 */
export function fitStep(
  path: Path,
  theta: Float64Array,
  samples: Samples,
  at: number,
): { value: number; unit: number; gain: number } | null {
  const n = samples.t.length;
  const fit: PathFit = {
    path,
    theta,
    knots: makeKnots(path),
    xs: new Float64Array(n),
    ys: new Float64Array(n),
    rss: 0,
  };
  placeKnots(path, theta, fit.knots);
  follow(path, theta, fit.knots, samples.t, fit.xs, fit.ys);
  const p = path.size;
  const room = roomFor(n, p);
  if (!factorOf(fit, samples, room)) return null;
  const step = room.step;
  for (let k = 0; k < p; k += 1) step[k] = room.gradient[k]!;
  substitute(room.normal, step, p);
  const unit = room.trial;
  unit.fill(0, 0, p);
  unit[at] = 1;
  substitute(room.normal, unit, p);
  let gain = 0;
  for (let k = 0; k < p; k += 1) gain += step[k]! * room.gradient[k]!;
  return { value: theta[at]! + step[at]!, unit: Math.sqrt(Math.max(0, unit[at]!)), gain };
}

function inOrder(path: Path, knots: Knots, theta: Float64Array): boolean {
  for (let k = 1; k < knots.t.length; k += 1) {
    if (knots.t[k]! - knots.t[k - 1]! < SHORTEST_SPAN && path.spans[k - 1]!.kind !== 'rest') return false;
    if (knots.t[k]! < knots.t[k - 1]!) return false;
  }
  for (let g = 0; g < path.gravities; g += 1) if (!(theta[g]! > 0)) return false;
  if (path.shape) {
    const value = theta[path.shapeAt]!;
    if (!Number.isFinite(value)) return false;
    if (path.shape.name.startsWith('power') && (value < 0.5 || value > 12)) return false;
    if (path.shape.name === 'drag' && (value < 0 || value > 4)) return false;
    if (path.shape.name === 'apex' && Math.abs(value) > 0.42) return false;
    if (path.shape.name === 'ease' && Math.abs(value) > 1.2) return false;
    if (path.shape.name === 'hang' || path.shape.name === 'hang-up') {
      const span = path.shape.span;
      if (value < 0 || value > 0.8 * (knots.t[span + 1]! - knots.t[span]!)) return false;
    }
    if (path.shape.name.startsWith('even') && Math.abs(value) > 1.4) return false;
  }
  return true;
}

function sumOfSquares(samples: Samples, xs: Float64Array, ys: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < samples.t.length; i += 1) {
    const w = samples.weight[i]!;
    if (w === 0) continue;
    const dx = samples.x[i]! - xs[i]!;
    const dy = samples.y[i]! - ys[i]!;
    sum += w * (dx * dx + dy * dy);
  }
  return Number.isFinite(sum) ? sum : Infinity;
}
