import { type Box, type Grid, gridCells } from './grid.ts';
import { type AxisCells, cellsBetweenGutters } from './gridAxis.ts';
import { type Axis, type FlatRun, flatRuns, isSameColour } from './gridLines.ts';
import { findPeriod } from './gridPeriod.ts';
import type { Picture } from './types.ts';

/** Grey levels within which a cell at the end counts as empty. */
const EMPTY_RANGE = 16;

/**
 * Finds the frames in a strip picture: a row, a column or a grid, between gutters of one colour or edge to edge. Gutters
 * decide where there are any; without them the frames' common background repeats, and that step is the pitch. A picture
 * in which neither shows is one frame, with confidence 0.
 */
export function detectGrid(picture: Picture): Grid {
  const whole: Box = { left: 0, top: 0, width: picture.width, height: picture.height };
  // Burn-ins in a margin cross the other axis' gutters, so each axis is looked at again inside what the other found.
  let rows = axisCells(picture, 'y', whole, null);
  const columns = axisCells(picture, 'x', spanY(whole, rows), rows.colour);
  rows = axisCells(picture, 'y', spanX(whole, columns), columns.colour);
  const grid: Grid = {
    columns: columns.count,
    rows: rows.count,
    cellWidth: columns.cell,
    cellHeight: rows.cell,
    gutterX: columns.gutter,
    gutterY: rows.gutter,
    marginX: columns.first,
    marginY: rows.first,
    count: columns.count * rows.count,
    confidence: columns.count * rows.count === 1 ? 0 : Math.max(columns.confidence, rows.confidence),
  };
  const cells = gridCells(grid);
  while (grid.count > 1 && isEmpty(picture, cells[grid.count - 1])) grid.count--;
  return grid;
}

function axisCells(picture: Picture, axis: Axis, within: Box, otherColour: FlatRun['colour'] | null): AxisCells {
  const from = axis === 'x' ? within.left : within.top;
  const length = axis === 'x' ? within.width : within.height;
  const runs = flatRuns(picture, axis, within);
  const between = cellsBetweenGutters(runs, from, from + length);
  const period = findPeriod(picture, axis, within);
  // A flat sky between two grounds looks like a gutter; frames of one shot repeat by the same pitch either way.
  if (between && (!period || agrees(between, period.pitch))) {
    if (!otherColour || !between.colour || isSameColour(between.colour, otherColour, 24)) return between;
  }
  const inside = withoutMargins(runs, from, from + length, otherColour);
  if (!period) {
    return { count: 1, first: inside.from, cell: inside.to - inside.from, gutter: 0, colour: null, confidence: 0.5 };
  }
  const count = Math.max(1, Math.round((inside.to - inside.from) / period.pitch));
  const cell = Math.floor((inside.to - inside.from) / count);
  return { count, first: inside.from, cell, gutter: 0, colour: null, confidence: period.confidence };
}

function agrees(cells: AxisCells, pitch: number): boolean {
  return Math.abs(pitch - (cells.cell + cells.gutter)) <= 2;
}

/** Margins are taken off only where they have the colour that the other axis' gutters prove. */
function withoutMargins(
  runs: FlatRun[],
  from: number,
  to: number,
  colour: FlatRun['colour'] | null,
): { from: number; to: number } {
  const margins = colour ? runs.filter((run) => isSameColour(run.colour, colour, 24)) : [];
  const first = margins.find((run) => run.start === from);
  const last = margins.find((run) => run.end === to);
  const inside = { from: first?.end ?? from, to: last?.start ?? to };
  return inside.to > inside.from ? inside : { from, to };
}

function spanY(whole: Box, rows: AxisCells): Box {
  return { ...whole, top: rows.first, height: (rows.cell + rows.gutter) * rows.count - rows.gutter };
}

function spanX(whole: Box, columns: AxisCells): Box {
  return { ...whole, left: columns.first, width: (columns.cell + columns.gutter) * columns.count - columns.gutter };
}

function isEmpty(picture: Picture, cell: Box): boolean {
  const low = [255, 255, 255];
  const high = [0, 0, 0];
  const stepX = Math.max(1, Math.floor(cell.width / 60));
  const stepY = Math.max(1, Math.floor(cell.height / 60));
  for (let y = cell.top; y < cell.top + cell.height; y += stepY) {
    for (let x = cell.left; x < cell.left + cell.width; x += stepX) {
      for (let channel = 0; channel < 3; channel++) {
        const value = picture.data[(y * picture.width + x) * 3 + channel];
        low[channel] = Math.min(low[channel], value);
        high[channel] = Math.max(high[channel], value);
      }
    }
  }
  return high.every((value, channel) => value - low[channel] <= EMPTY_RANGE);
}
