import type { Flight, Point } from '../../shared/reading/document.ts';

/**
 * Where the true arc is at a time in frames (fractions allowed), px. Through the three nearest points by Lagrange's
 * formula, which is exact on a parabola, also between and a little beyond its points. Null for fewer than two points.
 */
export function arcAt(trueArc: Flight['trueArc'], frame: number): Point | null {
  const exact = trueArc.find((point) => point.frame === frame);
  if (exact) return { x: exact.x, y: exact.y };
  const nearest = trueArc.toSorted((a, b) => Math.abs(a.frame - frame) - Math.abs(b.frame - frame)).slice(0, 3);
  if (nearest.length < 2) return null;
  let x = 0;
  let y = 0;
  for (const point of nearest) {
    let weight = 1;
    for (const other of nearest) {
      if (other !== point) weight *= (frame - other.frame) / (point.frame - other.frame);
    }
    x += weight * point.x;
    y += weight * point.y;
  }
  return Number.isFinite(x) && Number.isFinite(y) ? { x, y } : null;
}
