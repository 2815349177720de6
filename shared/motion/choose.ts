import type { Account, Fault, Field } from './account.ts';
import { fitAccount } from './account.ts';
import type { ShapeName } from './shapes.ts';
import type { Sketch } from './sketch.ts';
import {
  flightLast,
  oneFlight,
  pathOf,
  recast,
  restFirst,
  restLast,
  rollFirst,
  sketchFrom,
  sketchOf,
  withoutKnot,
} from './sketch.ts';
import type { Stretch } from './spans.ts';

/** All accounts of one track, the one chosen first of all, and the best one without a fault. */
export interface Contest {
  chosen: Account;
  clean: Account;
  accounts: Account[];
}

/** Where the search for a shape's number starts: some shapes have no slope at nothing. */
const SHAPE_STARTS: Partial<Record<ShapeName, number>> = { hang: 1, 'hang-up': 1, 'even-path': 0.2, 'even-steps': 0.2 };

/**
 * Lets every account of a track compete on the same residuals and takes the one that costs least. Structure and fault are
 * searched in turn: the best fault for a structure, then the best structure for that fault, until neither changes.
 */
export function holdContest(field: Field, stretches: readonly Stretch[], lost: readonly number[]): Contest | null {
  const full = Float64Array.from(field.drawings, (drawing) => drawing.weight);
  const weight = Float64Array.from(full);
  for (const index of lost) weight[index] = 0;
  let best: Contest | null = null;
  if (stretches.some((stretch) => stretch.kind === 'flight')) {
    for (const sketch of firstSketches(sketchOf(field, stretches), stretches, field)) {
      const next = compete(sketch, weight, full, field);
      if (!best || next.chosen.cost < best.chosen.cost) best = next;
    }
  }
  if (!best || isPoor(best.chosen, field)) {
    for (const [before, after] of [
      [0, 0],
      [1, 0],
      [2, 0],
      [1, 1],
      [2, 1],
      [3, 1],
    ] as const) {
      const sketch = oneFlight(field, before, after);
      const next = sketch && compete(sketch, full, full, field);
      if (next && (!best || next.chosen.cost < best.chosen.cost)) best = next;
    }
  }
  if (!best) return null;
  for (let round = 0; round < 3; round += 1) {
    let better: Account | null = null;
    for (const account of best.accounts.slice(0, 3)) {
      const next = restructure(account, field, full);
      if (next && next.cost < (better ?? best.chosen).cost) better = next;
    }
    if (!better) break;
    const next = compete(sketchFrom(better.fit.path, better.fit.theta, better.fit.knots), better.weight, full, field);
    if (next.chosen.cost >= best.chosen.cost) break;
    best = next;
  }
  return best;
}

/** The sketch as it is, and with the drawings that no stretch claims at either end taken for rest. */
function firstSketches(sketch: Sketch, stretches: readonly Stretch[], field: Field): Sketch[] {
  const before = stretches[0]!.from;
  const after = field.drawings.length - 1 - stretches[stretches.length - 1]!.to;
  const opened = before > 0 && before < 4 ? restFirst(sketch, before, field) : null;
  const closed = after > 0 && after < 4 ? restLast(opened ?? sketch, after, field) : null;
  const resting = closed ?? opened;
  return resting ? [sketch, resting] : [sketch];
}

/** An account that leaves out much or fits badly: its structure may be wrong. */
function isPoor(account: Account, field: Field): boolean {
  return account.left.length > 0.2 * field.drawings.length || account.noise2 > 9;
}

function compete(sketch: Sketch, weight: Float64Array, full: Float64Array, field: Field): Contest {
  const plain = pathOf(sketch, null, false, field);
  let clean = fitAccount(plain.path, plain.theta, null, false, weight, field);
  if (weight.some((w, i) => w !== full[i])) {
    const whole = fitAccount(plain.path, clean.fit.theta, null, false, full, field);
    if (whole.cost < clean.cost) clean = whole;
  }
  const base = sketchFrom(clean.fit.path, clean.fit.theta, clean.fit.knots);
  const accounts = [clean];
  const depth = pathOf(base, null, true, field);
  accounts.push(fitAccount(depth.path, depth.theta, null, true, clean.weight, field));
  for (const fault of possibleFaults(clean, field)) {
    const start = pathOf(base, fault, false, field, fault.kind === 'shape' ? { shape: SHAPE_STARTS[fault.name] } : {});
    accounts.push(fitAccount(start.path, start.theta, fault, false, full, field));
    if (fault.kind === 'shape' && fault.name.startsWith('hang')) {
      const long = pathOf(base, fault, false, field, { shape: 3.5 * field.step });
      accounts.push(fitAccount(long.path, long.theta, fault, false, clean.weight, field));
    }
    if (clean.left.length && fault.kind !== 'held') {
      accounts.push(fitAccount(start.path, start.theta, fault, false, clean.weight, field));
    }
  }
  accounts.sort((a, b) => a.cost - b.cost);
  return { chosen: accounts[0]!, clean, accounts };
}

interface Option {
  sketch: Sketch;
  fault: Fault | null;
  depth: boolean;
  shape?: number;
}

/** A structure that explains the track at less cost: other ends, a contact more or fewer; null when there is none. */
function restructure(account: Account, field: Field, full: Float64Array): Account | null {
  let best: Account | null = null;
  for (const option of optionsFor(account, field)) {
    const { fault } = option;
    if (fault && 'span' in fault && option.sketch.spans[fault.span]?.kind !== 'flight') continue;
    const { path, theta } = account.fit;
    const start = pathOf(option.sketch, fault, option.depth, field, {
      shape: option.shape,
      depth: account.depth ? [theta[path.depthAt]!, theta[path.depthAt + 1]!] : undefined,
    });
    const next = fitAccount(start.path, start.theta, fault, option.depth, full, field);
    if (next.cost < (best ?? account).cost - 1e-6) best = next;
  }
  return best;
}

function optionsFor(account: Account, field: Field): Option[] {
  const { path, theta, knots } = account.fit;
  const sketch = sketchFrom(path, theta, knots);
  const { spans } = sketch;
  const last = spans.length - 1;
  const { fault, depth } = account;
  const shape = path.shapeAt >= 0 ? theta[path.shapeAt]! : undefined;
  const options: Option[] = [];
  const add = (next: Sketch | null, shift: (span: number) => number = (span) => span) => {
    if (!next) return;
    const moved = fault && 'span' in fault ? { ...fault, span: shift(fault.span) } : fault;
    options.push({ sketch: next, fault: moved, depth, shape });
  };
  for (const count of [1, 2, 3]) add(restFirst(sketch, count, field), (span) => span + 1);
  for (const count of [1, 2, 3]) add(restLast(sketch, count, field));
  for (const count of [2, 3, 4]) add(flightLast(sketch, count, field));
  if (spans[0]!.kind === 'flight') {
    for (const share of [0.15, 0.3, 0.45, 0.6, 0.75]) {
      const rolled = rollFirst(sketch, share, field);
      if (!rolled) continue;
      options.push({ sketch: rolled, fault: null, depth: false }, { sketch: rolled, fault: null, depth: true });
    }
  }
  if (last > 0) {
    if (spans[0]!.kind === 'flight') add(recast(sketch, 0, 'rest', false));
    if (spans[last]!.kind === 'flight') add(recast(sketch, last, 'rest', false));
  }
  for (let k = 1; k <= last; k += 1) {
    const before = spans[k - 1]!.kind;
    const after = spans[k]!.kind;
    if (after === 'flight' && before !== 'flight') add(recast(sketch, k, 'flight', !spans[k]!.tangent));
    const outer = (k === 1 && before === 'rest') || (k === last && after === 'rest');
    if (before !== 'flight' && !outer) continue;
    if (after !== 'flight' && !outer) continue;
    const joined = withoutKnot(sketch, k);
    add(joined, (span) => (span >= k ? span - 1 : span));
    if (before === 'flight' && after === 'flight' && isDoubtful(account, k)) {
      for (const name of ALL_SHAPES) {
        options.push({
          sketch: joined,
          fault: { kind: 'shape', name, span: k - 1 },
          depth: false,
          shape: SHAPE_STARTS[name],
        });
      }
    }
  }
  return options;
}

const ALL_SHAPES: readonly ShapeName[] = ['ease', 'even-path', 'apex', 'power', 'hang', 'hang-up', 'even-steps'];

/** A contact that kicks far less than a bounce between two flights of these lengths would. */
function isDoubtful(account: Account, k: number): boolean {
  const { knots, theta } = account.fit;
  const g = theta[0]!;
  const left = knots.t[k]! - knots.t[k - 1]!;
  const right = knots.t[k + 1]! - knots.t[k]!;
  const down = (knots.y[k]! - knots.y[k - 1]!) / left + 0.5 * g * left;
  const up = (knots.y[k + 1]! - knots.y[k]!) / right - 0.5 * g * right;
  return down - up < 0.3 * g * (left + right);
}

function possibleFaults(clean: Account, field: Field): Fault[] {
  const faults: Fault[] = [];
  const { fit } = clean;
  const { spans } = fit.path;
  const flights = spans.filter((span) => span.kind === 'flight').length;
  spans.forEach((span, index) => {
    if (span.kind !== 'flight') return;
    const length = fit.knots.t[index + 1]! - fit.knots.t[index]!;
    const g = fit.theta[span.gravity]!;
    const apex = length / 2 - (fit.knots.y[index + 1]! - fit.knots.y[index]!) / (length * g);
    const names: ShapeName[] = ['ease', 'even-path'];
    if (!span.tangent && apex > 0.5 && apex < length - 0.5)
      names.push('apex', 'power', 'hang', 'hang-up', 'even-steps');
    for (const name of names) faults.push({ kind: 'shape', name, span: index });
    const firstOfTwo = flights === 2 && !spans.slice(0, index).some((before) => before.kind === 'flight');
    if (flights > 1 && !firstOfTwo) faults.push({ kind: 'gravity', span: index });
  });
  const { drawings } = field;
  const steps = drawings.map((d, i) => (i ? Math.hypot(d.x - drawings[i - 1]!.x, d.y - drawings[i - 1]!.y) : 0));
  for (let i = 1; i < steps.length; i += 1) {
    const around = Math.max(steps[i - 1] ?? 0, steps[i + 1] ?? 0);
    if (isFlightAt(clean, field.samples.t[i]!) && steps[i]! < 0.35 * around && around > 3 * Math.sqrt(clean.noise2)) {
      faults.push({ kind: 'held', drawing: i });
    }
  }
  return faults;
}

function isFlightAt(account: Account, t: number): boolean {
  const { knots, path } = account.fit;
  return path.spans.some((span, k) => span.kind === 'flight' && knots.t[k]! <= t + 1e-9 && knots.t[k + 1]! >= t - 1e-9);
}
