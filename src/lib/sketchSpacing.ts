import type { Sketch } from '../../shared/api/takes.ts';
import type { FindingKind } from '../../shared/reading/kinds.ts';
import { arcAt } from './arcAt.ts';

export type SketchLane = 'up' | 'across';

/** The step that leads to one drawing, px a frame; up is positive when the thing rises. */
export interface SketchStep {
  frame: number;
  /** How many frames the drawing it leads to is shown for: 1 on ones, 2 on twos. */
  shownFor: number;
  drawn: number;
  /** Where the true arc puts it; null outside a flight. */
  true: number | null;
  /** A finding of this lane speaks of it, and it leaves the true line. */
  off: boolean;
}

const ACROSS: ReadonlySet<FindingKind> = new Set(['across-uneven', 'spacing-off-path']);
/** These leave the line in both directions. */
const BOTH: ReadonlySet<FindingKind> = new Set(['spacing-off-path', 'pop', 'held-frame']);
/** A bar leaves its line when the gap is more than this share of the usual step along the arc, as in the score. */
const LEAVES_BY = 0.1;

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
 * several frames is one step, spread over the frames a drawing is usually held for; a rest before the throw is no part
 * of the first step.
 */
export function sketchSteps(sketch: Sketch, lane: SketchLane): SketchStep[] {
  const object = mainObject(sketch);
  const drawings = drawingsOf(sketch.marks.filter((mark) => mark.object === object));
  const gaps = drawings.slice(1).map((drawing, index) => drawing.frame - drawings[index]!.frame);
  const usual = gaps.toSorted((a, b) => a - b)[gaps.length >> 1] ?? 1;
  const arcs = sketch.arcs.filter((arc) => arc.object === object);

  return drawings.slice(1).map((drawing, index) => {
    const before = drawings[index]!;
    const frames = Math.min(drawing.frame - before.frame, Math.max(usual, drawing.frame - before.until));
    const left = drawing.frame - frames;
    const along = (from: { x: number; y: number }, to: { x: number; y: number }) =>
      lane === 'up' ? (from.y - to.y) / frames : Math.abs(to.x - from.x) / frames;
    const arc = arcs.find(({ points }) => covers(points, left) && covers(points, drawing.frame));
    const from = arc && arcAt(arc.points, left);
    const to = arc && arcAt(arc.points, drawing.frame);
    const drawn = along(before, drawing);
    const should = from && to ? along(from, to) : null;
    const leaves = should !== null && Math.abs(drawn - should) > LEAVES_BY * (arc ? usualStep(arc.points) : 0);
    return {
      frame: drawing.frame,
      shownFor: Math.min(usual, (drawings[index + 2]?.frame ?? Number.POSITIVE_INFINITY) - drawing.frame),
      drawn,
      true: should,
      off:
        leaves &&
        sketch.findings.some(
          ({ kind, flight, fromFrame, toFrame }) =>
            (flight === null || arcs.some((one) => one.flight === flight)) &&
            (BOTH.has(kind) || (lane === 'across') === ACROSS.has(kind)) &&
            left >= fromFrame &&
            drawing.frame <= Math.max(toFrame, fromFrame + 1),
        ),
    };
  });
}

/** Less than this between two frames is the same drawing, px: marks of a sketch are rounded to a tenth. */
const SAME_PLACE = 0.15;

/** Runs of frames on which the thing stands still, as one drawing with its last frame. */
function drawingsOf(marks: Sketch['marks']): (Sketch['marks'][number] & { until: number })[] {
  const drawings: (Sketch['marks'][number] & { until: number })[] = [];
  for (const mark of marks.toSorted((a, b) => a.frame - b.frame)) {
    const last = drawings.at(-1);
    if (last && Math.hypot(mark.x - last.x, mark.y - last.y) < SAME_PLACE) last.until = mark.frame;
    else drawings.push({ ...mark, until: mark.frame });
  }
  return drawings;
}

/** Length of the arc for each frame, px. */
function usualStep(points: Sketch['arcs'][number]['points']): number {
  const first = points[0];
  const last = points.at(-1);
  if (!first || !last || first.frame === last.frame) return 0;
  const length = points.slice(1).reduce((sum, here, index) => {
    const before = points[index]!;
    return sum + Math.hypot(here.x - before.x, here.y - before.y);
  }, 0);
  return length / (last.frame - first.frame);
}

/** Contacts lie between frames. A step that is mostly before a take-off or after a landing is no step of the flight. */
const SLACK = 0.2;

function covers(points: Sketch['arcs'][number]['points'], frame: number): boolean {
  const first = points[0];
  const last = points.at(-1);
  return first !== undefined && last !== undefined && frame >= first.frame - SLACK && frame <= last.frame + SLACK;
}
