import { align, greyOf, type Pose, pyramidOf } from './align.ts';
import { cameraOf, isMoved, LEVELS, STILL, withZoomWhereNeeded } from './camera.ts';
import { reduce } from './coarse.ts';
import type { Box } from './grid.ts';
import { cut, type GroundCut } from './measure.ts';
import { medianBytes } from './median.ts';
import { Mosaic } from './mosaic.ts';
import type { Grey } from './phaseCorrelation.ts';
import type { Picture } from './types.ts';

/** What is behind the thing: reduced for finding, and any window of it in full for measuring. */
export interface Ground {
  moves: boolean;
  /**
   * Where the camera was on a picture, px of the full picture.
   * @param index place of the picture in the take, from 0
   */
  poseOf(index: number, coarse: Picture): Pose;
  /** The background of a whole reduced picture. */
  coarse(pose: Pose): GroundCut;
  /** A window of the background in full. */
  window(box: Box, pose: Pose): GroundCut;
}

/**
 * Learns the background from some frames of a take.
 * @param samples full pictures spread over the take, all of one size
 * @param indices their places in the take, ascending
 */
export function learnGround(
  samples: Picture[],
  indices: number[],
  factor: number,
  camera?: 'still' | 'moving',
): Ground {
  const reduced = samples.map((sample) => reduce(sample, factor));
  const poses = camera === 'still' ? null : cameraOf(reduced);
  if (!poses) return stillGround(samples, reduced, factor);
  try {
    return movingGround({ samples, reduced, indices, factor, poses });
  } catch (cause) {
    if (cause instanceof RangeError) return stillGround(samples, reduced, factor);
    throw cause;
  }
}

/**
 * The background of a still camera: the median over time. In full it is worked out only where something is measured,
 * which is a small part of the picture.
 */
function stillGround(samples: Picture[], reduced: Picture[], factor: number): Ground {
  const coarse = medianPicture(reduced);
  const whole: GroundCut = { left: 0, top: 0, ...coarse, known: null };
  const window = factor === 1 ? (box: Box): GroundCut => ({ ...cut(coarse, box), known: null }) : lazyMedian(samples);
  return { moves: false, poseOf: () => STILL, coarse: () => whole, window };
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

function lazyMedian(samples: Picture[]): (box: Box) => GroundCut {
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
    return { ...cut(picture, box), known: null };
  };
}

interface Moving {
  samples: Picture[];
  reduced: Picture[];
  indices: number[];
  factor: number;
  poses: Pose[];
}

/** The background of a moving camera: the stage, laid together from the samples. */
function movingGround({ samples, reduced, indices, factor, poses }: Moving): Ground {
  const refined = refine(reduced, poses);
  const stage = new Mosaic(reduced, refined);
  const full =
    factor === 1
      ? stage
      : new Mosaic(
          samples,
          refined.map((pose) => scaled(pose, factor)),
        );
  const reference = stagePyramid(stage);
  const known = new Map(indices.map((index, k) => [index, refined[k]]));
  const [{ width, height }] = reduced;
  const whole: Box = { left: 0, top: 0, width, height };
  return {
    moves: isMoved(refined),
    poseOf: (index, coarse) => {
      const pose = known.get(index) ?? reference.place(coarse, between(indices, refined, index));
      known.set(index, pose);
      return scaled(pose, factor);
    },
    coarse: (pose) => stage.window(whole, scaled(pose, 1 / factor)),
    window: (box, pose) => full.window(box, pose),
  };
}

/** Each sample laid once more, now on all of them together: errors from one to the next do not add up. */
function refine(reduced: Picture[], poses: Pose[]): Pose[] {
  const reference = stagePyramid(new Mosaic(reduced, poses));
  return reduced.map((sample, k) => reference.place(sample, poses[k]));
}

function stagePyramid(stage: Mosaic) {
  const { grey, origin } = stage.grey();
  const pyramid: Grey[] = pyramidOf(grey, LEVELS);
  return {
    place: (picture: Picture, start: Pose): Pose => {
      const local: Pose = { ...start, dx: start.dx - origin.x, dy: start.dy - origin.y };
      const own = pyramidOf(greyOf(picture), LEVELS);
      const plain = align(pyramid, own, local, false);
      const { pose } = withZoomWhereNeeded(pyramid, own, plain);
      return { ...pose, dx: pose.dx + origin.x, dy: pose.dy + origin.y };
    },
  };
}

function between(indices: number[], poses: Pose[], index: number): Pose {
  const after = indices.findIndex((sample) => sample >= index);
  if (after <= 0) return poses[after === 0 ? 0 : poses.length - 1];
  const share = (index - indices[after - 1]) / (indices[after] - indices[after - 1]);
  const [a, b] = [poses[after - 1], poses[after]];
  return {
    dx: a.dx + share * (b.dx - a.dx),
    dy: a.dy + share * (b.dy - a.dy),
    zoom: a.zoom + share * (b.zoom - a.zoom),
  };
}

function scaled(pose: Pose, by: number): Pose {
  return { dx: pose.dx * by, dy: pose.dy * by, zoom: pose.zoom };
}
