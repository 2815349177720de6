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

/** The difference that noise does not reach, grey levels: the thing covers less than a quarter of the picture. */
export function noiseThreshold(differences: Uint8Array): number {
  const counts = new Uint32Array(256);
  for (let pixel = 0; pixel < differences.length; pixel += 3) counts[differences[pixel]]++;
  const wanted = Math.ceil(differences.length / 3) * 0.75;
  let seen = 0;
  let quartile = 0;
  while (quartile < 255 && seen + counts[quartile] < wanted) seen += counts[quartile++];
  return Math.min(LARGEST_THRESHOLD, Math.max(LEAST_THRESHOLD, NOISE_TIMES * quartile));
}
