import type { Account, Fault, Field } from './account.ts';
import type { PathFit } from './fit.ts';
import { impossible } from './kicks.ts';

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

/**
 * Weighs an account. Drawings left out count as spread over `LOST_AREA`; every parameter has its price, raised where few marks
 * are left to say what the noise is (as the F test and Akaike's corrected criterion do).
 */
export function judge(fit: PathFit, fault: Fault | null, depth: boolean, weight: Float64Array, field: Field): Account {
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

function neighbours(left: readonly number[]): number {
  return left.filter((i) => left.includes(i + 1)).length;
}
