import { unexplained } from './compete.ts';
import type { FlightView, TrackView } from './view.ts';
import { drawingsOf } from './view.ts';

/** Fewest drawings whose arc one of them can be off. */
const LEAST_ARC = 5;

/**
 * Farthest drawing off the arc, as a share of the local step; its error is the noise over that step. Null where too few drawings
 * make the arc. A repeat is measured as a repeat.
 */
export function offArc(view: TrackView, flight: FlightView): { value: number; se: number } | null {
  const { samples } = view.field;
  const { xs, ys } = view.account.fit;
  if (drawingsOf(view, flight).length < LEAST_ARC) return null;
  let value = 0;
  let se = 0;
  for (const i of view.account.left) {
    const t = samples.t[i]!;
    if (t < flight.start || t > flight.end || !standsAlone(view, i) || isRepeat(view, i)) continue;
    const step = Math.max(1, localStep(view, i));
    const off = Math.hypot(samples.x[i]! - xs[i]!, samples.y[i]! - ys[i]!) / step;
    if (off > value) {
      value = off;
      se = Math.sqrt(view.account.noise2) / step;
    }
  }
  return { value, se };
}

/** Length of the path's longer step at a drawing, px: at a contact the way turns back, and the shorter says nothing. */
export function localStep(view: TrackView, drawing: number): number {
  const { xs, ys } = view.account.fit;
  const to = (other: number) =>
    other < 0 || other >= xs.length ? 0 : Math.hypot(xs[other]! - xs[drawing]!, ys[other]! - ys[drawing]!);
  return Math.max(to(drawing - 1), to(drawing + 1));
}

/** Whether a drawing that lies off the arc is the drawing before it once more, within noise and well short of a step. */
export function isRepeat(view: TrackView, drawing: number): boolean {
  const { samples } = view.field;
  const { xs, ys } = view.account.fit;
  if (drawing === 0) return false;
  const moved = Math.hypot(
    samples.x[drawing]! - samples.x[drawing - 1]!,
    samples.y[drawing]! - samples.y[drawing - 1]!,
  );
  const due = Math.hypot(xs[drawing]! - xs[drawing - 1]!, ys[drawing]! - ys[drawing - 1]!);
  return moved < Math.max(0.5, Math.min(4.5 * Math.sqrt(view.account.noise2), 0.3 * due)) && due > 2 * moved;
}

/** How many drawings of a flight repeat the one before them. */
export function repeatsOf(view: TrackView, flight: FlightView): number {
  const { t } = view.field.samples;
  const { fault, left } = view.account;
  const inside = (i: number) => t[i]! >= flight.start && t[i]! <= flight.end;
  const late = fault?.kind === 'held' && inside(fault.drawing) ? 1 : 0;
  return late + left.filter((i) => inside(i) && isRepeat(view, i)).length;
}

/** One drawing pops; where its neighbours are off as well, or many are, the arc itself is not understood. */
export function standsAlone(view: TrackView, drawing: number): boolean {
  const { left } = view.account;
  if (unexplained(view.account, view.field) || mayBeContact(view, drawing) || touches(view, drawing)) return false;
  if (left.includes(drawing - 1) || left.includes(drawing + 1)) return false;
  return left.length <= Math.max(3, view.field.drawings.length / 6);
}

/** The last (or first) drawing alone beyond a possible contact: it lies higher than the arc, as after a bounce or a landing. */
function mayBeContact(view: TrackView, drawing: number): boolean {
  const { samples } = view.field;
  const { ys } = view.account.fit;
  const outer = drawing === 0 || drawing === ys.length - 1;
  return outer && samples.y[drawing]! < ys[drawing]!;
}

/** How far a thing pressed flat at a contact may seem to be off its arc, px. */
const PRESSED = 4;

/** A drawing right at a contact: the thing is pressed flat there, so that its middle is not where a flight would have it. */
function touches(view: TrackView, drawing: number): boolean {
  const { samples, step } = view.field;
  const { knots, path, xs, ys } = view.account.fit;
  const t = samples.t[drawing]!;
  const near = path.spans.some((span, k) => {
    const lands = span.kind === 'flight' && k < path.spans.length - 1;
    return lands && Math.abs(knots.t[k + 1]! - t) < 1.7 * step;
  });
  const off = Math.hypot(samples.x[drawing]! - xs[drawing]!, samples.y[drawing]! - ys[drawing]!);
  return near && off < Math.min(PRESSED, 0.5 * localStep(view, drawing));
}
