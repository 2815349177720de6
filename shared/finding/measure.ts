import { difference, looseDifference, noiseThreshold } from './difference.ts';
import type { Box } from './grid.ts';
import { insideLine } from './drawnLine.ts';
import type { View } from './outline.ts';
import { type Silhouette, silhouetteOf } from './silhouette.ts';
import { withoutLoops } from './wireLoops.ts';
import type { Picture } from './types.ts';

/** A part of a picture together with where it was cut from. */
export interface Cut extends Picture {
  left: number;
  top: number;
}

/** A cut of the background; `known` is 0 where too few pictures show it, and null where all is known. */
export interface GroundCut extends Cut {
  known: Uint8Array | null;
}

/** A thing measured in the full picture, px of the picture. */
export interface Shape {
  x: number;
  y: number;
  area: number;
  long: number;
  short: number;
  /** Direction of the long axis, radians from the x axis. */
  tilt: number;
}

export interface Measured {
  /** Everything that differs from the background. */
  whole: Shape;
  /** Without the part that only darkens the background, as a shadow does; null where nothing else is left. */
  lit: Shape | null;
  /** Both shapes without a loop of wire, such as a handle; null where there is none. */
  bare: { whole: Shape; lit: Shape | null; filled: Uint8Array } | null;
  /** Share of the differing pixels that only darken the background. */
  shadowShare: number;
  /** Difference from the background, grey levels, that a tenth of the differing pixels exceed. */
  contrast: number;
  /** Grey levels by which most of its outline stands out: less than `contrast` where the thing is shaded. */
  body: number;
  /** Mean colour inside the shape. */
  colour: [number, number, number];
  /** How many px of the shape lie on the picture's edge. */
  onEdge: number;
  /** The window it was measured in. */
  view: View;
  /** The filled shape in that window. */
  filled: Uint8Array;
  /** How much more the frame shows an outline there than the background does; below 0 for a ghost in the background. */
  outline: number;
}

/** Share of a thing's contrast from which on a pixel belongs to it: blurred edges count, JPEG rings do not. */
const EDGE_SHARE = 0.14;

export function cut(picture: Picture, box: Box): Cut {
  const data = new Uint8Array(box.width * box.height * 3);
  for (let y = 0; y < box.height; y++) {
    const from = ((box.top + y) * picture.width + box.left) * 3;
    data.set(picture.data.subarray(from, from + box.width * 3), y * box.width * 3);
  }
  return { left: box.left, top: box.top, width: box.width, height: box.height, data };
}

/**
 * Measures the thing in a window of the full picture against the background there. Null when nothing in it stands out.
 * @param noise grey levels that noise does not reach in the reduced picture, and by how much that was reduced
 * @param foreign 1 where the window shows another thing
 * @param size of the full picture
 */
export function measure(
  frame: Cut,
  background: GroundCut,
  { threshold, factor }: { threshold: number; factor: number },
  foreign: Uint8Array | null,
  size: { width: number; height: number },
): Measured | null {
  const { width, height } = frame;
  const differences = windowDifferences(frame, background);
  if (foreign) for (let at = 0; at < foreign.length; at++) if (foreign[at] === 1) differences[at] = 0;
  const quiet = factor === 1 ? threshold : windowThreshold(differences, width, height, threshold, factor);
  const peak = upperShare(differences, quiet, 0.1);
  if (peak === 0) return null;
  const limit = Math.max(quiet, EDGE_SHARE * peak);
  const mask = differences.map((value) => (value >= limit ? 1 : 0));
  const closing = Math.max(1, Math.min(4, Math.round(Math.min(width, height) / 24)));
  const tint = (pixels: number[]): number => meanDifference(frame, background, pixels);
  const whole = silhouetteOf(mask, width, height, closing);
  if (!whole) return null;
  const shadow = shadowMask(frame, background, mask);
  let shadowed = 0;
  let differing = 0;
  const litMask = new Uint8Array(mask.length);
  for (let at = 0; at < mask.length; at++) {
    if (mask[at] === 0 || whole.filled[at] === 0) continue;
    differing++;
    if (shadow[at] === 1) shadowed++;
    else litMask[at] = 1;
  }
  const lit = silhouetteOf(litMask, width, height, closing);
  const bareOf = (shape: Silhouette, litShape: Silhouette | null): Measured['bare'] => {
    const bare = withoutLoops(shape, mask, width, height, closing, tint);
    if (!bare) return null;
    const bareLit = litShape && (withoutLoops(litShape, litMask, width, height, closing, tint) ?? litShape);
    return { whole: placed(bare, frame), lit: bareLit && placed(bareLit, frame), filled: bare.filled };
  };
  return {
    whole: placed(whole, frame),
    lit: lit && placed(lit, frame),
    bare: bareOf(whole, lit),
    shadowShare: shadowed / Math.max(1, differing),
    contrast: peak,
    body: Math.max(0.35 * peak, medianInside(differences, whole)),
    colour: meanColour(frame, whole),
    onEdge: edgeLength(whole, frame, size),
    view: { left: frame.left, top: frame.top, width, height, differences },
    filled: whole.filled,
    outline: outlineGain(frame, background, whole),
  };
}

function placed(shape: Silhouette, frame: Cut): Shape {
  const { area, long, short, tilt } = shape;
  const { x, y } = insideLine(shape, frame);
  return { x: x + frame.left, y: y + frame.top, area, long, short, tilt };
}

function windowDifferences(frame: Cut, background: GroundCut): Uint8Array {
  const into = new Uint8Array(frame.width * frame.height);
  return background.known
    ? looseDifference(frame, background, background.known, into)
    : difference(frame, background, into);
}

/**
 * What noise does not reach in a window of the full picture: averaging had hidden it from the reduced one. The window's
 * rim is background, so it says how strong the noise is there; at most it is what white noise would be.
 */
function windowThreshold(
  differences: Uint8Array,
  width: number,
  height: number,
  threshold: number,
  factor: number,
): number {
  const rim = differences.filter((_, at) => {
    const x = at % width;
    const y = Math.floor(at / width);
    return x < 2 || y < 2 || x >= width - 2 || y >= height - 2;
  });
  return Math.min(threshold * factor, Math.max(threshold, noiseThreshold(rim)));
}

/** The value that only `share` of the differing pixels exceed; 0 when none differs. */
function upperShare(values: Uint8Array, threshold: number, share: number): number {
  const counts = new Uint32Array(256);
  let total = 0;
  for (const value of values) {
    if (value < threshold) continue;
    counts[value]++;
    total++;
  }
  if (total === 0) return 0;
  let left = share * total;
  let value = 255;
  while (value > 0 && left >= counts[value]) left -= counts[value--];
  return value;
}

/**
 * Pixels that are the background made darker by one factor in all channels, and smoothly so: what a shadow does and a
 * drawn outline or a coloured thing does not.
 */
function shadowMask(frame: Cut, background: Cut, mask: Uint8Array): Uint8Array {
  const out = new Uint8Array(mask.length);
  for (let pixel = 0, at = 0; pixel < mask.length; pixel++, at += 3) {
    if (mask[pixel] === 0) continue;
    const ground = background.data[at] + background.data[at + 1] + background.data[at + 2];
    const here = frame.data[at] + frame.data[at + 1] + frame.data[at + 2];
    const factor = here / Math.max(1, ground);
    if (factor >= 0.98 || factor < 0.3) continue;
    let offColour = 0;
    for (let channel = 0; channel < 3; channel++) {
      offColour = Math.max(offColour, Math.abs(frame.data[at + channel] - factor * background.data[at + channel]));
    }
    if (offColour <= 4 + 0.05 * (ground / 3)) out[pixel] = 1;
  }
  return out;
}

function meanDifference(frame: Cut, background: Cut, pixels: number[]): number {
  const sums = [0, 0, 0];
  for (const at of pixels) {
    for (let channel = 0; channel < 3; channel++) {
      sums[channel] += frame.data[at * 3 + channel] - background.data[at * 3 + channel];
    }
  }
  return Math.max(...sums.map(Math.abs)) / Math.max(1, pixels.length);
}

function medianInside(differences: Uint8Array, shape: Silhouette): number {
  const counts = new Uint32Array(256);
  for (let at = 0; at < differences.length; at++) if (shape.filled[at] === 1) counts[differences[at]]++;
  let left = shape.area / 2;
  let value = 0;
  while (value < 255 && left > counts[value]) left -= counts[value++];
  return value;
}

function meanColour(frame: Cut, shape: Silhouette): [number, number, number] {
  const sums: [number, number, number] = [0, 0, 0];
  for (let at = 0; at < shape.filled.length; at++) {
    if (shape.filled[at] === 0) continue;
    for (let channel = 0; channel < 3; channel++) sums[channel] += frame.data[at * 3 + channel];
  }
  return [sums[0] / shape.area, sums[1] / shape.area, sums[2] / shape.area];
}

function edgeLength(shape: Silhouette, frame: Cut, size: { width: number; height: number }): number {
  let count = 0;
  for (let y = shape.y0; y <= shape.y1; y++) {
    for (let x = shape.x0; x <= shape.x1; x++) {
      if (shape.filled[y * frame.width + x] === 0) continue;
      const px = x + frame.left;
      const py = y + frame.top;
      if (px === 0 || py === 0 || px === size.width - 1 || py === size.height - 1) count++;
    }
  }
  return count;
}

/** Mean step across the shape's outline in the frame less that in the background, grey levels. */
function outlineGain(frame: Cut, background: Cut, shape: Silhouette): number {
  const { width, height } = frame;
  let gain = 0;
  let count = 0;
  for (let y = 1; y < height - 1; y++) {
    for (let x = 1; x < width - 1; x++) {
      const at = y * width + x;
      if (shape.filled[at] === 0) continue;
      const inside = shape.filled[at - 1] + shape.filled[at + 1] + shape.filled[at - width] + shape.filled[at + width];
      if (inside === 4) continue;
      gain += step(frame.data, at, width) - step(background.data, at, width);
      count++;
    }
  }
  return count === 0 ? 0 : gain / count;
}

function step(data: Uint8Array, at: number, width: number): number {
  let most = 0;
  for (let channel = 0; channel < 3; channel++) {
    const across = Math.abs(data[(at + 1) * 3 + channel] - data[(at - 1) * 3 + channel]);
    const down = Math.abs(data[(at + width) * 3 + channel] - data[(at - width) * 3 + channel]);
    most = Math.max(most, across, down);
  }
  return most;
}
