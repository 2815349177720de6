import type { Finding } from '../reading/document.ts';
import type { Draft } from './findings/rule.ts';
import { follow, layOut, makeKnotsFor, placeKnots } from './path.ts';
import type { FlightView, TrackView } from './view.ts';
import { frameOf } from './view.ts';

/** The path without its fault: same contacts, one gravity, true spacing. Places at `times`, px, local. */
export function mendedPath(view: TrackView, times: Float64Array): { xs: Float64Array; ys: Float64Array } {
  const { fit } = view.account;
  const old = fit.path;
  const spans = old.spans.map((span) => ({ ...span, gravity: 0 }));
  const last = spans.length - 1;
  const path = layOut(
    spans,
    { start: fit.knots.t[0]!, end: fit.knots.t[last + 1]! },
    { depthAt: old.depthAt >= 0 ? 0 : -1 },
  );
  const theta = new Float64Array(path.size);
  theta[0] = fit.theta[0]!;
  for (let k = 0; k <= last + 1; k += 1) {
    if (path.timeAt[k]! >= 0) theta[path.timeAt[k]!] = fit.knots.t[k]!;
    if (path.xAt[k]! >= 0) theta[path.xAt[k]!] = fit.knots.x[k]!;
    if (path.yAt[k]! >= 0) theta[path.yAt[k]!] = fit.knots.y[k]!;
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

function flightMoves(view: TrackView, draft: Draft): { drawing: number; dx: number; dy: number }[] {
  const { t } = view.field.samples;
  const { xs, ys } = view.account.fit;
  const mended = mendedPath(view, t);
  const out: { drawing: number; dx: number; dy: number }[] = [];
  const held = view.account.fault?.kind === 'held';
  for (let i = 0; i < t.length; i += 1) {
    if (!held && (t[i]! <= draft.flight.start || t[i]! >= draft.flight.end)) continue;
    out.push({ drawing: i, dx: mended.xs[i]! - xs[i]!, dy: mended.ys[i]! - ys[i]! });
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
