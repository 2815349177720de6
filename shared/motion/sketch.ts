import { fitQuadratic } from './parabola.ts';
import type { Knots, Path, Span } from './path.ts';
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

/** The same sketch with the first `count` drawings at rest before the flight takes off. */
export function restFirst(sketch: Sketch, count: number, field: Field): Sketch | null {
  const { drawings } = field;
  if (sketch.spans[0]?.kind !== 'flight' || count >= drawings.length) return null;
  const time = between(drawings[count - 1]!.t, drawings[count]!.t);
  if (time >= sketch.knots.t[1]!) return null;
  const place = meanPlace(field, 0, count);
  return insert(sketch, 0, { kind: 'rest', tangent: false, gravity: 0 }, { ...place, t: time }, place);
}

/** The same sketch with the last `count` drawings at rest after the flight has landed. */
export function restLast(sketch: Sketch, count: number, field: Field): Sketch | null {
  return endWith(sketch, count, field, 'rest');
}

/** The same sketch with the last `count` drawings in a flight of their own after a contact. */
export function flightLast(sketch: Sketch, count: number, field: Field): Sketch | null {
  return endWith(sketch, count, field, 'flight');
}

function endWith(sketch: Sketch, count: number, field: Field, kind: 'rest' | 'flight'): Sketch | null {
  const { drawings } = field;
  const n = drawings.length;
  const last = sketch.spans.length - 1;
  if (sketch.spans[last]?.kind !== 'flight' || count >= n) return null;
  const time = between(drawings[n - count - 1]!.t, drawings[n - count]!.t);
  if (time <= sketch.knots.t[last]! + 0.5) return null;
  const end = kind === 'rest' ? meanPlace(field, n - count, n) : drawings[n - 1]!;
  const contact = kind === 'rest' ? end : lowest(drawings[n - count - 1]!, drawings[n - count]!);
  const knots = {
    t: Float64Array.from([...sketch.knots.t.slice(0, last + 1), time, drawings[n - 1]!.t]),
    x: Float64Array.from([...sketch.knots.x.slice(0, last + 1), contact.x, end.x]),
    y: Float64Array.from([...sketch.knots.y.slice(0, last + 1), contact.y, end.y]),
  };
  return { ...sketch, spans: [...sketch.spans, { kind, tangent: false, gravity: 0 }], knots };
}

/** The same sketch without its contact `knot`: the two spans around it become one flight. */
export function withoutKnot(sketch: Sketch, knot: number): Sketch {
  const drop = (values: Float64Array) => Float64Array.from([...values].filter((_, k) => k !== knot));
  const spans = sketch.spans.filter((_, k) => k !== knot);
  const before = sketch.spans[knot - 1]!;
  spans[knot - 1] = { kind: 'flight', tangent: before.kind === 'flight' && before.tangent, gravity: 0 };
  return { ...sketch, spans, knots: { t: drop(sketch.knots.t), x: drop(sketch.knots.x), y: drop(sketch.knots.y) } };
}

/** The same sketch with its first flight rolling level until `share` of it is over, then falling. */
export function rollFirst(sketch: Sketch, share: number, field: Field): Sketch | null {
  if (sketch.spans[0]?.kind !== 'flight') return null;
  const { t, x, y } = sketch.knots;
  const time = t[0]! + share * (t[1]! - t[0]!);
  const near = field.drawings.reduce((best, one) => (Math.abs(one.t - time) < Math.abs(best.t - time) ? one : best));
  const put = (values: Float64Array, outer: number, inner: number) =>
    Float64Array.from([outer, inner, ...values.slice(1)]);
  const first = field.drawings[0]!;
  return {
    ...sketch,
    spans: [
      { kind: 'roll', tangent: false, gravity: 0 },
      { kind: 'flight', tangent: true, gravity: 0 },
      ...sketch.spans.slice(1),
    ],
    knots: { t: put(t, t[0]!, time), x: put(x, first.x, near.x), y: put(y, first.y, near.y) },
  };
}

/** The same sketch with its first or last flight (a short one) taken for rest, or a let-go taken for a push, and the other way. */
export function recast(sketch: Sketch, span: number, kind: Span['kind'], tangent: boolean): Sketch {
  const spans = sketch.spans.map((one, k) => (k === span ? { kind, tangent, gravity: 0 } : one));
  return { ...sketch, spans };
}

/** The plainest sketch: at rest for the first `before` drawings, one flight, at rest for the last `after`. */
export function oneFlight(field: Field, before: number, after: number): Sketch | null {
  const { drawings } = field;
  const n = drawings.length;
  if (n - before - after < 3) return null;
  const part = drawings.slice(before, n - after);
  const fit = fitQuadratic(
    part.map((one) => one.t),
    part.map((one) => one.y),
  );
  const gravity = Math.max(1e-2, (2 * fit.c2) / fit.half ** 2);
  const base: Sketch = {
    spans: [{ kind: 'flight', tangent: false, gravity: 0 }],
    knots: {
      t: Float64Array.from([drawings[0]!.t, drawings[n - 1]!.t]),
      x: Float64Array.from([drawings[0]!.x, drawings[n - 1]!.x]),
      y: Float64Array.from([drawings[0]!.y, drawings[n - 1]!.y]),
    },
    gravity,
  };
  const opened = before ? restFirst(base, before, field) : base;
  return opened && after ? restLast(opened, after, field) : opened;
}

function insert(
  sketch: Sketch,
  at: number,
  span: Span,
  knot: { t: number; x: number; y: number },
  first: { x: number; y: number },
): Sketch {
  const put = (values: Float64Array, outer: number, inner: number) =>
    Float64Array.from([outer, inner, ...values.slice(1)]);
  const spans = [...sketch.spans];
  spans.splice(at, 0, span);
  const { t, x, y } = sketch.knots;
  return {
    ...sketch,
    spans,
    knots: { t: put(t, t[0]!, knot.t), x: put(x, first.x, knot.x), y: put(y, first.y, knot.y) },
  };
}

const between = (a: number, b: number): number => a + 0.6 * (b - a);

function lowest<P extends { x: number; y: number }>(a: P, b: P): P {
  return a.y > b.y ? a : b;
}

function meanPlace(field: Field, from: number, to: number): { x: number; y: number } {
  let x = 0;
  let y = 0;
  for (let i = from; i < to; i += 1) {
    x += field.drawings[i]!.x;
    y += field.drawings[i]!.y;
  }
  return { x: x / (to - from), y: y / (to - from) };
}
