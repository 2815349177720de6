import type { Pose } from './align.ts';
import { labelRegions, type Region } from './components.ts';
import type { Box } from './grid.ts';
import type { Measured, Shape } from './measure.ts';

/** Something that stands out from the background on one frame. */
export interface Candidate extends Measured {
  /** Index of the frame, from 0. */
  index: number;
  /** Where the camera was. `whole` and `lit` are on the stage, `view` is of the picture. */
  pose: Pose;
}

/** What was measured on a picture, laid on the stage. */
export function candidateOf(measured: Measured, index: number, pose: Pose): Candidate {
  const { whole, lit, bare } = measured;
  return {
    ...measured,
    whole: ontoStage(whole, pose),
    lit: lit && ontoStage(lit, pose),
    bare: bare && { ...bare, whole: ontoStage(bare.whole, pose), lit: bare.lit && ontoStage(bare.lit, pose) },
    index,
    pose,
  };
}

function ontoStage(shape: Shape, { dx, dy, zoom }: Pose): Shape {
  return {
    ...shape,
    x: shape.x / zoom + dx,
    y: shape.y / zoom + dy,
    area: shape.area / zoom ** 2,
    long: shape.long / zoom,
    short: shape.short / zoom,
  };
}

/** A place on the stage as a picture shows it, px. */
export function ontoPicture({ x, y }: { x: number; y: number }, { dx, dy, zoom }: Pose): { x: number; y: number } {
  return { x: (x - dx) * zoom, y: (y - dy) * zoom };
}

/** Most things looked at on one frame; the largest and clearest come first. */
const MOST = 10;
/** Pixels of the reduced picture below which a region is dust. */
const LEAST_AREA = 5;

/**
 * Regions of the reduced picture that differ from the background: neighbours up to two pixels apart count as one, so
 * that an outline drawn with a pencil stays whole.
 * @returns the label of each pixel, and the regions in pixels of the reduced picture, strongest first
 */
export function regionsOf(
  differences: Uint8Array,
  width: number,
  height: number,
  threshold: number,
): { labels: Int32Array; regions: Region[] } {
  const mask = new Uint8Array(differences.length);
  for (let y = 0; y < height; y++) {
    for (let x = 0; x < width; x++) {
      if (differences[y * width + x] < threshold) continue;
      // Grown by one to each side: pixels two apart touch.
      for (let ny = Math.max(0, y - 1); ny <= Math.min(height - 1, y + 1); ny++) {
        const row = ny * width;
        mask[row + x] = 1;
        if (x > 0) mask[row + x - 1] = 1;
        if (x < width - 1) mask[row + x + 1] = 1;
      }
    }
  }
  const { labels, regions } = labelRegions(mask, width, height);
  const strength = new Float64Array(regions.length);
  const cores = new Uint32Array(regions.length);
  for (let at = 0; at < differences.length; at++) {
    if (labels[at] === 0 || differences[at] < threshold) continue;
    strength[labels[at] - 1] += differences[at];
    cores[labels[at] - 1]++;
  }
  const strongest = regions
    .filter((region) => cores[region.label - 1] >= LEAST_AREA)
    .toSorted((a, b) => strength[b.label - 1] - strength[a.label - 1])
    .slice(0, MOST);
  return { labels, regions: strongest };
}

/** The window of the full picture in which a region of the reduced one is measured, with room around it. */
export function windowOf(region: Region, factor: number, size: { width: number; height: number }): Box {
  const room = 3 + Math.ceil(0.15 * Math.max(region.x1 - region.x0, region.y1 - region.y0));
  const left = Math.max(0, (region.x0 - room) * factor);
  const top = Math.max(0, (region.y0 - room) * factor);
  const right = Math.min(size.width, (region.x1 + 1 + room) * factor);
  const bottom = Math.min(size.height, (region.y1 + 1 + room) * factor);
  return { left, top, width: right - left, height: bottom - top };
}

/**
 * The pixels of a region's window that belong to other regions, or null where none does: two things that pass close by
 * share a window, and each is measured without the other.
 * @param labels labels of the reduced picture, `width` px wide
 */
export function foreignIn(
  box: Box,
  label: number,
  labels: Int32Array,
  width: number,
  factor: number,
): Uint8Array | null {
  const foreign = new Uint8Array(box.width * box.height);
  let any = false;
  const last = labels.length / width - 1;
  for (let y = 0; y < box.height; y++) {
    const row = Math.min(last, Math.floor((box.top + y) / factor)) * width;
    for (let x = 0; x < box.width; x++) {
      const other = labels[row + Math.min(width - 1, Math.floor((box.left + x) / factor))];
      if (other === 0 || other === label) continue;
      foreign[y * box.width + x] = 1;
      any = true;
    }
  }
  return any ? foreign : null;
}

/** Share of the take's strongest candidates below which one is dust: noise along a line, a blemish of the coding. */
const DUST = 0.01;

/** The candidates without those that are next to nothing beside what the take usually shows. */
export function withoutDust(frames: Candidate[][]): Candidate[][] {
  const strength = ({ whole, contrast }: Candidate): number => whole.area * contrast;
  const strongest = frames.map((candidates) => Math.max(0, ...candidates.map(strength))).toSorted((a, b) => a - b);
  const usual = strongest[strongest.length >> 1] ?? 0;
  return frames.map((candidates) => candidates.filter((candidate) => strength(candidate) >= DUST * usual));
}
