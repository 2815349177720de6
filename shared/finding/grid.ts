import { z } from 'zod';

/**
 * How a strip picture is cut into frames: a row, a column or a grid of equal cells. All lengths in px of the picture;
 * cells are read row by row, and the last `columns * rows - count` cells are empty.
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
  })
  .refine((grid) => grid.count <= grid.columns * grid.rows, {
    path: ['count'],
    message: 'There are more frames than cells.',
  })
  .meta({ id: 'Grid' });
export type Grid = z.infer<typeof gridSchema>;
