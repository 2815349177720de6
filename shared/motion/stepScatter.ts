import { severityOf } from './findings/rule.ts';
import type { Estimated } from './shapeNumber.ts';
import type { FlightView, TrackView } from './view.ts';
import { drawingsOf } from './view.ts';

/** Scatter of steps over their mean, and what the noise of the marks alone would make them scatter. */
interface Scatter extends Estimated {
  ofNoise: number;
}

/** Fewest steps across whose scatter says anything. */
const LEAST_STEPS = 6;

/**
 * Scatter of the steps across over their mean: what they scatter more than the steps up and down do about the same arc, so that
 * the noise of the marks, which is the same both ways, is taken out. `without` leaves one drawing out. Null where there are too
 * few steps, or the thing hardly moves across. The error is that of two mean squares of differences, whose neighbours are
 * correlated by -1/2.
 */
export function stepScatter(view: TrackView, flight: FlightView, without = -1): Scatter | null {
  const used = drawingsOf(view, flight).filter((i) => i !== without);
  const { samples } = view.field;
  const { xs, ys } = view.account.fit;
  const count = used.length - 1;
  let across = 0;
  let upright = 0;
  let mean = 0;
  for (let k = 1; k < used.length; k += 1) {
    const [a, b] = [used[k - 1]!, used[k]!];
    across += (samples.x[b]! - xs[b]! - (samples.x[a]! - xs[a]!)) ** 2 / count;
    upright += (samples.y[b]! - ys[b]! - (samples.y[a]! - ys[a]!)) ** 2 / count;
    mean += Math.abs(xs[b]! - xs[a]!) / count;
  }
  if (count < LEAST_STEPS || mean < Math.sqrt(2 * upright)) return null;
  const more = Math.max(0, across - upright);
  const error = Math.sqrt((3 * (across ** 2 + upright ** 2)) / count);
  const se = more > 0 ? Math.min(error / (2 * Math.sqrt(more)), Math.sqrt(error)) : Math.sqrt(error);
  return {
    value: Math.sqrt(more) / mean,
    se: se / mean,
    ofNoise: Math.max(Math.sqrt(upright), Math.SQRT2 * noiseUpright(view)) / mean,
  };
}

/** Noise of the heights of all drawings that the account uses, px. */
function noiseUpright(view: TrackView): number {
  const { fit, weight } = view.account;
  const off = view.field.drawings.flatMap((drawing, i) => (weight[i]! > 0 ? [drawing.y - fit.ys[i]!] : []));
  return Math.sqrt(off.reduce((sum, one) => sum + one * one, 0) / Math.max(1, off.length));
}

/** Fewest drawings of a flight whose steps can be said to scatter, and the greatest share of them left out as off the arc. */
const LEAST_SCATTERED = 8;
const MOST_LEFT = 0.15;

/** How many times what noise makes of the steps they must scatter. */
const OVER_NOISE = 2;

/**
 * Scatter of the steps across where it is no noise, no other fault of the flight, and no doing of one drawing: the scatter that
 * stays without the drawing that lies farthest off. Null where there is none to speak of.
 */
export function scatterAcross(view: TrackView, flight: FlightView): Estimated | null {
  const { account, field } = view;
  const { fault, left } = account;
  if (account.depth || (fault && fault.kind !== 'gravity')) return null;
  const used = drawingsOf(view, flight);
  const stray = left.filter((i) => field.samples.t[i]! >= flight.start && field.samples.t[i]! <= flight.end).length;
  if (used.length < LEAST_SCATTERED || stray > MOST_LEFT * used.length) return null;
  const off = (i: number) => Math.abs(field.samples.x[i]! - account.fit.xs[i]!);
  const farthest = used.reduce((best, i) => (off(i) > off(best) ? i : best));
  const scatter = stepScatter(view, flight, farthest);
  if (!scatter || scatter.value < OVER_NOISE * scatter.ofNoise) return null;
  return severityOf(scatter.value, scatter.se, used.length, view.tolerances.acrossSpread) ? scatter : null;
}
