import { writeFile } from 'node:fs/promises';
import sharp from 'sharp';
import { MAX_PIXELS } from './pictureLimits.ts';

/**
 * Writes a WebP thumbnail beside the frame, upright and never larger than the picture itself.
 * @param options.width width of the thumbnail in px
 */
export async function makeThumbnail(path: string, outPath: string, options: { width: number }): Promise<void> {
  const webp = await sharp(path, { limitInputPixels: MAX_PIXELS, failOn: 'error' })
    .autoOrient()
    .resize({ width: options.width, withoutEnlargement: true })
    .webp({ quality: 80 })
    .toBuffer();
  // Written by Node: sharp's own errors have no code, and a full disk must be told from a broken picture.
  await writeFile(outPath, webp);
}
