import type { Field } from './account.ts';
import { fitQuadratic } from './parabola.ts';
import type { Span } from './path.ts';
import type { Sketch } from './sketch.ts';

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
