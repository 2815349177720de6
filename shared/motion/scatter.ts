import type { FlightView, TrackView } from './view.ts';

/** Index of the drawings of a flight that its account uses. */
function drawingsOf(view: TrackView, flight: FlightView): number[] {
  const { t } = view.field.samples;
  const out: number[] = [];
  for (let i = 0; i < t.length; i += 1) {
    if (t[i]! >= flight.start && t[i]! <= flight.end && view.account.weight[i]! > 0) out.push(i);
  }
  return out;
}

/**
 * Scatter of the steps across over their mean, with what the noise of the marks accounts for taken out. Null where the thing
 * hardly moves across.
 */
export function stepScatter(view: TrackView, flight: FlightView): { value: number; se: number } | null {
  const used = drawingsOf(view, flight);
  const { samples } = view.field;
  const { xs } = view.account.fit;
  const noise2 = view.account.noise2;
  let sum = 0;
  let count = 0;
  let mean = 0;
  for (let k = 1; k < used.length; k += 1) {
    const a = used[k - 1]!;
    const b = used[k]!;
    const off = samples.x[b]! - xs[b]! - (samples.x[a]! - xs[a]!);
    sum += off * off - noise2 * (1 / samples.weight[a]! + 1 / samples.weight[b]!);
    mean += Math.abs(xs[b]! - xs[a]!);
    count += 1;
  }
  if (count < 4 || mean / count < 2 * Math.sqrt(noise2)) return null;
  mean /= count;
  return {
    value: Math.sqrt(Math.max(0, sum / count)) / mean,
    se: Math.sqrt((2 * noise2) / Math.sqrt(count)) / mean / 2,
  };
}

/** Farthest drawing off the arc, as a share of the local step; its error is the noise over that step. */
export function offArc(view: TrackView, flight: FlightView): { value: number; se: number } | null {
  const { samples } = view.field;
  const { xs, ys } = view.account.fit;
  let value = 0;
  let se = 0;
  for (const i of view.account.left) {
    const t = samples.t[i]!;
    if (t < flight.start || t > flight.end) continue;
    const step = Math.max(1, localStep(view, i));
    const off = Math.hypot(samples.x[i]! - xs[i]!, samples.y[i]! - ys[i]!) / step;
    if (off > value) {
      value = off;
      se = Math.sqrt(view.account.noise2) / step;
    }
  }
  return { value, se };
}

/** Length of the path's step at a drawing, px. */
export function localStep(view: TrackView, drawing: number): number {
  const { xs, ys } = view.account.fit;
  const before = Math.max(0, drawing - 1);
  const after = Math.min(xs.length - 1, drawing + 1);
  return Math.hypot(xs[after]! - xs[before]!, ys[after]! - ys[before]!) / Math.max(1, after - before);
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
