import { join } from 'node:path';
import sharp from 'sharp';
import { paintTake, type PaintOptions } from './paintTake.ts';

/** Writes a painted take to a folder as PNG files and answers their paths in order. */
export async function drawTake(folder: string, options: Partial<PaintOptions>): Promise<string[]> {
  const { pictures } = paintTake(options);
  return Promise.all(
    pictures.map(async ({ width, height, data }, index) => {
      const path = join(folder, `f_${String(index + 1).padStart(4, '0')}.png`);
      await sharp(data, { raw: { width, height, channels: 3 } })
        .png()
        .toFile(path);
      return path;
    }),
  );
}
