import { mkdir, writeFile } from 'node:fs/promises';
import { basename, join } from 'node:path';
import sharp from 'sharp';
import { detectGrid } from '../../shared/finding/detectGrid.ts';
import { type Grid, gridCells } from '../../shared/finding/grid.ts';
import { decodePicture } from './decode.ts';
import { PictureError } from './PictureError.ts';
import { MAX_PIXELS } from './pictureLimits.ts';

export interface StripFrame {
  path: string;
  width: number;
  height: number;
}

/**
 * Finds where the frames lie in a strip picture, px.
 * @throws PictureError when the file cannot be decoded
 */
export async function findGrid(path: string): Promise<Grid> {
  return detectGrid(await decodePicture(path));
}

/**
 * Cuts a strip picture into one PNG a frame, `frame-0001.png` and on, row by row.
 * @returns the frames in order
 * @throws PictureError when the file cannot be decoded or the grid reaches past its edge
 */
export async function splitStrip(path: string, grid: Grid, outDir: string): Promise<StripFrame[]> {
  const strip = await decodePicture(path);
  const raw = { width: strip.width, height: strip.height, channels: 3 as const };
  await mkdir(outDir, { recursive: true });
  const frames: StripFrame[] = [];
  for (const [index, cell] of gridCells(grid).entries()) {
    if (cell.left + cell.width > strip.width || cell.top + cell.height > strip.height) {
      const name = basename(path);
      const sentence = `The grid of ${grid.columns} × ${grid.rows} frames reaches past the edge of “${name}”; correct it and try again.`;
      throw new PictureError(name, 'no_grid', sentence);
    }
    const framePath = join(outDir, `frame-${String(index + 1).padStart(4, '0')}.png`);
    const png = await sharp(strip.data, { raw, limitInputPixels: MAX_PIXELS })
      .extract(cell)
      .png({ compressionLevel: 4 })
      .toBuffer();
    // Written by Node: sharp's own errors have no code, and a full disk must be told from a broken picture.
    await writeFile(framePath, png);
    frames.push({ path: framePath, width: cell.width, height: cell.height });
  }
  return frames;
}
