import type { Picture } from './types.ts';

/** Width in px down to which pictures are looked at: finding works on this, measuring on the full picture. */
const COARSE_WIDTH = 640;

/** By how much a picture of this size is reduced for finding; 1 up to 1279 px wide. */
export function coarseFactor(width: number, height: number): number {
  return Math.max(1, Math.floor(Math.max(width, height) / COARSE_WIDTH));
}

/** The picture reduced `factor` times by averaging squares of pixels; edge pixels that fill no square are left out. */
export function reduce(picture: Picture, factor: number): Picture {
  if (factor === 1) return picture;
  const width = Math.floor(picture.width / factor);
  const height = Math.floor(picture.height / factor);
  const data = new Uint8Array(width * height * 3);
  const sums = new Int32Array(width * 3);
  const stride = picture.width * 3;
  const count = factor * factor;
  const half = count >> 1;
  for (let y = 0; y < height; y++) {
    sums.fill(half);
    for (let dy = 0; dy < factor; dy++) {
      let from = (y * factor + dy) * stride;
      for (let at = 0; at < width * 3; at += 3) {
        for (let dx = 0; dx < factor; dx++, from += 3) {
          sums[at] += picture.data[from];
          sums[at + 1] += picture.data[from + 1];
          sums[at + 2] += picture.data[from + 2];
        }
      }
    }
    const row = y * width * 3;
    for (let at = 0; at < width * 3; at++) data[row + at] = (sums[at] / count) | 0;
  }
  return { width, height, data };
}
