import type { Account } from './account.ts';
import { errorOf } from './errors.ts';
import { fitPolynomial } from './polynomial.ts';
import type { ScoreBase } from './score.ts';
import { scoreBase, scoreShape } from './score.ts';
import type { ShapeName } from './shapes.ts';
import { SHAPE_NOTHING } from './shapes.ts';
import type { FlightView, TrackView } from './view.ts';
import { drawingsOf } from './view.ts';

/** Value and standard deviation of one number. */
export interface Estimated {
  value: number;
  se: number;
}

/** The shape numbers that are told as measures, with the farthest from nothing at which one step away still means something. */
const FARTHEST = {
  apex: 0.4,
  'power-rise': 1.9,
  'power-fall': 1.9,
  ease: 1,
  'even-path': 1,
} as const satisfies Partial<Record<ShapeName, number>>;
export type MeasuredShape = keyof typeof FARTHEST;

/** Fewest drawings of a flight, and of each side of it that matters, from which a shape number can be told at all. */
const LEAST = { flight: 5, side: 3 };

/**
 * One shape number of a flight: the fitted one when the chosen account carries it, else one step away from that account. Null
 * where the flight is too short or too small to have it: too few drawings, or a step that leaves the range in which it holds.
 */
export function shapeNumber(view: TrackView, flight: FlightView, name: MeasuredShape): Estimated | null {
  const { account, contest } = view;
  const { fault, fit } = account;
  const here = fault?.kind === 'shape' && fault.span === flight.span;
  if (here && (fault.name === name || (fault.name === 'power' && name.startsWith('power')))) {
    return { value: fit.theta[fit.path.shapeAt]!, se: errorOf(account, (theta) => theta[fit.path.shapeAt]!) };
  }
  if (!hasDrawings(view, flight, name)) return null;
  const base = here ? contest.clean : account;
  const scores = scoresOf(view, base);
  if (!scores || base.fit.path.spans[flight.span]?.kind !== 'flight') return null;
  const score = scoreShape(scores, name, flight.span);
  if (!score) return null;
  const se = score.unit * noiseAfter(view, base, score.gain);
  if (!(Math.abs(score.step) <= FARTHEST[name] && se <= FARTHEST[name])) return null;
  return { value: SHAPE_NOTHING[name] + score.step, se };
}

/**
 * Change of the speed across over a flight, as a share of its mean. Beside another shape fault on a flat flight it is read from
 * the places across alone, so that a fault of the height does not spill into it.
 */
export function acrossDrift(view: TrackView, flight: FlightView): Estimated | null {
  const { fault, depth, fit } = view.account;
  const bent = fault?.kind === 'shape' && fault.span === flight.span && fault.name !== 'ease';
  if (bent) return depth ? null : driftAcrossAlone(view, flight);
  const ease = shapeNumber(view, flight, 'ease');
  const way = Math.abs(fit.knots.x[flight.span + 1]! - fit.knots.x[flight.span]!);
  if (!ease || way < LEAST_WAY * Math.sqrt(view.account.noise2)) return null;
  return { value: 2 * ease.value, se: 2 * ease.se };
}

/** Way across, over the noise, below which a thing goes straight up and down. */
const LEAST_WAY = 10;

/** The same from a quadratic through the places across, by least squares. */
function driftAcrossAlone(view: TrackView, flight: FlightView): Estimated | null {
  const used = drawingsOf(view, flight);
  if (used.length < LEAST.flight) return null;
  const { t, x, weight } = view.field.samples;
  const times = used.map((i) => t[i]!);
  const curve = fitPolynomial(
    times,
    used.map((i) => x[i]!),
    2,
  );
  const { half, middle, c } = curve;
  const centre = (flight.start + flight.length / 2 - middle) / half;
  const mean = (c[1]! + 2 * c[2]! * centre) / half;
  if (!(Math.abs(mean) * flight.length >= LEAST_WAY * Math.sqrt(view.account.noise2))) return null;
  const bends = fitPolynomial(
    times,
    times.map((time) => ((time - middle) / half) ** 2),
    1,
  ).rss;
  const marks = used.reduce((sum, i) => sum + weight[i]!, 0) / used.length;
  const noise2 = Math.max(view.account.noise2 / marks, curve.rss / (used.length - 3));
  const unit = (2 * flight.length) / (half * half * Math.abs(mean));
  const value = unit * Math.sign(mean) * c[2]!;
  const se = unit * Math.sqrt(noise2 / bends);
  return Math.abs(value) <= 2 * FARTHEST.ease && se <= 2 * FARTHEST.ease ? { value, se } : null;
}

/** Whether a flight, and where it matters each side of its apex, has the drawings that a shape number takes. */
function hasDrawings(view: TrackView, flight: FlightView, name: MeasuredShape): boolean {
  const used = drawingsOf(view, flight);
  if (used.length < LEAST.flight) return false;
  const top = flight.start + flight.apex;
  const rising = used.filter((i) => view.field.samples.t[i]! <= top).length;
  const falling = used.length - rising;
  if (name === 'power-rise') return rising >= LEAST.side;
  if (name === 'power-fall') return falling >= LEAST.side;
  return name !== 'apex' || Math.min(rising, falling) >= 2;
}

/** The score tests of an account, worked out once a view. */
export function scoresOf(view: TrackView, account: Account): ScoreBase | null {
  const known = view.scores.get(account);
  if (known !== undefined) return known;
  const scores = scoreBase(account.fit, { ...view.field.samples, weight: account.weight });
  view.scores.set(account, scores);
  return scores;
}

/**
 * Noise that is left once a number is let go where its step takes it: the step's own gain is no noise, and left in it would widen
 * the interval just where the estimate is far off. A balance point's own error comes on top.
 */
export function noiseAfter(view: TrackView, base: Account, gain: number): number {
  const body = view.account.noise2 - view.account.squares / view.account.freedom;
  return Math.sqrt(Math.max(0, base.squares - gain) / Math.max(1, base.freedom - 1) + Math.max(0, body));
}
