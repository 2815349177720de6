import { basename, join } from 'node:path';
import sharp from 'sharp';
import { unfoldDurations } from '../../../shared/finding/durations.ts';
import { PictureError } from '../PictureError.ts';
import { MAX_PIXELS } from '../pictureLimits.ts';
import { MOST_FRAMES, repeatPaths, type UnfoldedFrames } from './UnfoldedFrames.ts';

/**
 * Takes an animated GIF or WebP apart into one PNG a picture, each shown as many frames as its duration says.
 * @throws PictureError when it is damaged or has too many pictures
 */
export async function unfoldPages(path: string, originalName: string, outDir: string): Promise<UnfoldedFrames> {
  const name = originalName || basename(path);
  try {
    const { pages = 1, delay = [] } = await sharp(path, { limitInputPixels: MAX_PIXELS }).metadata();
    const { repeats, fps } = unfoldDurations(Array.from({ length: pages }, (_, page) => delay[page] ?? 0));
    if (repeats.reduce((sum, repeat) => sum + repeat, 0) > MOST_FRAMES) throw tooLong(name);
    const paths: string[] = [];
    for (let page = 0; page < pages; page++) {
      const framePath = join(outDir, `frame-${String(page + 1).padStart(4, '0')}.png`);
      await sharp(path, { page, limitInputPixels: MAX_PIXELS, failOn: 'error' })
        .png({ compressionLevel: 2 })
        .toFile(framePath);
      paths.push(framePath);
    }
    return { kind: 'animation', framePaths: repeatPaths(paths, repeats), fps, cautions: [] };
  } catch (cause) {
    if (cause instanceof PictureError) throw cause;
    throw new PictureError(name, 'damaged_picture', `“${name}” is cut off or damaged; export it again.`);
  }
}

export function tooLong(name: string): PictureError {
  return new PictureError(
    name,
    'picture_too_large',
    `“${name}” shows for more than ${MOST_FRAMES.toLocaleString('en-GB')} frames; give a part of the shot.`,
  );
}
