import type { Drawing } from './drawings.ts';
import type { PathFit, Samples } from './fit.ts';
import type { Honoured } from './hand.ts';
import { fitPath } from './fit.ts';
import type { Path } from './path.ts';
import type { ShapeName } from './shapes.ts';

/** One account of a track: what is assumed wrong (or nothing), and how well the whole path then fits. */
export interface Account {
  /** null: nothing is wrong. */
  fault: Fault | null;
  depth: boolean;
  fit: PathFit;
  /** Weights the fit used; 0 for drawings left out as off the arc. */
  weight: Float64Array;
  left: number[];
  /** Noise² per axis and mark, and the degrees of freedom behind it. */
  noise2: number;
  freedom: number;
  /** Minus twice the log likelihood, with the price of what is assumed: what accounts are compared by; less is better. */
  cost: number;
  /** Sum of squares of the marks about the path and about each other, px². */
  squares: number;
  /** How many of its contacts are no contacts. */
  impossible: number;
  /** Covariance of the parameters over noise², worked out for the account that is chosen. */
  covariance: Float64Array | null;
}

export type Fault =
  | { kind: 'shape'; name: ShapeName; span: number }
  | { kind: 'gravity'; span: number }
  | { kind: 'held'; drawing: number };

/** Noise per axis taken for granted while the marks say nothing else, px, and how many marks' worth of belief it has. */
const PRIOR_NOISE = 0.25;
export const PRIOR_FREEDOM = 6;

/** What each thing that an account assumes must gain, in squared units of noise. */
const PRICE = { shape: 16, drag: 8, gravity: 9, held: 20, depth: 16 };
const PARAMETER_PRICE = 5;

/** Cost of a drawing that nothing explains: spread evenly over (60 px)², one in thirty. */
const LOST_PRICE = 2 * Math.log(60 * 60) - 2 * Math.log(2 * Math.PI * Math.E) + 2 * Math.log(30) + 8;

/** On top for every drawing left out next to another: stray marks come alone, what comes in rows is a motion not understood. */
const NEIGHBOUR_PRICE = 12;

/** Price of a contact that kicks the thing down, or hardly at all: that is no contact. */
const IMPOSSIBLE_PRICE = 80;
const LEAST_KICK = 1.2;
const WEAK_KICK = 0.3;

export interface Field {
  samples: Samples;
  drawings: readonly Drawing[];
  replicates: { sum: number; freedom: number };
  /** Frames from one drawing to the next, as most are. */
  step: number;
  /** Whether air may slow a fall: the thing is light, or a scale says how fast it is. */
  airy: boolean;
  /** Whether a scale was given: it holds at one distance from the camera, so that there is no motion in depth. */
  scaled: boolean;
  /** What someone set, in local time. */
  hand: Honoured;
  /** Noise per axis as neighbouring drawings show it, px. */
  noise: number;
}

/** Fits one account with the weights given. */
export function fitOnce(
  start: { path: Path; theta: Float64Array },
  fault: Fault | null,
  depth: boolean,
  weight: Float64Array,
  field: Field,
  most?: number,
): Account {
  return judge(fitPath(start.path, start.theta, { ...field.samples, weight }, most), fault, depth, weight, field);
}

/** Fits an account again and again without the drawing that lies farthest off, as long as leaving it out is worth its price. */
export function trim(first: Account, field: Field): Account {
  let account = first;
  const most = 1 + Math.floor(field.drawings.length / 6);
  for (let round = 0; round < most; round += 1) {
    const worst = worstDrawing(account, field);
    if (worst < 0) break;
    const weight = Float64Array.from(account.weight);
    weight[worst] = 0;
    const next = fitOnce(account.fit, account.fault, account.depth, weight, field);
    if (next.cost >= account.cost) break;
    account = next;
  }
  return account.left.length ? readmit(account, field) : account;
}

/** Takes drawings back in that the path passes through after all. */
function readmit(account: Account, field: Field): Account {
  let best = account;
  for (const i of account.left) {
    const off = (field.samples.x[i]! - best.fit.xs[i]!) ** 2 + (field.samples.y[i]! - best.fit.ys[i]!) ** 2;
    const outer = i < 2 || i >= field.drawings.length - 2;
    if (!outer && off * field.drawings[i]!.weight > 30 * best.noise2) continue;
    const weight = Float64Array.from(best.weight);
    weight[i] = field.drawings[i]!.weight;
    const next = fitOnce(best.fit, best.fault, best.depth, weight, field);
    if (next.cost < best.cost) best = next;
  }
  return best;
}

function worstDrawing(account: Account, field: Field): number {
  let worst = -1;
  let most = 9 * account.noise2;
  const { xs, ys } = account.fit;
  for (let i = 0; i < xs.length; i += 1) {
    if (account.weight[i] === 0) continue;
    const r = account.weight[i]! * ((field.samples.x[i]! - xs[i]!) ** 2 + (field.samples.y[i]! - ys[i]!) ** 2);
    if (r > most) {
      most = r;
      worst = i;
    }
  }
  return worst;
}

/**
 * Weighs an account. Drawings left out count as spread over `LOST_AREA`; every parameter has its price, raised where few marks
 * are left to say what the noise is (as the F test and Akaike's corrected criterion do).
 */
function judge(fit: PathFit, fault: Fault | null, depth: boolean, weight: Float64Array, field: Field): Account {
  let used = 0;
  const left: number[] = [];
  for (let i = 0; i < weight.length; i += 1) {
    if (weight[i]! >= 0.5) used += 1;
    else if (weight[i]! === 0) left.push(i);
  }
  const extra = fault?.kind === 'held' ? 1 : 0;
  const free = Math.max(1, 2 * used + field.replicates.freedom - fit.path.size - extra);
  const total = fit.rss + field.replicates.sum;
  const squares = total + PRIOR_FREEDOM * PRIOR_NOISE ** 2;
  const marks = 2 * used + field.replicates.freedom + PRIOR_FREEDOM;
  const odd = impossible(fit, weight, field);
  const plain = fit.path.size - (fit.path.shape ? 1 : 0) - (depth ? 2 : 0);
  const price =
    PARAMETER_PRICE * plain + (fault ? priceOf(fault, fit) : 0) + (depth ? PRICE.depth + (fault ? 10 : 0) : 0);
  return {
    fault,
    depth,
    fit,
    weight,
    left,
    noise2: squares / (free + PRIOR_FREEDOM),
    freedom: free,
    squares: total,
    cost:
      marks * Math.log(squares / marks) +
      (price * marks) / (free + PRIOR_FREEDOM) +
      left.length * LOST_PRICE +
      neighbours(left) * NEIGHBOUR_PRICE +
      odd * IMPOSSIBLE_PRICE,
    impossible: odd,
    covariance: null,
  };
}

/** Price of a fault. Along a straight line up and down, even steps say no more than too straight a rise and fall. */
function priceOf(fault: Fault, fit: PathFit): number {
  if (fault.kind === 'shape' && fault.name === 'drag') return PRICE.drag;
  if (fault.kind !== 'shape' || !fault.name.startsWith('even')) return PRICE[fault.kind];
  const { knots, theta } = fit;
  const across = Math.abs(knots.x[fault.span + 1]! - knots.x[fault.span]!);
  const length = knots.t[fault.span + 1]! - knots.t[fault.span]!;
  return PRICE.shape + (across < 0.05 * theta[0]! * length * length ? 4 : 0);
}

/**
 * How many contacts between two flights do not kick the thing up, or have but one drawing beyond them to say so. A kick far
 * weaker than a bounce between two such flights gives counts in part.
 */
function impossible(fit: PathFit, weight: Float64Array, field: Field): number {
  const { path, knots, theta } = fit;
  const last = path.spans.length - 1;
  let count = 0;
  for (const barred of field.hand.barred) {
    for (let k = 1; k <= last; k += 1) {
      if (path.timeAt[k]! >= 0 && Math.abs(knots.t[k]! - barred) <= 1.5 * field.step) count += 2;
    }
  }
  for (let k = 1; k <= last; k += 1) {
    if (path.timeAt[k]! < 0) continue;
    if (path.spans[k - 1]!.kind !== 'flight' || path.spans[k]!.kind !== 'flight') continue;
    const g = theta[0]!;
    const left = knots.t[k]! - knots.t[k - 1]!;
    const right = knots.t[k + 1]! - knots.t[k]!;
    const down = (knots.y[k]! - knots.y[k - 1]!) / left + 0.5 * g * left;
    const up = (knots.y[k + 1]! - knots.y[k]!) / right - 0.5 * g * right;
    const alone =
      (k === last && drawingsBetween(field, weight, knots.t[k]!, Infinity) < 2) ||
      (k === 1 && drawingsBetween(field, weight, -Infinity, knots.t[k]!) < 2);
    if (alone || down - up < LEAST_KICK * g * field.step || (down < 0 && up > -g)) count += 1;
    else if (down - up < WEAK_KICK * g * (left + right)) count += 0.3;
  }
  return count;
}

function neighbours(left: readonly number[]): number {
  return left.filter((i) => left.includes(i + 1)).length;
}

function drawingsBetween(field: Field, weight: Float64Array, from: number, to: number): number {
  let count = 0;
  for (let i = 0; i < weight.length; i += 1) {
    const t = field.samples.t[i]!;
    if (weight[i]! > 0 && t > from && t < to) count += 1;
  }
  return count;
}
