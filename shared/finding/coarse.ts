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
  if (factor === 2) {
    halveInto(picture, width, height, data);
    return { width, height, data };
  }
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

/** Factor 2 by itself: pictures of 1280 px take it, and every one of their pixels passes here. */
function halveInto(picture: Picture, width: number, height: number, into: Uint8Array): void {
  const { data } = picture;
  const stride = picture.width * 3;
  for (let y = 0, to = 0; y < height; y++) {
    let a = 2 * y * stride;
    let b = a + stride;
    for (let x = 0; x < width; x++, a += 6, b += 6, to += 3) {
      into[to] = (data[a] + data[a + 3] + data[b] + data[b + 3] + 2) >> 2;
      into[to + 1] = (data[a + 1] + data[a + 4] + data[b + 1] + data[b + 4] + 2) >> 2;
      into[to + 2] = (data[a + 2] + data[a + 5] + data[b + 2] + data[b + 5] + 2) >> 2;
    }
  }
}
