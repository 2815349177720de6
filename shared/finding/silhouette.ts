import { labelRegions } from './components.ts';

/** A filled shape: where its area balances and how large it is, px of the window it was measured in. */
export interface Silhouette {
  x: number;
  y: number;
  area: number;
  /** Standard deviations along the long and the short axis, px; both are radius / 2 for a disc. */
  long: number;
  short: number;
  /** Direction of the long axis, radians from the x axis. */
  tilt: number;
  x0: number;
  y0: number;
  x1: number;
  y1: number;
  /** 1 inside, 0 outside, over the whole window. */
  filled: Uint8Array;
}

/**
 * The filled shape that a mask draws: small gaps in its outline closed, everything inside it counted, the largest part
 * kept. Null for an empty mask.
 * @param closing px of gap to close on each side
 */
export function silhouetteOf(mask: Uint8Array, width: number, height: number, closing: number): Silhouette | null {
  return largestPart(fillHoles(closeGaps(mask, width, height, closing), width, height), width, height);
}

/**
 * The largest connected part of a filled mask, which is narrowed to that part. The centre is the area centroid, the
 * middle of the first pixel being (0.5, 0.5). Null for an empty mask.
 */
export function largestPart(filled: Uint8Array, width: number, height: number): Silhouette | null {
  const { labels, regions } = labelRegions(filled, width, height);
  if (regions.length === 0) return null;
  const largest = regions.reduce((best, region) => (region.area > best.area ? region : best));
  const centreX = largest.sumX / largest.area;
  const centreY = largest.sumY / largest.area;
  let xx = 0;
  let yy = 0;
  let xy = 0;
  for (let y = 0, at = 0; y < height; y++) {
    for (let x = 0; x < width; x++, at++) {
      const inside = labels[at] === largest.label;
      filled[at] = inside ? 1 : 0;
      if (!inside) continue;
      xx += (x - centreX) ** 2;
      yy += (y - centreY) ** 2;
      xy += (x - centreX) * (y - centreY);
    }
  }
  const mean = (xx + yy) / (2 * largest.area);
  const spread = Math.hypot((xx - yy) / 2, xy) / largest.area;
  return {
    x: centreX + 0.5,
    y: centreY + 0.5,
    area: largest.area,
    long: Math.sqrt(mean + spread),
    short: Math.sqrt(Math.max(0, mean - spread)),
    tilt: 0.5 * Math.atan2(2 * xy, xx - yy),
    x0: largest.x0,
    y0: largest.y0,
    x1: largest.x1,
    y1: largest.y1,
    filled,
  };
}

/** The mask with every pixel set that has a set one within `by` in both directions. */
export function grow(mask: Uint8Array, width: number, height: number, by: number): Uint8Array {
  return spread(spread(mask, width, height, by, 1), width, height, by, width);
}

/** Morphological opening with a square: what is thinner than twice `by` goes. */
export function opened(mask: Uint8Array, width: number, height: number, by: number): Uint8Array {
  const inverse = mask.map((value) => 1 - value);
  return grow(
    grow(inverse, width, height, by).map((value) => 1 - value),
    width,
    height,
    by,
  );
}

/** Morphological closing with a square, so that an outline with small gaps still encloses its inside. */
export function closeGaps(mask: Uint8Array, width: number, height: number, by: number): Uint8Array {
  if (by === 0) return mask.map((value) => (value === 0 ? 0 : 1));
  const grown = grow(mask, width, height, by);
  // What the window's edge hides may belong to the shape, so outside counts as inside when shrinking.
  const inverse = grown.map((value) => (value === 0 ? 1 : 0));
  const shrunk = grow(inverse, width, height, by);
  return shrunk.map((value, at) => (value === 0 || mask[at] !== 0 ? 1 : 0));
}

/** Each pixel set where any pixel within `by` along one direction is; `step` is 1 along rows, `width` along columns. */
function spread(mask: Uint8Array, width: number, height: number, by: number, step: number): Uint8Array {
  const out = new Uint8Array(mask.length);
  const along = step === 1 ? width : height;
  const lines = step === 1 ? height : width;
  const lineStep = step === 1 ? width : 1;
  for (let line = 0; line < lines; line++) {
    const start = line * lineStep;
    let reach = -1;
    for (let k = 0; k < along; k++) {
      if (mask[start + k * step] !== 0) {
        for (let back = Math.max(reach + 1, k - by); back < k; back++) out[start + back * step] = 1;
        reach = Math.min(along - 1, k + by);
      }
      if (k <= reach) out[start + k * step] = 1;
    }
  }
  return out;
}

/** Sets everything that cannot be reached from the window's edge through unset pixels. */
function fillHoles(mask: Uint8Array, width: number, height: number): Uint8Array {
  const outside = new Uint8Array(mask.length);
  const stack: number[] = [];
  const visit = (at: number): void => {
    if (mask[at] === 0 && outside[at] === 0) {
      outside[at] = 1;
      stack.push(at);
    }
  };
  for (let x = 0; x < width; x++) {
    visit(x);
    visit((height - 1) * width + x);
  }
  for (let y = 0; y < height; y++) {
    visit(y * width);
    visit(y * width + width - 1);
  }
  for (let at = stack.pop(); at !== undefined; at = stack.pop()) {
    const x = at % width;
    if (x > 0) visit(at - 1);
    if (x < width - 1) visit(at + 1);
    if (at >= width) visit(at - width);
    if (at + width < mask.length) visit(at + width);
  }
  return outside.map((value) => 1 - value);
}
