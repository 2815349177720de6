import type { Finding, Flight, Point } from '../../../shared/reading/document.ts';
import { arcAt } from '../../lib/arcAt.ts';
import type { Drawing } from '../../lib/drawings.ts';

/** Path data through points in picture px, two decimals: finer than any screen shows. */
export function pathThrough(points: readonly Point[]): string {
  return points.map((point, index) => `${index === 0 ? 'M' : 'L'}${point.x.toFixed(2)} ${point.y.toFixed(2)}`).join('');
}

/** The drawings a finding speaks of; at least one beside a lone drawing, so that a wash has a length. */
export function drawingsUnder(
  finding: Pick<Finding, 'fromFrame' | 'toFrame'>,
  drawings: readonly Drawing[],
): Drawing[] {
  return drawings.filter((drawing) => drawing.until >= finding.fromFrame && drawing.frame <= finding.toFrame);
}

/** The true arc as a smooth line, four points a frame, px. */
export function arcLine(trueArc: Flight['trueArc']): Point[] {
  const first = trueArc[0];
  const last = trueArc.at(-1);
  if (!first || !last) return [];
  const count = Math.max(1, Math.ceil((last.frame - first.frame) * 4));
  return Array.from({ length: count + 1 }, (_, index) =>
    arcAt(trueArc, first.frame + ((last.frame - first.frame) * index) / count),
  ).filter((point): point is Point => point !== null);
}

export interface MendArrow {
  frame: number;
  from: Point;
  to: Point;
  /** What to do in words, such as "up 84". Picture px. */
  words: string;
}

/** A move in an animator's words, whole px: "up 84", "left 12, up 3". y grows downwards. */
export function moveInWords(dx: number, dy: number): string {
  const across = Math.round(dx);
  const down = Math.round(dy);
  const words = [
    ...(down !== 0 ? [`${down < 0 ? 'up' : 'down'} ${Math.abs(down)}`] : []),
    ...(across !== 0 ? [`${across < 0 ? 'left' : 'right'} ${Math.abs(across)}`] : []),
  ];
  if (words.length === 0) return 'stay';
  if (Math.abs(across) > Math.abs(down)) words.reverse();
  return words.join(', ');
}

/** Where each drawing of a mend goes, from the drawing as it is; a drawing without a mark has no arrow. */
export function mendArrows(mend: Finding['mend'], drawings: readonly Drawing[]): MendArrow[] {
  return mend.flatMap(({ frame, dx, dy }) => {
    const drawing = drawings.find((candidate) => candidate.frame <= frame && frame <= candidate.until);
    if (!drawing || Math.hypot(dx, dy) < 0.5) return [];
    const to = { x: drawing.x + dx, y: drawing.y + dy };
    return [{ frame: drawing.frame, from: { x: drawing.x, y: drawing.y }, to, words: moveInWords(dx, dy) }];
  });
}

/** The shaft up to the head, and the head of an arrow as a triangle. `size`: length of the head, picture px. */
export function arrowHead(from: Point, to: Point, size: number): { shaftEnd: Point; head: string } {
  const length = Math.hypot(to.x - from.x, to.y - from.y) || 1;
  const along = { x: (to.x - from.x) / length, y: (to.y - from.y) / length };
  const reach = Math.min(size, length);
  const base = { x: to.x - along.x * reach, y: to.y - along.y * reach };
  const half = reach * 0.45;
  const head = pathThrough([
    to,
    { x: base.x - along.y * half, y: base.y + along.x * half },
    { x: base.x + along.y * half, y: base.y - along.x * half },
  ]);
  return { shaftEnd: base, head: `${head}Z` };
}

/** The highest point of the true arc and its time in frames; null without an arc. */
export function trueApex(trueArc: Flight['trueArc']): (Point & { frame: number }) | null {
  const first = trueArc[0];
  const last = trueArc.at(-1);
  if (!first || !last) return null;
  let best: (Point & { frame: number }) | null = null;
  const steps = Math.max(1, Math.round((last.frame - first.frame) * 20));
  for (let index = 0; index <= steps; index++) {
    const frame = first.frame + ((last.frame - first.frame) * index) / steps;
    const point = arcAt(trueArc, frame);
    if (point && (!best || point.y < best.y)) best = { ...point, frame };
  }
  return best;
}

export interface QuarterDrop {
  apex: Point;
  /** Level a quarter of the drop below the apex, px. */
  quarterY: number;
  /** Where the thing should be at half of the time from the apex to the end of the side; null where that side is cut. */
  sides: { half: Point; end: Point }[];
}

/**
 * The quarter drop of a flight, laid over its true arc: halfway in time between the apex and the end of a side, a fall has
 * covered a quarter of the drop (common practice, no source). Null when the arc has no apex inside.
 */
export function quarterDrop(trueArc: Flight['trueArc']): QuarterDrop | null {
  const apex = trueApex(trueArc);
  const first = trueArc[0];
  const last = trueArc.at(-1);
  if (!apex || !first || !last) return null;
  const sides = [first, last].flatMap((end) => {
    if (Math.abs(end.frame - apex.frame) < 2) return [];
    const half = arcAt(trueArc, (apex.frame + end.frame) / 2);
    return half ? [{ half, end: { x: end.x, y: end.y } }] : [];
  });
  if (sides.length === 0) return null;
  const deepest = Math.max(...sides.map((side) => side.end.y));
  return { apex, quarterY: apex.y + (deepest - apex.y) / 4, sides };
}
