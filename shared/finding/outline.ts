import type { Silhouette } from './silhouette.ts';

/** How far the pixels of a window are from the background, and where in the picture the window lies. */
export interface View {
  left: number;
  top: number;
  width: number;
  height: number;
  differences: Uint8Array;
}

/** Points of a shape's outline around its centre with the direction that leads out of the shape, px. */
export interface Outline {
  x: Float64Array;
  y: Float64Array;
  outX: Float64Array;
  outY: Float64Array;
}

export interface OutlineFit {
  x: number;
  y: number;
  /** Radians by which the outline had to be turned. */
  angle: number;
  /** Share of the outline that shows as a step. */
  support: number;
  /** Mean step under the outline, grey levels; `startScore` is that of the place where the search began. */
  score: number;
  startScore: number;
}

const DISC_POINTS = 72;
const MOST_POINTS = 96;

/**
 * The outline of a disc, or of the band that a disc leaves when it moves during the exposure.
 * @param smear way that the disc goes during the exposure, px
 */
export function discOutline(radius: number, smear = { x: 0, y: 0 }): Outline {
  const angle = (k: number): number => (2 * Math.PI * (k + 0.5)) / DISC_POINTS;
  const outX = Float64Array.from({ length: DISC_POINTS }, (_, k) => Math.cos(angle(k)));
  const outY = Float64Array.from({ length: DISC_POINTS }, (_, k) => Math.sin(angle(k)));
  const end = (k: number): number => (outX[k] * smear.x + outY[k] * smear.y >= 0 ? 0.5 : -0.5);
  return {
    x: outX.map((value, k) => value * radius + end(k) * smear.x),
    y: outY.map((value, k) => value * radius + end(k) * smear.y),
    outX,
    outY,
  };
}

/** The outline of a filled shape around its centroid; normals are smoothed over a few pixels. */
export function outlineOf(shape: Pick<Silhouette, 'filled' | 'x' | 'y'>, width: number, height: number): Outline {
  const points: { x: number; y: number; outX: number; outY: number }[] = [];
  const inside = (x: number, y: number): number =>
    x < 0 || y < 0 || x >= width || y >= height ? 0 : shape.filled[y * width + x];
  for (let y = 0; y < height; y++) {
    for (let x = 0; x < width; x++) {
      if (inside(x, y) === 0) continue;
      if (inside(x - 1, y) + inside(x + 1, y) + inside(x, y - 1) + inside(x, y + 1) === 4) continue;
      let outX = 0;
      let outY = 0;
      for (let dy = -3; dy <= 3; dy++) {
        for (let dx = -3; dx <= 3; dx++) {
          if (inside(x + dx, y + dy) === 1) continue;
          outX += dx;
          outY += dy;
        }
      }
      const length = Math.hypot(outX, outY);
      if (length < 1e-6) continue;
      outX /= length;
      outY /= length;
      // The pixel's outer half is where the shape ends.
      points.push({ x: x + 0.5 + outX / 2 - shape.x, y: y + 0.5 + outY / 2 - shape.y, outX, outY });
    }
  }
  const stride = Math.max(1, Math.ceil(points.length / MOST_POINTS));
  const kept = points.filter((_, k) => k % stride === 0);
  return {
    x: Float64Array.from(kept, (point) => point.x),
    y: Float64Array.from(kept, (point) => point.y),
    outX: Float64Array.from(kept, (point) => point.outX),
    outY: Float64Array.from(kept, (point) => point.outY),
  };
}

/**
 * Lays an outline over a window where most of it falls on a step from "differs" to "differs less": a shadow that
 * touches the thing, a post in front of it or the picture's edge takes some of the outline away, and the rest decides.
 * @param start where the centre is thought to be, px of the picture
 * @param reach how far from it to look, px
 * @param angles turns to try, radians
 */
export function fitOutline(
  view: View,
  outline: Outline,
  start: { x: number; y: number },
  reach: number,
  contrast: number,
  angles: number[],
): OutlineFit {
  const step = Math.max(1, reach / 8);
  const startScore = scoreAt(view, outline, start.x, start.y, 0, contrast).score;
  let best: OutlineFit = { ...start, angle: 0, support: 0, score: Number.NEGATIVE_INFINITY, startScore };
  const look = (x: number, y: number, angle: number): void => {
    const { score, support } = scoreAt(view, outline, x, y, angle, contrast);
    if (score > best.score) best = { x, y, angle, score, support, startScore };
  };
  for (const angle of angles) {
    for (let dy = -reach; dy <= reach; dy += step) {
      for (let dx = -reach; dx <= reach; dx += step) look(start.x + dx, start.y + dy, angle);
    }
  }
  const turn = angles.length > 1 ? Math.abs(angles[1] - angles[0]) : 0;
  for (let size = step / 2, by = turn / 2; size > 0.1; size /= 2, by /= 2) {
    for (let round = 0; round < 3; round++) {
      const { x, y, angle, score } = best;
      for (const [dx, dy] of AROUND) look(x + dx * size, y + dy * size, angle);
      if (by > 0) {
        look(x, y, angle + by);
        look(x, y, angle - by);
      }
      if (best.score === score) break;
    }
  }
  return peakOf(view, outline, best, contrast);
}

const AROUND = [
  [-1, -1],
  [0, -1],
  [1, -1],
  [-1, 0],
  [1, 0],
  [-1, 1],
  [0, 1],
  [1, 1],
] as const;

/**
 * The middle of the score's top. A sharp edge scores the same over a pixel or so, and the place found first on that
 * plateau is its rim: so the top of the score is balanced along each axis.
 */
function peakOf(view: View, outline: Outline, best: OutlineFit, contrast: number): OutlineFit {
  let { x, y } = best;
  for (let round = 0; round < 2; round++) {
    x += topOf((shift) => scoreAt(view, outline, x + shift, y, best.angle, contrast).score);
    y += topOf((shift) => scoreAt(view, outline, x, y + shift, best.angle, contrast).score);
  }
  const { score, support } = scoreAt(view, outline, x, y, best.angle, contrast);
  return { ...best, x, y, score, support };
}

/** How far from 0 the top tenth of a score balances. */
function topOf(scoreOf: (shift: number) => number): number {
  const shifts = Array.from({ length: 21 }, (_, k) => (k - 10) / 5);
  const scores = shifts.map(scoreOf);
  const most = Math.max(...scores);
  if (most <= 0) return 0;
  let sum = 0;
  let weights = 0;
  scores.forEach((score, k) => {
    const weight = Math.max(0, score - 0.9 * most);
    weights += weight;
    sum += weight * shifts[k];
  });
  return sum / weights;
}

function scoreAt(view: View, outline: Outline, x: number, y: number, angle: number, contrast: number) {
  const cos = Math.cos(angle);
  const sin = Math.sin(angle);
  const most = contrast;
  const least = -0.3 * contrast;
  const clear = 0.22 * contrast;
  let sum = 0;
  let seen = 0;
  let steps = 0;
  for (let k = 0; k < outline.x.length; k++) {
    const px = x + outline.x[k] * cos - outline.y[k] * sin;
    const py = y + outline.x[k] * sin + outline.y[k] * cos;
    const nx = (outline.outX[k] * cos - outline.outY[k] * sin) * 1.5;
    const ny = (outline.outX[k] * sin + outline.outY[k] * cos) * 1.5;
    const within = sample(view, px - nx, py - ny);
    const beyond = sample(view, px + nx, py + ny);
    if (within < 0 || beyond < 0) continue;
    seen++;
    const rise = within - beyond;
    if (rise > clear) steps++;
    sum += rise > most ? most : rise < least ? least : rise;
  }
  return { score: sum / outline.x.length, support: seen === 0 ? 0 : steps / Math.max(seen, outline.x.length * 0.5) };
}

/** The difference at a place between pixels; -1 outside the window. */
function sample(view: View, x: number, y: number): number {
  const fx = x - 0.5 - view.left;
  const fy = y - 0.5 - view.top;
  const x0 = Math.floor(fx);
  const y0 = Math.floor(fy);
  if (x0 < 0 || y0 < 0 || x0 >= view.width - 1 || y0 >= view.height - 1) return -1;
  const at = y0 * view.width + x0;
  const rx = fx - x0;
  const ry = fy - y0;
  const d = view.differences;
  const top = d[at] + rx * (d[at + 1] - d[at]);
  const bottom = d[at + view.width] + rx * (d[at + view.width + 1] - d[at + view.width]);
  return top + ry * (bottom - top);
}
