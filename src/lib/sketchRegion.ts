import type { Sketch } from '../../shared/api/takes.ts';

export interface Region {
  x: number;
  y: number;
  width: number;
  height: number;
}

/** Room around what was read, as a share of the picture's width. */
const MARGIN = 0.08;

/** The part of the picture that a card has to show: every mark and every true arc with some room around, px of the picture. */
export function sketchRegion({ width, height, marks, arcs }: Sketch): Region {
  const points = [...marks, ...arcs.flatMap((arc) => arc.points)];
  if (points.length === 0) return { x: 0, y: 0, width, height };
  const margin = MARGIN * width;
  const left = Math.max(0, Math.min(...points.map((point) => point.x)) - margin);
  const top = Math.max(0, Math.min(...points.map((point) => point.y)) - margin);
  const right = Math.min(width, Math.max(...points.map((point) => point.x)) + margin);
  const bottom = Math.min(height, Math.max(...points.map((point) => point.y)) + margin);
  return { x: left, y: top, width: Math.max(1, right - left), height: Math.max(1, bottom - top) };
}
