import type { Account, Fault, Field } from './account.ts';
import { fitAccount } from './account.ts';
import type { ShapeName } from './shapes.ts';
import type { Sketch } from './sketch.ts';
import { flightLast, pathOf, restFirst, restLast, sketchFrom, sketchOf, withoutKnot } from './sketch.ts';
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
export function holdContest(field: Field, stretches: readonly Stretch[], lost: readonly number[]): Contest {
  const full = Float64Array.from(field.drawings, (drawing) => drawing.weight);
  const weight = Float64Array.from(full);
  for (const index of lost) weight[index] = 0;
  let best = compete(sketchOf(field, stretches), weight, full, field);
  for (let round = 0; round < 3; round += 1) {
    const better = restructure(best.chosen, field, full);
    if (!better) break;
    const next = compete(sketchFrom(better.fit.path, better.fit.theta, better.fit.knots), better.weight, full, field);
    if (next.chosen.cost >= best.chosen.cost) break;
    best = next;
  }
  return best;
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
    const begin = Float64Array.from(full);
    if (fault.kind === 'held' && fault.mode === 'replaced') begin[fault.drawing] = 0;
    accounts.push(fitAccount(start.path, start.theta, fault, false, begin, field));
    if (clean.left.length && fault.kind !== 'held') {
      accounts.push(fitAccount(start.path, start.theta, fault, false, clean.weight, field));
    }
  }
  accounts.sort((a, b) => a.cost - b.cost);
  return { chosen: accounts[0]!, clean, accounts };
}

/** A structure that explains the track at less cost under the same fault: other ends, a contact fewer; null when there is none. */
function restructure(account: Account, field: Field, full: Float64Array): Account | null {
  const { path, theta, knots } = account.fit;
  const sketch = sketchFrom(path, theta, knots);
  const options: { sketch: Sketch; shift: (span: number) => number }[] = [];
  const add = (next: Sketch | null, shift: (span: number) => number = (span) => span) => {
    if (next) options.push({ sketch: next, shift });
  };
  for (const count of [1, 2, 3]) add(restFirst(sketch, count, field), (span) => span + 1);
  for (const count of [1, 2, 3]) add(restLast(sketch, count, field));
  for (const count of [2, 3, 4]) add(flightLast(sketch, count, field));
  for (let k = 1; k < sketch.spans.length; k += 1) {
    const kinds = [sketch.spans[k - 1]!.kind, sketch.spans[k]!.kind];
    const outer = k === 1 || k === sketch.spans.length - 1;
    if (kinds.every((kind) => kind === 'flight') || (outer && kinds.includes('rest') && kinds.includes('flight'))) {
      add(withoutKnot(sketch, k), (span) => (span >= k ? span - 1 : span));
    }
  }
  let best: Account | null = null;
  for (const option of options) {
    const { fault } = account;
    const moved = fault && 'span' in fault ? { ...fault, span: option.shift(fault.span) } : fault;
    if (moved && 'span' in moved && option.sketch.spans[moved.span]?.kind !== 'flight') continue;
    const depth: [number, number] | undefined = account.depth
      ? [theta[path.depthAt]!, theta[path.depthAt + 1]!]
      : undefined;
    const start = pathOf(option.sketch, moved, account.depth, field, {
      ...(path.shapeAt >= 0 ? { shape: theta[path.shapeAt]! } : {}),
      ...(depth ? { depth } : {}),
    });
    const next = fitAccount(start.path, start.theta, moved, account.depth, full, field);
    if (next.cost < (best ?? account).cost - 1e-6) best = next;
  }
  return best;
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
      faults.push({ kind: 'held', drawing: i, mode: 'inserted' }, { kind: 'held', drawing: i, mode: 'replaced' });
    }
  }
  return faults;
}

function isFlightAt(account: Account, t: number): boolean {
  const { knots, path } = account.fit;
  return path.spans.some((span, k) => span.kind === 'flight' && knots.t[k]! <= t + 1e-9 && knots.t[k + 1]! >= t - 1e-9);
}
