import sharp from 'sharp';
import { MAX_PIXELS } from './pictureLimits.ts';

/**
 * Writes a WebP thumbnail beside the frame, upright and never larger than the picture itself.
 * @param options.width width of the thumbnail in px
 */
export async function makeThumbnail(path: string, outPath: string, options: { width: number }): Promise<void> {
  await sharp(path, { limitInputPixels: MAX_PIXELS, failOn: 'error' })
    .autoOrient()
    .resize({ width: options.width, withoutEnlargement: true })
    .webp({ quality: 80 })
    .toFile(outPath);
}
