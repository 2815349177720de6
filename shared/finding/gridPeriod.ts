import type { Box } from './grid.ts';
import type { Axis } from './gridLines.ts';
import type { Picture } from './types.ts';

const LANES = 20;
const MIN_PITCH = 16;
/** How far the difference at the pitch must fall below the differences a few px beside it. */
const MAX_DIP = 0.6;

/** A step after which a picture shows nearly the same again, px, with how surely it does. */
export interface Period {
  pitch: number;
  confidence: number;
}

/**
 * The step by which frames of one shot repeat along an axis: they share their background, so a strip moved by one frame
 * lies nearly on itself, and a few px beside that it does not. Null where nothing repeats.
 */
export function findPeriod(picture: Picture, axis: Axis, within: Box): Period | null {
  const lanes = brightnessLanes(picture, axis, within);
  const length = axis === 'x' ? within.width : within.height;
  const longest = Math.floor(length / 2);
  if (longest < MIN_PITCH) return null;
  const differences = new Float64Array(longest + 9);
  for (let step = 8; step < longest + 9 && step < length; step++) differences[step] = meanDifference(lanes, step);
  const dips: { pitch: number; dip: number }[] = [];
  for (let step = MIN_PITCH; step <= longest; step++) {
    const beside = Math.min(differences[step - 6], differences[step + 6]);
    if (differences[step] > differences[step - 1] || differences[step] > differences[step + 1]) continue;
    if (beside > 0.5) dips.push({ pitch: step, dip: differences[step] / beside });
  }
  const deepest = dips.reduce((least, { dip }) => Math.min(least, dip), 1);
  if (deepest > MAX_DIP) return null;
  // Two and three frames on, the strip repeats as well: the shortest such step is the pitch.
  const pitch = dips.find(({ dip }) => dip <= deepest + 0.15)?.pitch;
  return pitch === undefined ? null : { pitch, confidence: Math.min(0.9, 1 - deepest) };
}

/** Brightness along the axis in a few lanes across it. */
function brightnessLanes(picture: Picture, axis: Axis, within: Box): Float32Array[] {
  const across = axis === 'x' ? within.height : within.width;
  const along = axis === 'x' ? within.width : within.height;
  const count = Math.min(LANES, across);
  return Array.from({ length: count }, (_, k) => {
    const lane = Math.floor(((k + 0.5) * across) / count);
    return Float32Array.from({ length: along }, (_, line) => {
      const x = axis === 'x' ? within.left + line : within.left + lane;
      const y = axis === 'x' ? within.top + lane : within.top + line;
      const at = (y * picture.width + x) * 3;
      return 0.299 * picture.data[at] + 0.587 * picture.data[at + 1] + 0.114 * picture.data[at + 2];
    });
  });
}

function meanDifference(lanes: Float32Array[], step: number): number {
  // The thing and the counters differ between frames: a cap keeps them from outweighing the background.
  const cap = 40;
  const length = lanes[0].length - step;
  const stride = Math.max(1, Math.floor(length / 1500));
  let sum = 0;
  let count = 0;
  for (const lane of lanes) {
    for (let at = 0; at < length; at += stride) {
      sum += Math.min(cap, Math.abs(lane[at + step] - lane[at]));
      count++;
    }
  }
  return sum / count;
}
