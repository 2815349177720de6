import type { Flight } from '../reading/document.ts';
import { measuresOf } from './measures.ts';
import { truePlaces } from './mend.ts';
import type { FlightView, TrackView } from './view.ts';
import { frameOf } from './view.ts';

/** A flight as the document tells it: limits, apex as drawn, gravity without its shape fault, measures and the true arc. */
export function describeFlight(view: TrackView, flight: FlightView, centre: { x: number; y: number }): Flight {
  const { account } = view;
  const { fit, noise2, covariance } = account;
  const p = fit.path.size;
  const se = (k: number) => (covariance ? Math.sqrt(Math.max(0, noise2 * covariance[k * p + k]!)) : 0);
  const g = fit.path.spans[flight.span]!.gravity;
  const gravity = { value: flight.gravity, se: se(g) };
  const length = flight.length;
  const across = (fit.knots.x[flight.span + 1]! - fit.knots.x[flight.span]!) / length;
  const noise = Math.sqrt(noise2);
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
    across: { value: across, se: (noise * Math.SQRT2) / (length * Math.sqrt(Math.max(1, length / 4))) },
    gravity: { ...gravity, metric },
    residual: residualOf(view, flight),
    model: account.depth ? 'depth' : 'flat',
    measures: measuresOf(view, flight),
    trueArc: arcOf(view, flight, centre),
  };
}

/** Gravity of the picture in m/s² (fps as an exact fraction). */
export function metresPerSecond2(gravity: number, view: TrackView): number {
  const fps = view.fps.num / view.fps.den;
  return view.scale ? (gravity * fps * fps) / view.scale.pxPerMetre : 0;
}

function apexOf(view: TrackView, flight: FlightView, centre: { x: number; y: number }): Flight['apex'] {
  const { fault, fit } = view.account;
  let at = flight.apex;
  if (fault?.kind === 'shape' && fault.span === flight.span && fault.name === 'apex')
    at += fit.theta[fit.path.shapeAt]! * flight.length;
  if (at < 0 || at > flight.length) return null;
  const time = Float64Array.from([flight.start + at]);
  const place = truePlaces(view, time, true);
  const noise = Math.sqrt(view.account.noise2);
  const count = Math.max(3, flight.length / view.hold);
  return {
    frame: frameOf(view, flight.start + at),
    x: place.xs[0]! + centre.x,
    y: place.ys[0]! + centre.y,
    seFrame: (noise * Math.sqrt(12 / count)) / (flight.length * flight.gravity),
    seY: 1.5 * noise * Math.sqrt(1 / count),
  };
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
