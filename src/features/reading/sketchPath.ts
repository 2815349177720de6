import type { Sketch } from '../../../shared/api/takes.ts';

/**
 * The flights of a sketch as path data that fill a small box, px of that box. What was drawn in the air; all marks when
 * nothing flew.
 */
export function sketchPath(
  sketch: Pick<Sketch, 'marks' | 'arcs'>,
  box: { width: number; height: number; pad: number },
): string {
  const aloft = sketch.arcs.flatMap((arc) => {
    const from = (arc.points[0]?.frame ?? 0) - 0.5;
    const to = (arc.points.at(-1)?.frame ?? 0) + 0.5;
    const marks = sketch.marks.filter((mark) => mark.object === arc.object && mark.frame >= from && mark.frame <= to);
    return marks.length > 1 ? [marks] : [];
  });
  const objects = [...new Set(sketch.marks.map((mark) => mark.object))];
  const lines = aloft.length > 0 ? aloft : objects.map((id) => sketch.marks.filter((mark) => mark.object === id));
  const points = lines.flat();
  if (points.length < 2) return '';
  const left = Math.min(...points.map((point) => point.x));
  const top = Math.min(...points.map((point) => point.y));
  const width = Math.max(...points.map((point) => point.x)) - left;
  const height = Math.max(...points.map((point) => point.y)) - top;
  const free = { width: box.width - 2 * box.pad, height: box.height - 2 * box.pad };
  const scale = Math.min(free.width / Math.max(width, 1), free.height / Math.max(height, 1));
  const at = (point: { x: number; y: number }) =>
    `${(box.pad + (free.width - width * scale) / 2 + (point.x - left) * scale).toFixed(1)} ${(box.height - box.pad - (top + height - point.y) * scale).toFixed(1)}`;
  return lines.map((line) => `M${line.map(at).join('L')}`).join('');
}
