import { type Grid, gridCells } from '../../../shared/finding/grid.ts';
import type { Picture } from '../../../shared/finding/types.ts';
import { paintTake } from '../../support/paintTake.ts';

export interface MountOptions {
  columns: number;
  rows: number;
  gutter: number;
  gutterY?: number;
  margin: number;
  /** Grey of gutters and margins. */
  ground: number;
  /** Frames mounted; the cells after them stay empty. */
  frames?: number;
  /** A line of bars in the top margin, as a title would be. */
  label?: boolean;
}

const CELL = { width: 96, height: 64 };

/** Mounts a painted take on one picture and answers the grid it was mounted by. */
export function mountStrip(options: Partial<MountOptions>): { picture: Picture; grid: Grid; cells: Picture[] } {
  const { columns = 4, rows = 1, gutter = 0, margin = 0, ground = 0 } = options;
  const gutterX = columns > 1 ? gutter : 0;
  const gutterY = rows > 1 ? (options.gutterY ?? gutter) : 0;
  const count = options.frames ?? columns * rows;
  const grid: Grid = {
    columns,
    rows,
    cellWidth: CELL.width,
    cellHeight: CELL.height,
    gutterX,
    gutterY,
    marginX: margin,
    marginY: margin,
    count,
  };
  const width = 2 * margin + columns * (CELL.width + gutterX) - gutterX;
  const height = 2 * margin + rows * (CELL.height + gutterY) - gutterY;
  const data = new Uint8Array(width * height * 3).fill(ground);
  if (options.label) {
    for (let x = 10; x < 120; x += 7) {
      for (let y = 6; y < 16; y++) data.fill(200, (y * width + x) * 3, (y * width + x + 4) * 3);
    }
  }
  const disc = (frame: number) => ({ x: 8 + 4 * frame, y: 50 - 9 * frame + frame * frame });
  const cells = paintTake({ ...CELL, frames: count, radius: 6, discs: [disc] }).pictures;
  for (const [index, cell] of gridCells(grid).entries()) {
    for (let y = 0; y < CELL.height; y++) {
      const from = y * CELL.width * 3;
      data.set(cells[index].data.subarray(from, from + CELL.width * 3), ((cell.top + y) * width + cell.left) * 3);
    }
  }
  return { picture: { width, height, data }, grid, cells };
}
