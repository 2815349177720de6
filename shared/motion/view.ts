import type { FrameRate } from '../reading/document.ts';
import { shownFrame } from '../reading/document.ts';
import type { Tolerances } from '../reading/tolerances.ts';
import type { Account, Field } from './account.ts';
import type { Contest } from './compete.ts';
import { isUnfree } from './faults.ts';
import type { ScoreBase } from './score.ts';

/** One flight as the findings and measures see it. Times here are local (frames after the first drawing). */
export interface FlightView {
  id: string;
  span: number;
  /** Its place in the order of flights. */
  index: number;
  start: number;
  end: number;
  length: number;
  /** Whether its take-off and landing lie within the strip. */
  opens: boolean;
  closes: boolean;
  /** Moment of the apex of the true flight, after `start` (with a hold at the top: its middle); may lie outside. */
  apex: number;
  /** Frames that the flight is held at its top, 0 without a hang. */
  held: number;
  gravity: number;
  judged: boolean;
}

/** Everything a finding may look at. */
export interface TrackView {
  id: string;
  field: Field;
  contest: Contest;
  account: Account;
  flights: FlightView[];
  tolerances: Tolerances;
  /** Document frame of local time 0. */
  origin: number;
  firstFrame: number;
  /** Frames a drawing; 1 for a mix. */
  hold: number;
  fps: FrameRate;
  scale: { pxPerMetre: number } | null;
  /** Score tests worked out so far, by account. */
  scores: Map<Account, ScoreBase | null>;
  /** What the production's gravity is, m/s². */
  expectedGravity: number;
  /** A light thing: air slows it, so that its gravity is not judged. */
  light: boolean;
}

/** Document frame of a local time. */
export function frameOf(view: TrackView, time: number): number {
  return time + view.origin;
}

/** The production's number of the frame at (or next before) a local time. */
export function shownAt(view: TrackView, time: number): number {
  return shownFrame(Math.round(frameOf(view, time)), view.firstFrame);
}

/** First and last frame of the document that a flight touches. */
export function framesOf(view: TrackView, flight: FlightView): { from: number; to: number } {
  return { from: Math.floor(frameOf(view, flight.start)), to: Math.ceil(frameOf(view, flight.end)) };
}

/** The flights of an account, named after the object: A1, A2, … */
export function flightsOf(id: string, account: Account, field: Field): FlightView[] {
  const { path, knots, theta } = account.fit;
  const out: FlightView[] = [];
  const last = path.spans.length - 1;
  path.spans.forEach((span, k) => {
    if (span.kind !== 'flight') return;
    const start = knots.t[k]!;
    const end = knots.t[k + 1]!;
    const length = end - start;
    const gravity = theta[span.gravity]!;
    const hangs = path.shape?.span === k && (path.shape.name === 'hang' || path.shape.name === 'hang-up');
    const held = hangs ? theta[path.shapeAt]! : 0;
    const moving = length - held;
    out.push({
      id: `${id}${out.length + 1}`,
      span: k,
      index: out.length,
      start,
      end,
      length,
      opens: k > 0,
      closes: k < last,
      apex: moving / 2 - (knots.y[k + 1]! - knots.y[k]!) / (moving * gravity) + held / 2,
      held,
      gravity,
      judged: !isUnfree(field, start, end),
    });
  });
  return out;
}

/** Indices of the drawings of a flight that its account uses. */
export function drawingsOf(view: TrackView, flight: FlightView): number[] {
  const { t } = view.field.samples;
  const out: number[] = [];
  for (let i = 0; i < t.length; i += 1) {
    if (t[i]! >= flight.start && t[i]! <= flight.end && view.account.weight[i]! > 0) out.push(i);
  }
  return out;
}
