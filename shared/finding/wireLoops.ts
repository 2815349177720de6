import { labelRegions } from './components.ts';
import { closeGaps, grow, largestPart, opened, type Silhouette } from './silhouette.ts';

/** Half the width up to which a part is a wire, as a share of the thing's size. */
const WIRE = 0.1;
/** Share of a hole's wall that has to be wire. */
const WIRE_WALL = 0.25;
/** Mean difference in grey levels up to which a hole shows the background itself. */
const SEE_THROUGH = 2.5;

/** How far the mean colour of some pixels is from that of the background there, grey levels. */
export type MeanDifference = (pixels: number[]) => number;

/**
 * A shape without its loops of wire: the handle of a bucket encloses background that is none of its area. Null where
 * the shape has no such loop; a thing that is drawn in outline only has nothing solid and keeps its inside.
 * @param mask what differs from the background in the window
 */
export function withoutLoops(
  shape: Silhouette,
  mask: Uint8Array,
  width: number,
  height: number,
  closing: number,
  tint: MeanDifference,
): Silhouette | null {
  const closed = closeGaps(mask, width, height, closing).map((value, at) => value & shape.filled[at]);
  const filled = shape.filled.slice();
  if (!openLoops(filled, closed, width, height, tint)) return null;
  return largestPart(filled, width, height);
}

function openLoops(
  filled: Uint8Array,
  closed: Uint8Array,
  width: number,
  height: number,
  tint: MeanDifference,
): boolean {
  const holes = filled.map((value, at) => (value === 1 && closed[at] === 0 ? 1 : 0));
  const count = (values: Uint8Array): number => values.reduce((sum, value) => sum + value, 0);
  const area = count(filled);
  if (count(holes) < 0.03 * area) return false;
  const half = Math.max(2, Math.round(WIRE * Math.sqrt(area)));
  const body = closed.slice();
  const { labels, regions } = labelRegions(holes, width, height);
  const loops: Uint8Array[] = [];
  for (const hole of regions) {
    const own = labels.map((label) => (label === hole.label ? 1 : 0));
    const pixels: number[] = [];
    for (let at = 0; at < own.length; at++) if (own[at] === 1) pixels.push(at);
    if (hole.area >= 0.03 * area && tint(pixels) <= SEE_THROUGH) loops.push(Uint8Array.from(own));
    else for (const at of pixels) body[at] = 1;
  }
  const solid = opened(body, width, height, half);
  if (count(solid) < 0.4 * area) return false;
  let open = false;
  for (const loop of loops) {
    const around = grow(loop, width, height, half + 2);
    let wall = 0;
    let wire = 0;
    for (let at = 0; at < around.length; at++) {
      if (around[at] === 0 || closed[at] === 0) continue;
      wall++;
      if (solid[at] === 0) wire++;
    }
    if (wire < WIRE_WALL * wall) continue;
    open = true;
    for (let at = 0; at < around.length; at++) if (around[at] === 1 && solid[at] === 0) filled[at] = 0;
  }
  return open;
}
