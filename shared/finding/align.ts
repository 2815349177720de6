import type { Grey } from './phaseCorrelation.ts';
import type { Picture } from './types.ts';

/** Where a picture lies on the stage: stage = picture / zoom + (dx, dy), px. */
export interface Pose {
  dx: number;
  dy: number;
  zoom: number;
}

export function greyOf(picture: Picture): Grey {
  const data = new Float32Array(picture.width * picture.height);
  for (let pixel = 0, at = 0; pixel < data.length; pixel++, at += 3) {
    data[pixel] = 0.299 * picture.data[at] + 0.587 * picture.data[at + 1] + 0.114 * picture.data[at + 2];
  }
  return { width: picture.width, height: picture.height, data };
}

/** The grey picture at half its size, squares of four averaged. */
export function halve(grey: Grey): Grey {
  const width = grey.width >> 1;
  const height = grey.height >> 1;
  const data = new Float32Array(width * height);
  for (let y = 0; y < height; y++) {
    for (let x = 0; x < width; x++) {
      const at = 2 * y * grey.width + 2 * x;
      data[y * width + x] =
        (grey.data[at] + grey.data[at + 1] + grey.data[at + grey.width] + grey.data[at + grey.width + 1]) / 4;
    }
  }
  return { width, height, data };
}

/** A picture reduced step by step, the finest first. */
export function pyramidOf(grey: Grey, levels: number): Grey[] {
  const pyramid = [grey];
  while (pyramid.length < levels) pyramid.push(halve(pyramid[pyramid.length - 1]));
  return pyramid;
}

export interface Alignment {
  pose: Pose;
  /** 0 where all greys that overlap agree, 1 where none does. */
  misfit: number;
}

/**
 * Lays a picture on a reference by shifting (and, where asked, scaling) it so that their greys agree: Gauss-Newton on
 * the difference from coarse to fine (Lucas and Kanade 1981), places that disagree strongly, such as the thing, counting
 * less (Geman and McClure's weight).
 * @param reference pyramid of greys, finest first, NaN where the reference is not known
 * @param start where the picture is thought to lie on the reference
 * @param finest level of the pyramid at which to stop; 0 is the full grey
 */
export function align(reference: Grey[], picture: Grey[], start: Pose, withZoom: boolean, finest = 0): Alignment {
  let pose = { ...start };
  for (let level = picture.length - 1; level >= finest; level--) {
    const scale = 2 ** level;
    let local: Pose = { dx: pose.dx / scale, dy: pose.dy / scale, zoom: pose.zoom };
    for (let round = 0; round < 8; round++) {
      const step = improve(reference[level], picture[level], local, withZoom);
      if (!step) break;
      local = step.pose;
      if (step.moved < 0.02) break;
    }
    pose = { dx: local.dx * scale, dy: local.dy * scale, zoom: local.zoom };
  }
  return { pose, misfit: misfitOf(reference[0], picture[0], pose) };
}

/** Grey levels beyond which two places count as different. */
const DIFFERENT = 8;
/** Change of grey over two px from which on a place says where a picture lies. */
const TEXTURE = 6;

/** How badly two pictures agree in a pose, counted where the reference has something to hold on to. */
function misfitOf(reference: Grey, picture: Grey, pose: Pose): number {
  const points = residuals(reference, picture, pose, 3);
  let sum = 0;
  let count = 0;
  for (let k = 0; k < points.count; k++) {
    if (Math.abs(points.gx[k]) + Math.abs(points.gy[k]) < TEXTURE) continue;
    const r = points.residual[k] ** 2;
    sum += r / (r + DIFFERENT ** 2);
    count++;
  }
  const overlap = points.count / Math.max(1, points.residual.length);
  return count < 20 || overlap < 0.15 ? 1 : sum / count;
}

function improve(reference: Grey, picture: Grey, pose: Pose, withZoom: boolean) {
  const stride = Math.max(1, Math.round(Math.sqrt((picture.width * picture.height) / 20_000)));
  const points = residuals(reference, picture, pose, stride);
  if (points.count < 60) return null;
  const soft = (3 * medianOf(points.residual, points.count) + 2) ** 2;
  // Normal equations of three unknowns: shift across, shift down, zoom (about the picture's corner, per 1000 px).
  const m = new Float64Array(6);
  const v = new Float64Array(3);
  for (let k = 0; k < points.count; k++) {
    const r = points.residual[k];
    const w = (soft / (soft + r * r)) ** 2;
    const gx = points.gx[k];
    const gy = points.gy[k];
    const gz = withZoom ? (gx * points.x[k] + gy * points.y[k]) / 1000 : 0;
    m[0] += w * gx * gx;
    m[1] += w * gx * gy;
    m[2] += w * gx * gz;
    m[3] += w * gy * gy;
    m[4] += w * gy * gz;
    m[5] += w * gz * gz;
    v[0] += w * gx * r;
    v[1] += w * gy * r;
    v[2] += w * gz * r;
  }
  const step = solve(m, v, withZoom);
  if (!step) return null;
  const [dx, dy, dz] = step;
  const moved = Math.hypot(dx, dy) + Math.abs(dz) * (picture.width / 1000);
  const limit = Math.min(1, 3 / Math.max(moved, 1e-9));
  return {
    pose: {
      dx: pose.dx + limit * dx,
      dy: pose.dy + limit * dy,
      zoom: 1 / (1 / pose.zoom + (limit * dz) / 1000),
    },
    moved,
  };
}

function residuals(reference: Grey, picture: Grey, pose: Pose, stride: number) {
  const capacity = Math.ceil(picture.width / stride) * Math.ceil(picture.height / stride);
  const out = {
    count: 0,
    residual: new Float32Array(capacity),
    gx: new Float32Array(capacity),
    gy: new Float32Array(capacity),
    x: new Float32Array(capacity),
    y: new Float32Array(capacity),
  };
  const { width, height, data } = reference;
  for (let y = stride >> 1; y < picture.height; y += stride) {
    const ry = (y + 0.5) / pose.zoom + pose.dy - 0.5;
    const y0 = Math.floor(ry);
    if (y0 < 1 || y0 >= height - 2) continue;
    const fy = ry - y0;
    for (let x = stride >> 1; x < picture.width; x += stride) {
      const rx = (x + 0.5) / pose.zoom + pose.dx - 0.5;
      const x0 = Math.floor(rx);
      if (x0 < 1 || x0 >= width - 2) continue;
      const fx = rx - x0;
      const at = y0 * width + x0;
      const a = data[at];
      const b = data[at + 1];
      const c = data[at + width];
      const d = data[at + width + 1];
      const value = (a * (1 - fx) + b * fx) * (1 - fy) + (c * (1 - fx) + d * fx) * fy;
      // Places that the reference does not know are not a number there.
      if (Number.isNaN(value)) continue;
      const k = out.count++;
      out.residual[k] = picture.data[y * picture.width + x] - value;
      out.gx[k] = (b - a) * (1 - fy) + (d - c) * fy;
      out.gy[k] = (c - a) * (1 - fx) + (d - b) * fx;
      out.x[k] = x;
      out.y[k] = y;
    }
  }
  return out;
}

function medianOf(values: Float32Array, count: number): number {
  // A thousand of them say enough, and sorting all would cost more than the rest of the step.
  const stride = Math.max(1, Math.floor(count / 1000));
  const some = new Float32Array(Math.ceil(count / stride));
  for (let k = 0; k < some.length; k++) some[k] = Math.abs(values[k * stride]);
  return some.sort()[some.length >> 1];
}

function solve(m: Float64Array, v: Float64Array, withZoom: boolean): [number, number, number] | null {
  const [a, b, c, d, e, f] = m;
  if (!withZoom) {
    const det = a * d - b * b;
    if (det <= 1e-6 * a * d) return null;
    return [(v[0] * d - v[1] * b) / det, (v[1] * a - v[0] * b) / det, 0];
  }
  const det = a * (d * f - e * e) - b * (b * f - e * c) + c * (b * e - d * c);
  if (det <= 1e-9 * a * d * f) return null;
  return [
    (v[0] * (d * f - e * e) - b * (v[1] * f - e * v[2]) + c * (v[1] * e - d * v[2])) / det,
    (a * (v[1] * f - e * v[2]) - v[0] * (b * f - e * c) + c * (b * v[2] - v[1] * c)) / det,
    (a * (d * v[2] - v[1] * e) - b * (b * v[2] - v[1] * c) + v[0] * (b * e - d * c)) / det,
  ];
}
