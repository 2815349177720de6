import type { Silhouette } from './silhouette.ts';
import type { Picture } from './types.ts';

/** Deepest ring inside the edge that is looked at for a drawn line, px. */
const DEEPEST = 9;
/** Grey levels by which a drawn line is darker than what it encloses. */
const LINE_CONTRAST = 35;

/**
 * The area centroid of a shape whose edge is drawn with a line: the shape ends in the middle of the line, so half of
 * the line's width is taken off all round. For a disc that changes nothing; for a hat it moves the centre by most of a
 * pixel. A shape without a darker rim keeps its centroid.
 */
export function insideLine(shape: Silhouette, frame: Picture): { x: number; y: number } {
  const rings = ringsOf(shape, frame.width, frame.height);
  const bright = rings.map((ring) => meanBrightness(ring, frame.data));
  const line = lineWidth(bright, rings);
  if (line === 0) return { x: shape.x, y: shape.y };
  return centroidBelow(shape, rings, line / 2, frame.width);
}

/** The shape's pixels by their depth under its edge: ring 0 is the edge itself. */
function ringsOf(shape: Silhouette, width: number, height: number): number[][] {
  const left = shape.filled.slice();
  const rings: number[][] = [];
  for (let depth = 0; depth <= DEEPEST; depth++) {
    const ring: number[] = [];
    for (let y = shape.y0; y <= shape.y1; y++) {
      for (let x = shape.x0; x <= shape.x1; x++) {
        const at = y * width + x;
        if (left[at] === 0) continue;
        const atBorder = x === 0 || y === 0 || x === width - 1 || y === height - 1;
        if (atBorder || left[at - 1] + left[at + 1] + left[at - width] + left[at + width] < 4) ring.push(at);
      }
    }
    if (ring.length === 0) break;
    for (const at of ring) left[at] = 0;
    rings.push(ring);
  }
  return rings;
}

function meanBrightness(ring: number[], data: Uint8Array): number {
  let sum = 0;
  // The largest channel: a dark line stands out from dark blue or dark red by that one alone.
  for (const at of ring) sum += Math.max(data[at * 3], data[at * 3 + 1], data[at * 3 + 2]);
  return sum / ring.length;
}

/** Width of the dark rim in px, between the places where it is half as dark as in its middle; 0 without a rim. */
function lineWidth(bright: number[], rings: number[][]): number {
  if (rings.length < 4) return 0;
  const darkest = bright.slice(0, 4).reduce((least, value, k) => (value < bright[least] ? k : least), 0);
  let inner = darkest;
  while (inner + 1 < bright.length && bright[inner + 1] >= bright[inner]) inner++;
  if (bright[inner] - bright[darkest] < LINE_CONTRAST) return 0;
  const half = (bright[inner] + bright[darkest]) / 2;
  let end = darkest;
  while (bright[end] < half) end++;
  const share = (half - bright[end - 1]) / (bright[end] - bright[end - 1]);
  // Ring k reaches from depth k to k + 1 and stands for its middle.
  return end - 1 + share + 0.5;
}

/** Centroid of what lies deeper than `depth` px, the ring that the depth cuts counted in part. */
function centroidBelow(shape: Silhouette, rings: number[][], depth: number, width: number): { x: number; y: number } {
  let area = shape.area;
  let sumX = (shape.x - 0.5) * area;
  let sumY = (shape.y - 0.5) * area;
  rings.forEach((ring, k) => {
    const share = Math.max(0, Math.min(1, depth - k));
    for (const at of ring) {
      area -= share;
      sumX -= share * (at % width);
      sumY -= share * Math.floor(at / width);
    }
  });
  if (area < 0.2 * shape.area) return { x: shape.x, y: shape.y };
  return { x: sumX / area + 0.5, y: sumY / area + 0.5 };
}
