import type { Field } from './account.ts';
import type { Honoured } from './hand.ts';
import type { Span } from './path.ts';
import type { Sketch } from './sketch.ts';
import { withoutKnot } from './sketchEdits.ts';

/** A sketch with the contacts that someone set, and without those that someone took away. */
export function honour(sketch: Sketch, field: Field): Sketch {
  let out = sketch;
  const reach = 1.5 * field.step;
  for (const time of field.hand.barred) {
    const at = nearestKnot(out, time);
    if (at > 0 && Math.abs(out.knots.t[at]! - time) <= reach) out = withoutKnot(out, at);
  }
  for (const pin of field.hand.pins) out = pinned(out, pin, field);
  return out;
}

/** Whether a sketch keeps what was set by hand. */
export function keepsHand(sketch: Sketch, field: Field): boolean {
  const inner = Array.from(sketch.knots.t.slice(1, -1));
  return field.hand.pins.every((pin) => inner.some((time) => Math.abs(time - pin.time) < 1e-6));
}

function pinned(sketch: Sketch, pin: Honoured['pins'][number], field: Field): Sketch {
  const { t } = sketch.knots;
  if (pin.time <= t[0]! || pin.time >= t[t.length - 1]!) return sketch;
  const near = nearestKnot(sketch, pin.time);
  if (near > 0 && Math.abs(t[near]! - pin.time) <= 2.5 * field.step) {
    const times = Float64Array.from(t);
    times[near] = pin.time;
    const spans = sketch.spans.map((span, k) => {
      if (k === near - 1 && pin.before === 'rest') return rest();
      if (k === near) return pin.after === 'rest' ? rest() : { ...span, kind: 'flight' as const, tangent: false };
      return span;
    });
    return { ...sketch, spans, knots: { ...sketch.knots, t: times } };
  }
  const at = sketch.spans.findIndex((_, k) => t[k]! < pin.time && pin.time < t[k + 1]!);
  const place = field.drawings.reduce((best, one) =>
    Math.abs(one.t - pin.time) < Math.abs(best.t - pin.time) ? one : best,
  );
  const put = (values: Float64Array, value: number) =>
    Float64Array.from([...values.slice(0, at + 1), value, ...values.slice(at + 1)]);
  const spans = [...sketch.spans];
  spans.splice(
    at,
    1,
    { kind: pin.before, tangent: false, gravity: 0 },
    { kind: pin.after, tangent: false, gravity: 0 },
  );
  return {
    ...sketch,
    spans,
    knots: { t: put(t, pin.time), x: put(sketch.knots.x, place.x), y: put(sketch.knots.y, place.y) },
  };
}

function rest(): Span {
  return { kind: 'rest', tangent: false, gravity: 0 };
}

function nearestKnot(sketch: Sketch, time: number): number {
  let best = -1;
  for (let k = 1; k < sketch.knots.t.length - 1; k += 1) {
    if (best < 0 || Math.abs(sketch.knots.t[k]! - time) < Math.abs(sketch.knots.t[best]! - time)) best = k;
  }
  return best;
}
