import type { Finding, Flight } from '../reading/document.ts';
import { agreed } from './agree.ts';
import { metresPerSecond2 } from './units.ts';
import { errorOf } from './errors.ts';
import { measuresOf } from './measures.ts';
import { truePlaces } from './mend.ts';
import type { Knots } from './follow.ts';
import { follow } from './follow.ts';
import type { FlightView, TrackView } from './view.ts';
import { frameOf } from './view.ts';

/**
 * A flight as the document tells it: limits, apex as drawn, gravity without its shape fault, the true arc, and measures that agree
 * with the findings of the track.
 */
export function describeFlight(
  view: TrackView,
  flight: FlightView,
  centre: { x: number; y: number },
  findings: readonly Finding[],
): Flight {
  const { account } = view;
  const { fit } = account;
  const g = fit.path.spans[flight.span]!.gravity;
  const finite = (se: number, other: number) => (Number.isFinite(se) ? se : other);
  const gravity = {
    value: flight.gravity,
    se: finite(
      errorOf(account, (theta) => theta[g]!),
      flight.gravity,
    ),
  };
  const speed = (_: Float64Array, knots: Knots) =>
    (knots.x[flight.span + 1]! - knots.x[flight.span]!) / (knots.t[flight.span + 1]! - knots.t[flight.span]!);
  const across = speed(fit.theta, fit.knots);
  const metric = view.scale
    ? {
        value: metresPerSecond2(gravity.value, view),
        se: metresPerSecond2(gravity.se, view),
      }
    : null;
  return {
    id: flight.id,
    takeOff: flight.opens ? frameOf(view, flight.start) : null,
    landing: flight.closes ? frameOf(view, flight.end) : null,
    judged: flight.judged,
    apex: apexOf(view, flight, centre),
    across: { value: across, se: finite(errorOf(account, speed), Math.abs(across)) },
    gravity: { ...gravity, metric },
    residual: residualOf(view, flight),
    model: account.depth ? 'depth' : 'flat',
    measures: agreed(
      measuresOf(view, flight),
      findings.filter((finding) => finding.flight === flight.id),
    ),
    trueArc: arcOf(view, flight, centre),
  };
}

function apexOf(view: TrackView, flight: FlightView, centre: { x: number; y: number }): Flight['apex'] {
  const { account } = view;
  const { path, theta, knots } = account.fit;
  const at = drawnApex(view, flight, theta, knots);
  if (at < flight.start || at > flight.end) return null;
  const place = truePlaces(view, Float64Array.from([at]), true);
  const height = (moved: Float64Array, places: Knots) => {
    const out = [new Float64Array(1), new Float64Array(1)] as const;
    follow(path, moved, places, Float64Array.from([at]), out[0], out[1]);
    return out[1][0]!;
  };
  const seFrame = errorOf(account, (moved, places) => drawnApex(view, flight, moved, places));
  const seY = errorOf(account, height);
  return {
    frame: frameOf(view, at),
    x: place.xs[0]! + centre.x,
    y: place.ys[0]! + centre.y,
    seFrame: Number.isFinite(seFrame) ? seFrame : flight.length,
    seY: Number.isFinite(seY) ? seY : Math.sqrt(account.noise2),
  };
}

/** Moment of the apex as it is drawn, local time. */
function drawnApex(view: TrackView, flight: FlightView, theta: Float64Array, knots: Knots): number {
  const { path } = view.account.fit;
  const start = knots.t[flight.span]!;
  const length = knots.t[flight.span + 1]! - start;
  const shape = path.shape?.span === flight.span ? path.shape.name : null;
  const held = shape?.startsWith('hang') ? theta[path.shapeAt]! : 0;
  const g = theta[path.spans[flight.span]!.gravity]!;
  const moving = length - held;
  const apex = moving / 2 - (knots.y[flight.span + 1]! - knots.y[flight.span]!) / (moving * g) + held / 2;
  return start + apex + (shape === 'apex' ? theta[path.shapeAt]! * length : 0);
}

function residualOf(view: TrackView, flight: FlightView): number {
  const { samples } = view.field;
  const { fit, weight } = view.account;
  let sum = 0;
  let count = 0;
  for (let i = 0; i < samples.t.length; i += 1) {
    const t = samples.t[i]!;
    if (weight[i] === 0 || t < flight.start || t > flight.end) continue;
    sum += (samples.x[i]! - fit.xs[i]!) ** 2 + (samples.y[i]! - fit.ys[i]!) ** 2;
    count += 2;
  }
  return count ? Math.sqrt(sum / count) : 0;
}

function arcOf(view: TrackView, flight: FlightView, centre: { x: number; y: number }): Flight['trueArc'] {
  const from = Math.ceil(frameOf(view, flight.start) - 1e-9);
  const to = Math.floor(frameOf(view, flight.end) + 1e-9);
  const frames: number[] = [];
  if (flight.opens && from - frameOf(view, flight.start) > 1e-3) frames.push(frameOf(view, flight.start));
  for (let frame = from; frame <= to; frame += 1) frames.push(frame);
  if (flight.closes && frameOf(view, flight.end) - to > 1e-3) frames.push(frameOf(view, flight.end));
  const { xs, ys } = truePlaces(
    view,
    Float64Array.from(frames, (frame) => frame - view.origin),
    false,
  );
  return frames.map((frame, i) => ({ frame, x: xs[i]! + centre.x, y: ys[i]! + centre.y }));
}
