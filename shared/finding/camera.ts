import { align, type Alignment, greyOf, halve, type Pose, pyramidOf } from './align.ts';
import { type Grey, phaseShift, spectrumOf } from './phaseCorrelation.ts';
import type { Picture } from './types.ts';

export const STILL: Pose = { dx: 0, dy: 0, zoom: 1 };

/** Levels of the pyramid on which pictures are aligned. */
export const LEVELS = 3;
/** Share of a tile's edges, and share of the tiles, that differ between samples before a camera's move is looked for. */
const CHANGED_EDGES = 0.3;
const CHANGED_TILES = 0.5;
/** Change of grey over two px that makes an edge; fainter ones drown in grain. */
const LEAST_SLOPE = 8;
/** Move in px of the reduced picture under which the camera counts as still. */
const LEAST_MOVE = 0.4;
/** How much better a zoom has to explain two pictures before one is believed. */
const ZOOM_GAIN = 0.9;
/** Difference in misfit up to which two places fit alike. */
const ALIKE = 0.05;
const SPECTRUM = 256;

/**
 * Where the camera was on some pictures, against the first: by phase correlation from each to the next, then by aligning
 * greys. Null when it stands still.
 * @param samples reduced pictures in order
 */
export function cameraOf(samples: Picture[]): Pose[] | null {
  if (!edgesChange(samples)) return null;
  const pyramids = samples.map((sample) => pyramidOf(greyOf(sample), LEVELS));
  const poses: Pose[] = [STILL];
  let last: Pose = STILL;
  for (let k = 1; k < samples.length; k++) {
    const step = stepBetween(pyramids[k - 1], pyramids[k], last);
    poses.push(chain(poses[k - 1], step));
    last = step;
  }
  return isMoved(poses) ? poses : null;
}

export function isMoved(poses: Pose[]): boolean {
  const spread = (values: number[]): number => Math.max(...values) - Math.min(...values);
  return (
    spread(poses.map((pose) => pose.dx)) > LEAST_MOVE ||
    spread(poses.map((pose) => pose.dy)) > LEAST_MOVE ||
    spread(poses.map((pose) => pose.zoom)) > 0.004
  );
}

/** The pose of a picture that lies by `step` on one that itself lies by `base` on the stage. */
function chain(base: Pose, step: Pose): Pose {
  return { dx: base.dx + step.dx / base.zoom, dy: base.dy + step.dy / base.zoom, zoom: base.zoom * step.zoom };
}

function stepBetween(before: Grey[], after: Grey[], last: Pose): Pose {
  const small = (pyramid: Grey[]): Grey => pyramid[LEVELS - 1];
  const shift = phaseShift(spectrumOf(small(before), SPECTRUM), spectrumOf(small(after), SPECTRUM));
  const scale = 2 ** (LEVELS - 1);
  const starts: Pose[] = [STILL, last, { dx: -shift.x * scale, dy: -shift.y * scale, zoom: 1 }];
  const tried = starts.map((start) => align(before, after, { ...start, zoom: 1 }, false, 1));
  const least = Math.min(...tried.map(({ misfit }) => misfit));
  // A fence or a brick wall fits in several places: of those that fit alike, the camera's own way so far decides.
  const alike = tried.filter(({ misfit }) => misfit <= least + ALIKE);
  const off = ({ pose }: Alignment): number => Math.hypot(pose.dx - last.dx, pose.dy - last.dy);
  const best = alike.reduce((nearest, one) => (off(one) < off(nearest) ? one : nearest));
  return withZoomWhereNeeded(before, after, align(before, after, best.pose, false)).pose;
}

/** Tries a zoom on top of a shift and keeps it where it explains the pictures clearly better. */
export function withZoomWhereNeeded(reference: Grey[], picture: Grey[], plain: Alignment): Alignment {
  const zoomed = align(reference, picture, plain.pose, true);
  return zoomed.misfit < ZOOM_GAIN * plain.misfit - 0.01 ? zoomed : plain;
}

/** True when most edges of the pictures differ from one to the next: a thing, its shadow and a counter have few. */
function edgesChange(samples: Picture[]): boolean {
  const shares: number[] = [];
  for (let k = 1; k < samples.length; k++) {
    const a = halve(greyOf(samples[k - 1]));
    const b = halve(greyOf(samples[k]));
    shares.push(changedShare(a, b));
  }
  if (shares.length === 0) return false;
  const sorted = shares.toSorted((a, b) => a - b);
  // A camera that starts late or stops early is still for part of the shot.
  return sorted[Math.floor(0.75 * (sorted.length - 1))] > CHANGED_TILES;
}

/** Tiles across and down in which edges are looked at: what moves is in few of them, a camera's move is in all. */
const TILES = 5;
const LEAST_EDGES = 12;

/** Share of the tiles with edges in which most of these differ. */
function changedShare(a: Grey, b: Grey): number {
  const edges = new Uint32Array(TILES * TILES);
  const changed = new Uint32Array(TILES * TILES);
  for (let y = 1; y < a.height - 1; y++) {
    const row = Math.floor((y * TILES) / a.height) * TILES;
    for (let x = 1; x < a.width - 1; x++) {
      const at = y * a.width + x;
      const gx = Math.abs(a.data[at + 1] - a.data[at - 1]);
      const gy = Math.abs(a.data[at + a.width] - a.data[at - a.width]);
      const slope = Math.max(gx, gy);
      if (slope < LEAST_SLOPE) continue;
      const tile = row + Math.floor((x * TILES) / a.width);
      edges[tile]++;
      if (Math.abs(a.data[at] - b.data[at]) > Math.max(4, 0.2 * slope)) changed[tile]++;
    }
  }
  let withEdges = 0;
  let moved = 0;
  for (let tile = 0; tile < edges.length; tile++) {
    if (edges[tile] < LEAST_EDGES) continue;
    withEdges++;
    if (changed[tile] > CHANGED_EDGES * edges[tile]) moved++;
  }
  return withEdges < 4 ? 0 : moved / withEdges;
}
