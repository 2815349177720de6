import type { Grid } from '../../../shared/finding/grid.ts';

export type GridField = 'columns' | 'rows' | 'gutterX' | 'gutterY' | 'marginX' | 'marginY' | 'count';

export interface PictureSize {
  width: number;
  height: number;
}

/** A first cut when nothing was found: a row of as many square frames as fit. */
export function firstCut({ width, height }: PictureSize): Grid {
  const columns = Math.max(2, Math.min(500, Math.round(width / height)));
  return {
    columns,
    rows: 1,
    cellWidth: Math.max(1, Math.floor(width / columns)),
    cellHeight: height,
    gutterX: 0,
    gutterY: 0,
    marginX: 0,
    marginY: 0,
    count: columns,
  };
}

/**
 * The grid after one field was changed. The frames of the axis that changed share the room between the margins; a count
 * that held the full grid keeps holding it.
 */
export function withField(grid: Grid, field: GridField, value: number, picture: PictureSize): Grid {
  const wasFull = grid.count === grid.columns * grid.rows;
  const next = { ...grid, [field]: value };
  // Half written: nothing follows from it yet.
  if (!Number.isInteger(value)) return next;
  if (field === 'columns' || field === 'gutterX' || field === 'marginX') {
    next.cellWidth = share(picture.width, next.columns, next.gutterX, next.marginX);
  }
  if (field === 'rows' || field === 'gutterY' || field === 'marginY') {
    next.cellHeight = share(picture.height, next.rows, next.gutterY, next.marginY);
  }
  const cells = next.columns * next.rows;
  if (field !== 'count' && (wasFull || next.count > cells)) next.count = cells;
  return next;
}

function share(length: number, cells: number, gutter: number, margin: number): number {
  return Math.floor((length - 2 * margin - (cells - 1) * gutter) / Math.max(1, cells));
}

/** What is wrong with a grid on this picture, as a sentence; null when it can be cut so. */
export function gridProblem(grid: Grid, picture: PictureSize): string | null {
  const values = [grid.columns, grid.rows, grid.gutterX, grid.gutterY, grid.marginX, grid.marginY, grid.count];
  if (values.some((value) => !Number.isInteger(value))) return 'Write whole numbers.';
  if (grid.columns < 1 || grid.rows < 1 || grid.columns > 500 || grid.rows > 500)
    return 'A grid has 1 to 500 columns and rows.';
  if (grid.gutterX < 0 || grid.gutterY < 0 || grid.marginX < 0 || grid.marginY < 0)
    return 'Gutters and margins are 0 px or more.';
  if (grid.cellWidth < 1 || grid.cellHeight < 1)
    return 'No room is left for the frames. Take fewer, or smaller gutters.';
  if (grid.count < 1 || grid.count > grid.columns * grid.rows) {
    return `This grid holds 1 to ${grid.columns * grid.rows} frames.`;
  }
  const right = grid.marginX + grid.columns * grid.cellWidth + (grid.columns - 1) * grid.gutterX;
  const bottom = grid.marginY + grid.rows * grid.cellHeight + (grid.rows - 1) * grid.gutterY;
  if (right > picture.width || bottom > picture.height) return 'The frames reach beyond the picture.';
  return null;
}

/** The cells of a grid in reading order, px of the picture; `used` is false for the empty ones at the end. */
export function cellsOf(grid: Grid): { index: number; x: number; y: number; used: boolean }[] {
  return Array.from({ length: grid.columns * grid.rows }, (_, index) => ({
    index,
    x: grid.marginX + (index % grid.columns) * (grid.cellWidth + grid.gutterX),
    y: grid.marginY + Math.floor(index / grid.columns) * (grid.cellHeight + grid.gutterY),
    used: index < grid.count,
  }));
}
