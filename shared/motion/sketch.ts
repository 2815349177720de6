import type { Knots } from './follow.ts';
import type { Path, Span } from './path.ts';
import { layOut } from './path.ts';
import type { Fault, Field } from './account.ts';
import { isPinned } from './hand.ts';
import type { Shape } from './shapes.ts';
import { SHAPE_NOTHING } from './shapes.ts';
import type { Stretch } from './spans.ts';
import { meetingTime, placeOf } from './spans.ts';

/** The structure of a track with a guess of every knot: what a fit starts from, and what a fit leaves behind. */
export interface Sketch {
  spans: Span[];
  knots: Knots;
  gravity: number;
}

/** A first sketch from the stretches of a track. */
export function sketchOf(field: Field, stretches: readonly Stretch[]): Sketch {
  const { t } = field.samples;
  const count = stretches.length + 1;
  const knots: Knots = { t: new Float64Array(count), x: new Float64Array(count), y: new Float64Array(count) };
  let curve = 0;
  let weight = 0;
  for (const stretch of stretches) {
    if (stretch.kind !== 'flight') continue;
    const span = stretch.to - stretch.from;
    curve += bendOf(field, stretch) * span;
    weight += span;
  }
  for (let k = 0; k < count; k += 1) {
    const before = stretches[k - 1];
    const after = stretches[k];
    const time = !before ? t[0]! : !after ? t[t.length - 1]! : meetingTime(before, after, field.drawings);
    const place =
      before && before.kind === 'rest'
        ? placeOf(before, 'end', time)
        : after
          ? placeOf(after, 'start', time)
          : placeOf(before!, 'end', time);
    knots.t[k] = time;
    knots.x[k] = place.x;
    knots.y[k] = place.y;
  }
  const spans = stretches.map((stretch) => ({ kind: stretch.kind, tangent: stretch.tangent, gravity: 0 }));
  return { spans, knots, gravity: Math.max(1e-3, weight ? curve / weight : 1e-3) };
}

/** Mean curvature of a stretch from its two ends and its middle, px/frame². */
function bendOf(field: Field, stretch: Stretch): number {
  const a = field.drawings[stretch.from]!;
  const c = field.drawings[stretch.to]!;
  const b = field.drawings[Math.round((stretch.from + stretch.to) / 2)]!;
  const h1 = b.t - a.t;
  const h2 = c.t - b.t;
  if (h1 <= 0 || h2 <= 0) return 0;
  return (2 * ((c.y - b.y) / h2 - (b.y - a.y) / h1)) / (h1 + h2);
}

/** The sketch that a fit leaves behind. */
export function sketchFrom(path: Path, theta: Float64Array, knots: Knots): Sketch {
  return { spans: path.spans.map((span) => ({ ...span, gravity: 0 })), knots, gravity: theta[0]! };
}

/** Path and starting parameters of a sketch with a fault or the depth pair put on top. */
export function pathOf(
  sketch: Sketch,
  fault: Fault | null,
  depth: boolean,
  field: Field,
  start: { shape?: number | undefined; depth?: [number, number] | undefined } = {},
): { path: Path; theta: Float64Array } {
  const last = sketch.spans.length - 1;
  const { knots } = sketch;
  const spans = sketch.spans.map((span, index) => ({
    ...span,
    gravity: fault?.kind === 'gravity' && index === fault.span ? 1 : 0,
  }));
  const shape: Shape | null =
    fault?.kind === 'shape'
      ? { name: fault.name, span: fault.span, parameters: 1, openStart: fault.span === 0, openEnd: fault.span === last }
      : null;
  const { drawings, samples } = field;
  const inserted = fault?.kind === 'held' ? fault.drawing : -1;
  const delay = inserted > 0 ? drawings[inserted]!.t - drawings[inserted - 1]!.t : 0;
  const path = layOut(
    spans,
    {
      start: knots.t[0]!,
      end: samples.t[samples.t.length - 1]! - delay,
      pins: field.hand.pins.length
        ? Array.from(knots.t, (time, k) => (k > 0 && k <= last && isPinned(field.hand, time) ? time : null))
        : [],
    },
    {
      shape,
      depthAt: depth ? 0 : -1,
      ...(inserted > 0 ? { delayFrom: inserted, delay } : {}),
    },
  );
  const theta = new Float64Array(path.size);
  for (let g = 0; g < path.gravities; g += 1) theta[g] = sketch.gravity;
  for (let k = 0; k <= last + 1; k += 1) {
    const late = inserted > 0 && knots.t[k]! > samples.t[inserted]! - delay / 2;
    if (path.timeAt[k]! >= 0) theta[path.timeAt[k]!] = knots.t[k]! - (late ? delay : 0);
    if (path.xAt[k]! >= 0) theta[path.xAt[k]!] = knots.x[k]!;
    if (path.yAt[k]! >= 0) theta[path.yAt[k]!] = knots.y[k]!;
  }
  if (shape) theta[path.shapeAt] = start.shape ?? SHAPE_NOTHING[shape.name];
  if (depth && start.depth) theta.set(start.depth, path.depthAt);
  return { path, theta };
}
