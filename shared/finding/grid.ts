import { z } from 'zod';

/**
 * How a strip picture is cut into frames: a row, a column or a grid of equal cells. All lengths in px of the picture;
 * cells are read row by row, and the last `columns * rows - count` cells are empty. `confidence` is there when the grid
 * was found and not given by hand: 1 where gutters prove it, 0 where nothing but the whole picture was left to take.
 */
export const gridSchema = z
  .object({
    columns: z.int().min(1).max(500),
    rows: z.int().min(1).max(500),
    cellWidth: z.int().positive(),
    cellHeight: z.int().positive(),
    gutterX: z.int().nonnegative(),
    gutterY: z.int().nonnegative(),
    marginX: z.int().nonnegative(),
    marginY: z.int().nonnegative(),
    count: z.int().positive(),
    confidence: z.number().min(0).max(1).optional(),
  })
  .refine((grid) => grid.count <= grid.columns * grid.rows, {
    path: ['count'],
    message: 'There are more frames than cells.',
  })
  .meta({ id: 'Grid' });
export type Grid = z.infer<typeof gridSchema>;

/** A rectangle in a picture, px. */
export interface Box {
  left: number;
  top: number;
  width: number;
  height: number;
}

/** The rectangle of each used cell, in reading order. */
export function gridCells(grid: Grid): Box[] {
  return Array.from({ length: grid.count }, (_, index) => ({
    left: grid.marginX + (index % grid.columns) * (grid.cellWidth + grid.gutterX),
    top: grid.marginY + Math.floor(index / grid.columns) * (grid.cellHeight + grid.gutterY),
    width: grid.cellWidth,
    height: grid.cellHeight,
  }));
}

/**
 * The grid of a picture that is said to hold `columns` × `rows` frames, with no gutters or margins.
 * @throws RangeError when the picture is too small to be cut so
 */
export function evenGrid(width: number, height: number, columns: number, rows: number): Grid {
  const cellWidth = Math.floor(width / columns);
  const cellHeight = Math.floor(height / rows);
  if (cellWidth < 1 || cellHeight < 1) {
    throw new RangeError(`A picture of ${width} × ${height} px cannot be cut into ${columns} × ${rows} frames.`);
  }
  const none = { gutterX: 0, gutterY: 0, marginX: 0, marginY: 0 };
  return { columns, rows, cellWidth, cellHeight, ...none, count: columns * rows, confidence: 1 };
}
