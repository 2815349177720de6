import { basename } from 'node:path';
import sharp from 'sharp';
import type { Picture } from '../../shared/finding/types.ts';
import { inspectPicture } from './inspect.ts';
import { MAX_PIXELS } from './pictureLimits.ts';
import { PictureError } from './PictureError.ts';

/**
 * Decodes a picture file to RGB bytes, upright. Transparency is laid on white paper.
 * @throws PictureError when the file is damaged or is no picture
 */
export async function decodePicture(path: string): Promise<Picture> {
  try {
    const { data, info } = await sharp(path, { limitInputPixels: MAX_PIXELS, failOn: 'error' })
      .autoOrient()
      .flatten({ background: '#ffffff' })
      .toColourspace('srgb')
      .raw({ depth: 'uchar' })
      .toBuffer({ resolveWithObject: true });
    const bytes = new Uint8Array(data.buffer, data.byteOffset, data.byteLength);
    return { width: info.width, height: info.height, data: info.channels === 3 ? bytes : toRgb(bytes, info.channels) };
  } catch {
    const name = basename(path);
    // The inspection knows why: an empty file, a text file, a picture of the wrong kind.
    await inspectPicture(path, name);
    throw new PictureError(name, 'damaged_picture', `“${name}” is damaged and cannot be read; export it again.`);
  }
}

function toRgb(bytes: Uint8Array, channels: number): Uint8Array {
  const rgb = new Uint8Array((bytes.length / channels) * 3);
  const step = channels >= 3 ? 1 : 0;
  for (let from = 0, to = 0; from < bytes.length; from += channels, to += 3) {
    rgb[to] = bytes[from];
    rgb[to + 1] = bytes[from + step];
    rgb[to + 2] = bytes[from + 2 * step];
  }
  return rgb;
}
