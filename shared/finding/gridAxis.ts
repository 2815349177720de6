import { type FlatRun, isSameColour } from './gridLines.ts';

/** Equal cells along one axis, px. `colour` is the gutter's, null where there is no gutter. */
export interface AxisCells {
  count: number;
  first: number;
  cell: number;
  gutter: number;
  colour: FlatRun['colour'] | null;
  confidence: number;
}

interface Part {
  start: number;
  end: number;
}

const MIN_CELL = 16;
/** A gutter thicker than this share of the pitch is more likely a flat part of the frames themselves. */
const MAX_GUTTER_SHARE = 0.3;

/**
 * Equal cells between gutters of one colour, or null where no colour cuts the axis into equal parts.
 * @param runs flat runs of the axis
 * @param from first line of the axis, `to` the line after its last
 */
export function cellsBetweenGutters(runs: FlatRun[], from: number, to: number): AxisCells | null {
  let best: AxisCells | null = null;
  for (const family of coloursOf(runs)) {
    const cells = equalParts(family, from, to);
    if (cells && (!best || cells.confidence * cells.count > best.confidence * best.count)) best = cells;
  }
  return best;
}

function coloursOf(runs: FlatRun[]): FlatRun[][] {
  const families: FlatRun[][] = [];
  for (const run of runs) {
    const family = families.find((members) => isSameColour(members[0].colour, run.colour, 20));
    if (family) family.push(run);
    else families.push([run]);
  }
  return families;
}

function equalParts(gutters: FlatRun[], from: number, to: number): AxisCells | null {
  // Thin stray lines of the gutter's colour inside a cell would cut it, so thinner runs are dropped in turn.
  const widths = [...new Set(gutters.map((run) => run.end - run.start))].toSorted((a, b) => a - b);
  for (const least of widths.slice(0, 12)) {
    const kept = gutters.filter((run) => run.end - run.start >= least || run.start === from || run.end === to);
    const parts = partsBetween(kept, from, to);
    const cells = regular(parts, kept[0].colour);
    if (cells) return cells;
  }
  return null;
}

function partsBetween(gutters: FlatRun[], from: number, to: number): Part[] {
  const parts: Part[] = [];
  let start = from;
  for (const gutter of [...gutters, { start: to, end: to }]) {
    if (gutter.start > start) parts.push({ start, end: gutter.start });
    start = gutter.end;
  }
  return parts;
}

function regular(parts: Part[], colour: FlatRun['colour']): AxisCells | null {
  if (parts.length < 2) return null;
  const cell = middle(parts.map((part) => part.end - part.start));
  const slack = Math.max(1, 0.01 * cell);
  const fits = (part: Part): boolean => Math.abs(part.end - part.start - cell) <= slack;
  // A title in a margin stands before the first cell or after the last.
  const first = parts.findIndex(fits);
  const cells = parts.slice(first, parts.findLastIndex(fits) + 1);
  if (cells.length < 2 || cells.length < parts.length - 2 || cell < MIN_CELL) return null;
  const pitches = cells.slice(1).map((part, k) => part.start - cells[k].start);
  const pitch = middle(pitches);
  const even = cells.every(fits) && pitches.every((step) => Math.abs(step - pitch) <= slack);
  if (!even || pitch - cell > MAX_GUTTER_SHARE * pitch) return null;
  return { count: cells.length, first: cells[0].start, cell, gutter: pitch - cell, colour, confidence: 0.98 };
}

function middle(values: number[]): number {
  return values.toSorted((a, b) => a - b)[values.length >> 1];
}
