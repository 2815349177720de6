import type { Finding } from '../reading/document.ts';
import { reboundOf } from './bounces.ts';
import type { Draft } from './findings/rule.ts';
import type { Knots } from './follow.ts';
import type { Span } from './path.ts';
import { follow, makeKnotsFor, placeKnots } from './follow.ts';
import { layOut } from './path.ts';
import type { FlightView, TrackView } from './view.ts';
import { frameOf } from './view.ts';

interface Places {
  xs: Float64Array;
  ys: Float64Array;
}

/** The path without its fault: same contacts, one gravity, true spacing. Places at `times`, px, local. */
export function mendedPath(view: TrackView, times: Float64Array): Places {
  const { fit } = view.account;
  const only = view.flights.length === 1 ? view.flights[0] : undefined;
  const gravity = only && only.held > 0 ? gravityToHeight(view, only) : fit.theta[0]!;
  return along(view, fit.path.spans, fit.knots, gravity, times);
}

/** Gravity with which a flight of full length reaches the height that was drawn, when what was drawn hangs at its top. */
function gravityToHeight(view: TrackView, flight: FlightView): number {
  const { y } = view.account.fit.knots;
  const moving = flight.length - flight.held;
  const rise = flight.apex - flight.held / 2;
  const top = y[flight.span]! - 0.5 * flight.gravity * rise * rise;
  const up = Math.sqrt(Math.max(0, y[flight.span]! - top));
  const down = Math.sqrt(Math.max(0, y[flight.span + 1]! - top));
  if (!(up + down > 0)) return flight.gravity * (moving / flight.length) ** 2;
  return (2 * (up + down) ** 2) / flight.length ** 2;
}

/**
 * The path with a rebound brought down to the height of the fall before it: the flight keeps its gravity and its speed across,
 * so it ends sooner, and what follows comes sooner with it.
 */
function loweredPath(view: TrackView, flight: FlightView, times: Float64Array): Places {
  const { fit } = view.account;
  const gain = reboundOf(view, flight)?.height.value ?? 1;
  const shorter = flight.length / Math.sqrt(Math.max(1, gain));
  const t = Float64Array.from(fit.knots.t);
  const x = Float64Array.from(fit.knots.x);
  const y = Float64Array.from(fit.knots.y);
  const end = flight.span + 1;
  const sooner = shorter - flight.length;
  const nearer = ((x[end]! - x[flight.span]!) / flight.length) * sooner;
  for (let k = end; k < t.length; k += 1) {
    t[k] = t[k]! + sooner;
    x[k] = x[k]! + nearer;
  }
  const spans = [...fit.path.spans];
  if (flight.closes) return along(view, spans, { t, x, y }, fit.theta[0]!, times);
  const rise = flight.apex / Math.sqrt(Math.max(1, gain));
  const put = (values: Float64Array, landing: number, after: number) =>
    Float64Array.from([...values.slice(0, end), landing, after]);
  const across = (x[end]! - x[flight.span]!) / shorter;
  const land = { t: t[flight.span]! + 2 * rise, x: x[flight.span]! + across * 2 * rise, y: y[flight.span]! };
  spans.push({ kind: 'rest', tangent: false, gravity: 0 });
  const knots = {
    t: put(t, land.t, Math.max(land.t + 1, times[times.length - 1]!)),
    x: put(x, land.x, land.x),
    y: put(y, land.y, land.y),
  };
  return along(view, spans, knots, fit.theta[0]!, times);
}

/** Places along spans between given knots, all flights bent by one gravity and none by a fault. */
function along(view: TrackView, given: readonly Span[], places: Knots, gravity: number, times: Float64Array): Places {
  const { fit } = view.account;
  const old = fit.path;
  const spans = given.map((span) => ({ ...span, gravity: 0 }));
  const last = spans.length;
  const ends = { start: places.t[0]!, end: places.t[last]! };
  const path = layOut(spans, ends, { depthAt: old.depthAt >= 0 ? 0 : -1 });
  const theta = new Float64Array(path.size);
  theta[0] = gravity;
  for (let k = 0; k <= last; k += 1) {
    if (path.timeAt[k]! >= 0) theta[path.timeAt[k]!] = places.t[k]!;
    if (path.xAt[k]! >= 0) theta[path.xAt[k]!] = places.x[k]!;
    if (path.yAt[k]! >= 0) theta[path.yAt[k]!] = places.y[k]!;
  }
  if (path.depthAt >= 0) {
    theta[path.depthAt] = fit.theta[old.depthAt]!;
    theta[path.depthAt + 1] = fit.theta[old.depthAt + 1]!;
  }
  const knots = makeKnotsFor(path);
  placeKnots(path, theta, knots);
  const xs = new Float64Array(times.length);
  const ys = new Float64Array(times.length);
  follow(path, theta, knots, times, xs, ys);
  return { xs, ys };
}

/** Moves of drawings that mend a finding: one a drawing, on the frame where it first appears, in px. */
export function mendOf(view: TrackView, draft: Draft): Finding['mend'] {
  const { samples } = view.field;
  const moves = draft.move ?? flightMoves(view, draft);
  return moves
    .map((move) => ({
      frame: Math.round(frameOf(view, samples.t[move.drawing]!)),
      dx: Math.round(move.dx * 100) / 100,
      dy: Math.round(move.dy * 100) / 100,
    }))
    .filter((move) => Math.hypot(move.dx, move.dy) >= 0.05);
}

/** Moves to the mended path: by as much as the path moves, and all the way for a drawing that lay off its own path. */
function flightMoves(view: TrackView, draft: Draft): { drawing: number; dx: number; dy: number }[] {
  const { samples } = view.field;
  const { t } = samples;
  const { xs, ys } = view.account.fit;
  const noise = Math.sqrt(view.account.noise2);
  const lowered = draft.kind === 'bounce-gains';
  const mended = lowered ? loweredPath(view, draft.flight, t) : mendedPath(view, t);
  const out: { drawing: number; dx: number; dy: number }[] = [];
  const held = view.account.fault?.kind === 'held';
  for (let i = 0; i < t.length; i += 1) {
    const within = t[i]! > draft.flight.start && t[i]! < draft.flight.end;
    if (!held && !within && !(lowered && t[i]! >= draft.flight.end)) continue;
    const stray = Math.hypot(samples.x[i]! - xs[i]!, samples.y[i]! - ys[i]!) > 2.5 * noise;
    const from = stray ? { x: samples.x[i]!, y: samples.y[i]! } : { x: xs[i]!, y: ys[i]! };
    out.push({ drawing: i, dx: mended.xs[i]! - from.x, dy: mended.ys[i]! - from.y });
  }
  return out;
}

/** Timing charts of a flight as it should be: the share of the way at each drawing, between take-off, apex and landing. */
export function chartOf(view: TrackView, flight: FlightView): Finding['chart'] {
  const { t } = view.field.samples;
  const times = Array.from(t).filter((time) => time > flight.start && time < flight.end);
  if (times.length < 3) return [];
  const top = flight.start + flight.apex;
  const { ys } = mendedPath(view, Float64Array.from(times));
  const turn = times.reduce((best, time, i) => (Math.abs(time - top) < Math.abs(times[best]! - top) ? i : best), 0);
  return [
    [0, turn],
    [turn, times.length - 1],
  ].flatMap(([a, b]) => {
    if (b! - a! < 2) return [];
    const way = ys[b!]! - ys[a!]!;
    if (Math.abs(way) < 1) return [];
    const ticks = times.slice(a! + 1, b!).map((_, i) => Math.round((100 * (ys[a! + 1 + i]! - ys[a!]!)) / way) / 100);
    return [{ from: Math.round(frameOf(view, times[a!]!)), to: Math.round(frameOf(view, times[b!]!)), ticks }];
  });
}

/** Places of the path at `times` (ascending, local): as drawn, or with each flight true but as high as it was drawn. */
export function truePlaces(
  view: TrackView,
  times: Float64Array,
  asDrawn: boolean,
): { xs: Float64Array; ys: Float64Array } {
  const { fit } = view.account;
  const xs = new Float64Array(times.length);
  const ys = new Float64Array(times.length);
  const path = { ...fit.path, delay: 0, delayFrom: Infinity, shape: asDrawn ? fit.path.shape : null };
  follow(path, fit.theta, fit.knots, times, xs, ys);
  return { xs, ys };
}
