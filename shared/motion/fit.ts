import type { Knots, Path } from './path.ts';
import { follow, makeKnotsFor as makeKnots, placeKnots } from './path.ts';
import { factorCholesky, solveCholesky, substitute } from './solve.ts';

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
  const theta = Float64Array.from(start);
  const trial = new Float64Array(p);
  const knots: Knots = makeKnots(path);
  const xs = new Float64Array(n);
  const ys = new Float64Array(n);
  const tx = new Float64Array(n);
  const ty = new Float64Array(n);
  const jacobian = new Float64Array(2 * n * p);
  const normal = new Float64Array(p * p);
  const damped = new Float64Array(p * p);
  const gradient = new Float64Array(p);
  const step = new Float64Array(p);
  placeKnots(path, theta, knots);
  follow(path, theta, knots, samples.t, xs, ys);
  let rss = sumOfSquares(samples, xs, ys);
  let damping = 1e-4;
  for (let round = 0; round < most; round += 1) {
    differentiate(path, theta, samples, xs, ys, tx, ty, jacobian);
    gather(jacobian, samples, xs, ys, p, normal, gradient);
    let gained = 0;
    for (let attempt = 0; attempt < 6; attempt += 1) {
      damped.set(normal);
      step.set(gradient);
      for (let k = 0; k < p; k += 1) damped[k * p + k] = damped[k * p + k]! * (1 + damping) + 1e-12;
      if (solveCholesky(damped, step, p)) {
        for (let k = 0; k < p; k += 1) trial[k] = theta[k]! + step[k]!;
        placeKnots(path, trial, knots);
        if (inOrder(path, knots, trial)) {
          follow(path, trial, knots, samples.t, tx, ty);
          const now = sumOfSquares(samples, tx, ty);
          if (now < rss) {
            gained = rss - now;
            rss = now;
            theta.set(trial);
            xs.set(tx);
            ys.set(ty);
            damping = Math.max(1e-9, damping * 0.2);
            break;
          }
        }
      }
      damping = damping * 6 + 1e-7;
    }
    if (gained <= 1e-5 * rss + 1e-10) break;
  }
  placeKnots(path, theta, knots);
  return { path, theta, knots, xs, ys, rss };
}

/** Covariance of the parameters over noise² (row by row), or null where the marks do not decide them all. */
export function covariance(fit: PathFit, samples: Samples): Float64Array | null {
  const n = samples.t.length;
  const p = fit.path.size;
  const jacobian = new Float64Array(2 * n * p);
  const normal = new Float64Array(p * p);
  const gradient = new Float64Array(p);
  differentiate(fit.path, fit.theta, samples, fit.xs, fit.ys, new Float64Array(n), new Float64Array(n), jacobian);
  gather(jacobian, samples, fit.xs, fit.ys, p, normal, gradient);
  for (let k = 0; k < p; k += 1) normal[k * p + k] = normal[k * p + k]! * (1 + 1e-10) + 1e-14;
  if (!factorCholesky(normal, p)) return null;
  const inverse = new Float64Array(p * p);
  const column = new Float64Array(p);
  for (let k = 0; k < p; k += 1) {
    column.fill(0);
    column[k] = 1;
    substitute(normal, column, p);
    for (let i = 0; i < p; i += 1) inverse[i * p + k] = column[i]!;
  }
  return inverse;
}

/** One Gauss-Newton step of one parameter, all others moving along: its value after it, and its error over noise. */
export function fitStep(
  path: Path,
  theta: Float64Array,
  samples: Samples,
  at: number,
): { value: number; unit: number } | null {
  const fit = {
    path,
    theta,
    knots: makeKnots(path),
    xs: new Float64Array(samples.t.length),
    ys: new Float64Array(samples.t.length),
    rss: 0,
  };
  placeKnots(path, theta, fit.knots);
  follow(path, theta, fit.knots, samples.t, fit.xs, fit.ys);
  const n = samples.t.length;
  const p = path.size;
  const jacobian = new Float64Array(2 * n * p);
  const normal = new Float64Array(p * p);
  const step = new Float64Array(p);
  const unit = new Float64Array(p);
  differentiate(path, theta, samples, fit.xs, fit.ys, new Float64Array(n), new Float64Array(n), jacobian);
  gather(jacobian, samples, fit.xs, fit.ys, p, normal, step);
  for (let k = 0; k < p; k += 1) normal[k * p + k] = normal[k * p + k]! * (1 + 1e-10) + 1e-14;
  if (!factorCholesky(normal, p)) return null;
  substitute(normal, step, p);
  unit[at] = 1;
  substitute(normal, unit, p);
  return { value: theta[at]! + step[at]!, unit: Math.sqrt(Math.max(0, unit[at]!)) };
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
    if (path.shape.name === 'power' && (value < 0.5 || value > 12)) return false;
    if (path.shape.name === 'apex' && Math.abs(value) > 0.42) return false;
    if (path.shape.name === 'ease' && Math.abs(value) > 1.2) return false;
    if ((path.shape.name === 'hang' || path.shape.name === 'hang-up') && value < -2) return false;
    if (path.shape.name.startsWith('even') && Math.abs(value) > 1.4) return false;
  }
  return true;
}

function sumOfSquares(samples: Samples, xs: Float64Array, ys: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < xs.length; i += 1) {
    const w = samples.weight[i]!;
    if (w === 0) continue;
    const dx = samples.x[i]! - xs[i]!;
    const dy = samples.y[i]! - ys[i]!;
    sum += w * (dx * dx + dy * dy);
  }
  return Number.isFinite(sum) ? sum : Infinity;
}

/** Slopes of every place by every parameter, by forward differences: row 2i is x of drawing i, row 2i+1 its y. */
function differentiate(
  path: Path,
  theta: Float64Array,
  samples: Samples,
  xs: Float64Array,
  ys: Float64Array,
  tx: Float64Array,
  ty: Float64Array,
  jacobian: Float64Array,
): void {
  const n = samples.t.length;
  const p = path.size;
  const knots = makeKnots(path);
  for (let k = 0; k < p; k += 1) {
    const value = theta[k]!;
    const small =
      k >= path.gravities && k !== path.shapeAt && !isTime(path, k) && !isDepth(path, k)
        ? 1e-3
        : 1e-6 * Math.max(1e-2, Math.abs(value));
    theta[k] = value + small;
    const moved = theta[k]! - value;
    placeKnots(path, theta, knots);
    follow(path, theta, knots, samples.t, tx, ty);
    theta[k] = value;
    for (let i = 0; i < n; i += 1) {
      jacobian[2 * i * p + k] = (tx[i]! - xs[i]!) / moved;
      jacobian[(2 * i + 1) * p + k] = (ty[i]! - ys[i]!) / moved;
    }
  }
}

function isTime(path: Path, k: number): boolean {
  return path.timeAt.includes(k);
}

function isDepth(path: Path, k: number): boolean {
  return path.depthAt >= 0 && (k === path.depthAt || k === path.depthAt + 1);
}

function gather(
  jacobian: Float64Array,
  samples: Samples,
  xs: Float64Array,
  ys: Float64Array,
  p: number,
  normal: Float64Array,
  gradient: Float64Array,
): void {
  normal.fill(0);
  gradient.fill(0);
  for (let i = 0; i < xs.length; i += 1) {
    const w = samples.weight[i]!;
    if (w === 0) continue;
    const rx = w * (samples.x[i]! - xs[i]!);
    const ry = w * (samples.y[i]! - ys[i]!);
    const ax = 2 * i * p;
    const ay = ax + p;
    for (let a = 0; a < p; a += 1) {
      const ja = jacobian[ax + a]!;
      const jb = jacobian[ay + a]!;
      if (ja === 0 && jb === 0) continue;
      gradient[a] = gradient[a]! + ja * rx + jb * ry;
      const row = a * p;
      for (let b = 0; b <= a; b += 1)
        normal[row + b] = normal[row + b]! + w * (ja * jacobian[ax + b]! + jb * jacobian[ay + b]!);
    }
  }
  for (let a = 0; a < p; a += 1) for (let b = a + 1; b < p; b += 1) normal[a * p + b] = normal[b * p + a]!;
}
