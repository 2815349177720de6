import type { Sketch } from '../../shared/api/takes.ts';
import type { FindingKind } from '../../shared/reading/kinds.ts';
import { arcAt } from './arcAt.ts';

export type SketchLane = 'up' | 'across';

/** The step that leads to one drawing, px a frame; up is positive when the thing rises. */
export interface SketchStep {
  frame: number;
  drawn: number;
  /** Where the true arc puts it; null outside a flight. */
  true: number | null;
  /** A finding of this lane speaks of it. */
  off: boolean;
}

const ACROSS: ReadonlySet<FindingKind> = new Set(['across-uneven', 'spacing-off-path']);
/** Findings that speak of a moment or of whole flights, not of single steps: their bars stay grey. */
const WHOLE: ReadonlySet<FindingKind> = new Set([
  'apex-off-centre',
  'gravity-changes',
  'gravity-off-scale',
  'bounce-gains',
]);

/** Which of the two lanes carries the evidence of a sketch: that of its first finding. */
export function laneOf(sketch: Sketch): SketchLane {
  const first = sketch.findings[0];
  return first && ACROSS.has(first.kind) ? 'across' : 'up';
}

/** The thing a sketch is mostly about: the object with the most marks. */
export function mainObject(sketch: Sketch): string | null {
  const counts = new Map<string, number>();
  for (const mark of sketch.marks) counts.set(mark.object, (counts.get(mark.object) ?? 0) + 1);
  return [...counts].sort((a, b) => b[1] - a[1])[0]?.[0] ?? null;
}

/**
 * The small lane of a card: one step for each drawing of the main thing but the first, px a frame. A drawing held over
 * several frames is one step; the drawings of one frame rate mixed with holds share their step over the frames between.
 */
export function sketchSteps(sketch: Sketch, lane: SketchLane): SketchStep[] {
  const object = mainObject(sketch);
  const marks = sketch.marks.filter((mark) => mark.object === object).sort((a, b) => a.frame - b.frame);
  const drawings = marks.filter((mark, index) => {
    const before = marks[index - 1];
    return !before || Math.hypot(mark.x - before.x, mark.y - before.y) > 0.05;
  });
  const arcs = sketch.arcs.filter((arc) => arc.object === object);
  return drawings.slice(1).map((mark, index) => {
    const before = drawings[index]!;
    const frames = mark.frame - before.frame;
    const along = (from: { x: number; y: number }, to: { x: number; y: number }) =>
      lane === 'up' ? (from.y - to.y) / frames : Math.abs(to.x - from.x) / frames;
    const arc = arcs.find(({ points }) => covers(points, before.frame) && covers(points, mark.frame));
    const from = arc && arcAt(arc.points, before.frame);
    const to = arc && arcAt(arc.points, mark.frame);
    return {
      frame: mark.frame,
      drawn: along(before, mark),
      true: from && to ? along(from, to) : null,
      off: sketch.findings.some(
        ({ kind, fromFrame, toFrame }) =>
          !WHOLE.has(kind) &&
          (lane === 'across') === ACROSS.has(kind) &&
          before.frame >= fromFrame &&
          mark.frame <= Math.max(toFrame, fromFrame + 1),
      ),
    };
  });
}

function covers(points: Sketch['arcs'][number]['points'], frame: number): boolean {
  const first = points[0];
  const last = points.at(-1);
  return first !== undefined && last !== undefined && frame >= first.frame - 0.5 && frame <= last.frame + 0.5;
}
