import type { Picture } from './types.ts';

/** Grey levels under which a difference is never taken for a thing, however quiet the picture. */
const LEAST_THRESHOLD = 6;
const LARGEST_THRESHOLD = 60;
/** Times the upper quartile of all differences: about five standard deviations of sensor noise. */
const NOISE_TIMES = 4;

/**
 * How far a picture is from its background at each pixel: the largest of the three channels' differences, grey levels.
 * Colour is kept because a thing often has the grey of what is behind it.
 */
export function difference(picture: Picture, background: Picture, into: Uint8Array): Uint8Array {
  const a = picture.data;
  const b = background.data;
  for (let pixel = 0, at = 0; pixel < into.length; pixel++, at += 3) {
    let red = a[at] - b[at];
    let green = a[at + 1] - b[at + 1];
    let blue = a[at + 2] - b[at + 2];
    if (red < 0) red = -red;
    if (green < 0) green = -green;
    if (blue < 0) blue = -blue;
    if (green > red) red = green;
    into[pixel] = blue > red ? blue : red;
  }
  return into;
}

/** Share of a background's step from pixel to pixel that a camera followed to a fraction of a pixel leaves behind. */
const SLACK = 0.6;

/**
 * The difference from a background that was followed under a moving camera: less what a small error of the camera's
 * place makes of the background's own edges, and nothing where the background is not known.
 */
export function looseDifference(
  picture: Picture,
  background: Picture,
  known: Uint8Array,
  into: Uint8Array,
): Uint8Array {
  difference(picture, background, into);
  const { width, height, data } = background;
  for (let y = 0, at = 0; y < height; y++) {
    const up = y > 0 ? -width : 0;
    const down = y < height - 1 ? width : 0;
    for (let x = 0; x < width; x++, at++) {
      if (into[at] === 0) continue;
      if (known[at] === 0) {
        into[at] = 0;
        continue;
      }
      const left = x > 0 ? -1 : 0;
      const right = x < width - 1 ? 1 : 0;
      let slope = 0;
      for (let c = 0; c < 3; c++) {
        const here = data[at * 3 + c];
        const across = Math.max(
          Math.abs(data[(at + right) * 3 + c] - here),
          Math.abs(data[(at + left) * 3 + c] - here),
        );
        const along = Math.max(Math.abs(data[(at + down) * 3 + c] - here), Math.abs(data[(at + up) * 3 + c] - here));
        slope = Math.max(slope, across, along);
      }
      into[at] = Math.max(0, into[at] - SLACK * slope);
    }
  }
  return into;
}

/** The difference that noise does not reach, grey levels: the thing covers less than a quarter of the picture. */
export function noiseThreshold(differences: Uint8Array, least = LEAST_THRESHOLD): number {
  const counts = new Uint32Array(256);
  for (let pixel = 0; pixel < differences.length; pixel += 3) counts[differences[pixel]]++;
  const wanted = Math.ceil(differences.length / 3) * 0.75;
  let seen = 0;
  let quartile = 0;
  while (quartile < 255 && seen + counts[quartile] < wanted) seen += counts[quartile++];
  return Math.min(LARGEST_THRESHOLD, Math.max(least, NOISE_TIMES * quartile));
}
