import type { Box } from './grid.ts';
import type { Picture } from './types.ts';

export type Axis = 'x' | 'y';
type Rgb = [number, number, number];

/** A run of lines (columns for x, rows for y) of one flat colour; `end` is the first line after it. */
export interface FlatRun {
  start: number;
  end: number;
  colour: Rgb;
}

const SAMPLES = 240;
/** Grey levels by which JPEG rings inside a flat gutter. */
const FLAT_TOLERANCE = 14;
/** Share of a line that may differ, so that a burn-in does not break a gutter. */
const STRAY_SHARE = 0.02;

/**
 * Runs of neighbouring lines that are flat and all of one colour: gutters, margins, and whatever in the frames looks so.
 * @param within only this part of the picture counts
 */
export function flatRuns(picture: Picture, axis: Axis, within: Box): FlatRun[] {
  const runs: FlatRun[] = [];
  const from = axis === 'x' ? within.left : within.top;
  const to = from + (axis === 'x' ? within.width : within.height);
  for (let line = from; line < to; line++) {
    const colour = flatColour(picture, axis, line, within);
    if (!colour) continue;
    const last = runs.at(-1);
    if (last && last.end === line && isSameColour(last.colour, colour)) last.end = line + 1;
    else runs.push({ start: line, end: line + 1, colour });
  }
  return runs;
}

export function isSameColour(a: Rgb, b: Rgb, tolerance = FLAT_TOLERANCE): boolean {
  return Math.max(Math.abs(a[0] - b[0]), Math.abs(a[1] - b[1]), Math.abs(a[2] - b[2])) <= tolerance;
}

/** The colour of a line, or null where the line is not of one colour. */
function flatColour(picture: Picture, axis: Axis, line: number, within: Box): Rgb | null {
  const length = axis === 'x' ? within.height : within.width;
  const count = Math.min(SAMPLES, length);
  const samples: Rgb[] = [];
  for (let k = 0; k < count; k++) {
    const along = Math.floor(((k + 0.5) * length) / count);
    const x = axis === 'x' ? line : within.left + along;
    const y = axis === 'x' ? within.top + along : line;
    const at = (y * picture.width + x) * 3;
    samples.push([picture.data[at], picture.data[at + 1], picture.data[at + 2]]);
  }
  const colour = [0, 1, 2].map((channel) => median(samples.map((sample) => sample[channel]))) as Rgb;
  const strays = samples.filter((sample) => !isSameColour(sample, colour)).length;
  return strays <= STRAY_SHARE * count ? colour : null;
}

function median(values: number[]): number {
  return values.toSorted((a, b) => a - b)[values.length >> 1];
}
