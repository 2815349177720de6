import type { Band } from '../reading/tolerances.ts';
import { errorOf } from './errors.ts';
import type { Knots } from './follow.ts';
import type { FlightView, TrackView } from './view.ts';

interface Number {
  value: number;
  se: number;
}

/** Rebound of a flight against the one before it: height ratio (fall before to rise after, at their contact) and period ratio. */
export function reboundOf(view: TrackView, flight: FlightView): { height: Number; period: Number | null } | null {
  const before = view.flights[flight.index - 1];
  if (!before || before.span !== flight.span - 1 || view.account.depth) return null;
  if (flight.apex <= 0 || flight.apex >= flight.length) return null;
  const ratio = (theta: Float64Array, knots: Knots) => {
    const fall = riseOf(view, theta, knots, before.span, 'end');
    return riseOf(view, theta, knots, flight.span, 'start') / fall;
  };
  const { theta, knots } = view.account.fit;
  const height = { value: ratio(theta, knots), se: errorOf(view.account, ratio) };
  const whole = before.opens && flight.closes;
  const period = (_: Float64Array, k: Knots) =>
    (k.t[flight.span + 1]! - k.t[flight.span]!) / (k.t[before.span + 1]! - k.t[before.span]!);
  return {
    height,
    period: whole ? { value: period(theta, knots), se: errorOf(view.account, period) } : null,
  };
}

/** Height of a flight's apex over its start or its end, px. */
function riseOf(view: TrackView, theta: Float64Array, knots: Knots, span: number, end: 'start' | 'end'): number {
  const { path } = view.account.fit;
  const hangs = path.shape?.span === span && path.shape.name.startsWith('hang');
  const length = knots.t[span + 1]! - knots.t[span]! - (hangs ? theta[path.shapeAt]! : 0);
  const g = theta[path.spans[span]!.gravity]!;
  const apex = Math.max(0, length / 2 - (knots.y[span + 1]! - knots.y[span]!) / (length * g));
  const reach = end === 'start' ? apex : length - apex;
  return 0.5 * g * reach * reach;
}

/** What a height ratio is held against: at most 1, with the band's slack. */
export function boundsOf(band: Band): { expected: number; tolerance: number } {
  return { expected: 1, tolerance: band.from - 1 };
}
