import type { Field } from './account.ts';
import type { PathFit } from './fit.ts';

/** A contact kicks the thing up by at least this many steps of gravity, and by this share of what its flights would give. */
const LEAST_KICK = 1.2;
const WEAK_KICK = 0.3;

/**
 * How many contacts between two flights do not kick the thing up, or have but one drawing beyond them to say so. A kick far
 * weaker than a bounce between two such flights gives counts in part.
 */
export function impossible(fit: PathFit, weight: Float64Array, field: Field): number {
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

function drawingsBetween(field: Field, weight: Float64Array, from: number, to: number): number {
  let count = 0;
  for (let i = 0; i < weight.length; i += 1) {
    const t = field.samples.t[i]!;
    if (weight[i]! > 0 && t > from && t < to) count += 1;
  }
  return count;
}
