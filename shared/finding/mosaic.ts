import type { Pose } from './align.ts';
import type { Box } from './grid.ts';
import type { GroundCut } from './measure.ts';
import type { Grey } from './phaseCorrelation.ts';
import type { Picture } from './types.ts';

const TILE = 32;
/** Pictures that have to show a place before their median counts. */
const LEAST_VIEWS = 3;
/** Largest stage against one picture; a camera that goes further than this is followed no more. */
const MOST_PICTURES = 12;

/**
 * The stage behind a moving camera: pictures laid where the camera saw them, and at each place the median of what they
 * show there. Worked out tile by tile where it is wanted.
 */
export class Mosaic {
  readonly width: number;
  readonly height: number;
  readonly #left: number;
  readonly #top: number;
  readonly #samples: Picture[];
  readonly #poses: Pose[];
  readonly #data: Uint8Array;
  readonly #known: Uint8Array;
  readonly #done: Uint8Array;

  /**
   * @param poses where each picture lies on the stage
   * @throws RangeError when the stage would be larger than a dozen pictures
   */
  constructor(samples: Picture[], poses: Pose[]) {
    const boxes = poses.map((pose, k) => ({
      left: pose.dx,
      top: pose.dy,
      right: pose.dx + samples[k].width / pose.zoom,
      bottom: pose.dy + samples[k].height / pose.zoom,
    }));
    this.#left = Math.floor(Math.min(...boxes.map((box) => box.left)));
    this.#top = Math.floor(Math.min(...boxes.map((box) => box.top)));
    this.width = Math.ceil(Math.max(...boxes.map((box) => box.right))) - this.#left;
    this.height = Math.ceil(Math.max(...boxes.map((box) => box.bottom))) - this.#top;
    if (this.width * this.height > MOST_PICTURES * samples[0].width * samples[0].height) {
      throw new RangeError('The camera goes too far for one background.');
    }
    this.#samples = samples;
    this.#poses = poses;
    this.#data = new Uint8Array(this.width * this.height * 3);
    this.#known = new Uint8Array(this.width * this.height);
    this.#done = new Uint8Array(Math.ceil(this.width / TILE) * Math.ceil(this.height / TILE));
  }

  /** The whole stage in grey, NaN where it is not known; the pose that lays it on itself is the second value. */
  grey(): { grey: Grey; origin: { x: number; y: number } } {
    this.#prepare(0, 0, this.width - 1, this.height - 1);
    const data = new Float32Array(this.width * this.height);
    for (let at = 0; at < data.length; at++) {
      const value = 0.299 * this.#data[at * 3] + 0.587 * this.#data[at * 3 + 1] + 0.114 * this.#data[at * 3 + 2];
      data[at] = this.#known[at] === 1 ? value : Number.NaN;
    }
    return { grey: { width: this.width, height: this.height, data }, origin: { x: this.#left, y: this.#top } };
  }

  /** What a picture in a pose would show in a box of it if nothing stood in front. */
  window(box: Box, pose: Pose): GroundCut {
    const data = new Uint8Array(box.width * box.height * 3);
    const known = new Uint8Array(box.width * box.height);
    const stageX = (x: number): number => (x + 0.5) / pose.zoom + pose.dx - 0.5 - this.#left;
    const stageY = (y: number): number => (y + 0.5) / pose.zoom + pose.dy - 0.5 - this.#top;
    this.#prepare(
      Math.floor(stageX(box.left)),
      Math.floor(stageY(box.top)),
      Math.floor(stageX(box.left + box.width)) + 1,
      Math.floor(stageY(box.top + box.height)) + 1,
    );
    for (let y = 0; y < box.height; y++) {
      const sy = stageY(box.top + y);
      const y0 = Math.floor(sy);
      if (y0 < 0 || y0 >= this.height - 1) continue;
      for (let x = 0; x < box.width; x++) {
        const sx = stageX(box.left + x);
        const x0 = Math.floor(sx);
        if (x0 < 0 || x0 >= this.width - 1) continue;
        const at = y0 * this.width + x0;
        const k = this.#known;
        if ((k[at] & k[at + 1] & k[at + this.width] & k[at + this.width + 1]) === 0) continue;
        const to = y * box.width + x;
        known[to] = 1;
        bilinear(this.#data, at * 3, this.width * 3, sx - x0, sy - y0, data, to * 3);
      }
    }
    return { left: box.left, top: box.top, width: box.width, height: box.height, data, known };
  }

  #prepare(x0: number, y0: number, x1: number, y1: number): void {
    const across = Math.ceil(this.width / TILE);
    const down = Math.ceil(this.height / TILE);
    for (let ty = Math.max(0, Math.floor(y0 / TILE)); ty <= Math.min(down - 1, Math.floor(y1 / TILE)); ty++) {
      for (let tx = Math.max(0, Math.floor(x0 / TILE)); tx <= Math.min(across - 1, Math.floor(x1 / TILE)); tx++) {
        if (this.#done[ty * across + tx] === 1) continue;
        this.#done[ty * across + tx] = 1;
        this.#work(tx * TILE, ty * TILE);
      }
    }
  }

  #work(left: number, top: number): void {
    const count = this.#samples.length;
    const values = new Uint8Array(count * 3);
    const channel = new Uint8Array(count);
    for (let y = top; y < Math.min(this.height, top + TILE); y++) {
      for (let x = left; x < Math.min(this.width, left + TILE); x++) {
        let views = 0;
        for (let k = 0; k < count; k++) {
          const { dx, dy, zoom } = this.#poses[k];
          const sample = this.#samples[k];
          const px = (x + 0.5 + this.#left - dx) * zoom - 0.5;
          const py = (y + 0.5 + this.#top - dy) * zoom - 0.5;
          const x0 = Math.floor(px);
          const y0 = Math.floor(py);
          if (x0 < 0 || y0 < 0 || x0 >= sample.width - 1 || y0 >= sample.height - 1) continue;
          bilinear(sample.data, (y0 * sample.width + x0) * 3, sample.width * 3, px - x0, py - y0, values, views * 3);
          views++;
        }
        if (views < LEAST_VIEWS) continue;
        const at = y * this.width + x;
        this.#known[at] = 1;
        for (let c = 0; c < 3; c++) {
          for (let k = 0; k < views; k++) channel[k] = values[k * 3 + c];
          this.#data[at * 3 + c] = middleOf(channel, views);
        }
      }
    }
  }
}

function bilinear(
  from: Uint8Array,
  at: number,
  stride: number,
  fx: number,
  fy: number,
  into: Uint8Array,
  to: number,
): void {
  for (let c = 0; c < 3; c++) {
    const a = from[at + c];
    const b = from[at + 3 + c];
    const d = from[at + stride + c];
    const e = from[at + stride + 3 + c];
    into[to + c] = (a + fx * (b - a)) * (1 - fy) + (d + fx * (e - d)) * fy + 0.5;
  }
}

function middleOf(values: Uint8Array, count: number): number {
  for (let k = 1; k < count; k++) {
    const value = values[k];
    let place = k;
    while (place > 0 && values[place - 1] > value) {
      values[place] = values[place - 1];
      place--;
    }
    values[place] = value;
  }
  return values[count >> 1];
}
