import type { Picture } from './types.ts';

/**
 * Each pixel averaged with its eight neighbours: grain falls to a third of itself, and what is several pixels large stays.
 * At the edge the nearest pixel stands for what is outside.
 */
export function smooth(picture: Picture): Picture {
  const { width, height, data } = picture;
  const stride = width * 3;
  const across = new Uint16Array(data.length);
  for (let y = 0; y < height; y++) {
    const row = y * stride;
    for (let at = 0; at < stride; at++) {
      const left = at >= 3 ? at - 3 : at;
      const right = at + 3 < stride ? at + 3 : at;
      across[row + at] = data[row + left] + data[row + at] + data[row + right];
    }
  }
  const out = new Uint8Array(data.length);
  for (let y = 0; y < height; y++) {
    const row = y * stride;
    const above = y > 0 ? row - stride : row;
    const below = y < height - 1 ? row + stride : row;
    for (let at = 0; at < stride; at++) {
      out[row + at] = (across[above + at] + across[row + at] + across[below + at] + 4) / 9;
    }
  }
  return { width, height, data: out };
}

/** Grey levels of grain from which on pictures are smoothed before anything else. */
const GRAINY = 4;

/**
 * True when the pictures carry so much grain that a faint thing would drown in it. Grain is what a pixel differs from
 * the mean of its neighbours to the left and right, in the quieter half of the picture: there it is no texture.
 */
export function isGrainy(pictures: Picture[]): boolean {
  const levels = pictures.slice(0, 3).map(grainOf);
  return levels.toSorted((a, b) => a - b)[levels.length >> 1] > GRAINY;
}

function grainOf({ width, height, data }: Picture): number {
  const counts = new Uint32Array(256);
  let total = 0;
  for (let y = 1; y < height - 1; y += 3) {
    for (let x = 1; x < width - 1; x += 3) {
      const at = (y * width + x) * 3 + 1;
      const step = Math.abs(2 * data[at] - data[at - 3] - data[at + 3]);
      counts[step >> 1]++;
      total++;
    }
  }
  // The median of |a - mean of two| is 0.83 standard deviations; a quarter of the picture is 0.39 of them.
  let seen = 0;
  let quartile = 0;
  while (quartile < 255 && seen + counts[quartile] < total / 4) seen += counts[quartile++];
  const share = counts[quartile] === 0 ? 0 : (total / 4 - seen) / counts[quartile];
  return (quartile + share) / 0.39;
}

/** Colours of a picture up to which it was reduced to a palette, which dithers: the pixels around a thing change with it. */
const PALETTE = 256;

/** True when a picture has no more colours than a palette holds. */
export function isPaletted({ data }: Picture): boolean {
  const colours = new Set<number>();
  for (let at = 0; at < data.length; at += 3) {
    colours.add((data[at] << 16) | (data[at + 1] << 8) | data[at + 2]);
    if (colours.size > PALETTE) return false;
  }
  return true;
}
