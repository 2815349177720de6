import { reduce } from './coarse.ts';
import type { Box } from './grid.ts';
import { cut, type Cut } from './measure.ts';
import { medianBytes } from './median.ts';
import type { Picture } from './types.ts';

/** What is behind the thing: reduced for finding, and any window of it in full for measuring. */
export interface Ground {
  factor: number;
  /** The background reduced by `factor`. */
  coarse: Picture;
  /** A window of the background in full. */
  window(box: Box): Cut;
}

/**
 * The background of a still camera: the median over time of some frames. In full it is worked out only where something
 * is measured, which is a small part of the picture.
 * @param samples full pictures spread over the take, all of one size
 */
export function stillGround(samples: Picture[], factor: number): Ground {
  const coarse = medianPicture(samples.map((sample) => reduce(sample, factor)));
  if (factor === 1) return { factor, coarse, window: (box) => cut(coarse, box) };
  const full = lazyMedian(samples);
  return { factor, coarse, window: full };
}

function medianPicture(pictures: Picture[]): Picture {
  const [{ width, height }] = pictures;
  const data = new Uint8Array(width * height * 3);
  const bytes = pictures.map((picture) => picture.data);
  medianBytes(bytes, 0, data.length, data, 0);
  return { width, height, data };
}

/** Pixels in a row of one tile; tiles are one row high so that each is one stretch of bytes. */
const TILE = 64;

function lazyMedian(samples: Picture[]): (box: Box) => Cut {
  const [{ width, height }] = samples;
  const picture: Picture = { width, height, data: new Uint8Array(width * height * 3) };
  const bytes = samples.map((sample) => sample.data);
  const tilesAcross = Math.ceil(width / TILE);
  const done = new Uint8Array(tilesAcross * height);
  return (box) => {
    const firstTile = Math.floor(box.left / TILE);
    const lastTile = Math.floor((box.left + box.width - 1) / TILE);
    for (let y = box.top; y < box.top + box.height; y++) {
      for (let tile = firstTile; tile <= lastTile; tile++) {
        if (done[y * tilesAcross + tile] === 1) continue;
        done[y * tilesAcross + tile] = 1;
        const from = (y * width + tile * TILE) * 3;
        const to = (y * width + Math.min(width, (tile + 1) * TILE)) * 3;
        medianBytes(bytes, from, to, picture.data, from);
      }
    }
    return cut(picture, box);
  };
}
