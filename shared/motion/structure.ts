import type { Account, Fault, Field } from './account.ts';
import { fitOnce, trim } from './trim.ts';
import { keepsHand } from './honour.ts';
import { SHAPE_NAMES, SHAPE_STARTS } from './shapes.ts';
import type { Sketch } from './sketch.ts';
import { flightLast, recast, restFirst, restLast, rollFirst, withoutKnot } from './sketchEdits.ts';
import { pathOf, sketchFrom } from './sketch.ts';

interface Option {
  sketch: Sketch;
  fault: Fault | null;
  depth: boolean;
  shape?: number | undefined;
  /** Whether drawings left out near the ends are taken back in: it is they that it explains. */
  ends?: boolean;
}

/** A structure that explains the track at less cost: other ends, a contact more or fewer; null when there is none. */
export function restructure(account: Account, field: Field, full: Float64Array): Account | null {
  const weight = Float64Array.from(account.weight);
  for (let i = 0; i < weight.length; i += 1) if (i < OUTER || i >= weight.length - OUTER) weight[i] = full[i]!;
  const { path, theta } = account.fit;
  const depth: [number, number] | undefined = account.depth
    ? [theta[path.depthAt]!, theta[path.depthAt + 1]!]
    : undefined;
  let best: Account | null = null;
  let second: Account | null = null;
  for (const option of optionsFor(account, field)) {
    const { fault, ends } = option;
    if (fault && 'span' in fault && option.sketch.spans[fault.span]?.kind !== 'flight') continue;
    const start = pathOf(option.sketch, fault, option.depth, field, { shape: option.shape, depth });
    const next = fitOnce(start, fault, option.depth, ends ? weight : account.weight, field, GLANCE);
    if (next.cost < (best?.cost ?? Infinity)) {
      second = best;
      best = next;
    } else if (next.cost < (second?.cost ?? Infinity)) second = next;
  }
  const rolled = rolls(account, field);
  if (rolled && rolled.cost < (best?.cost ?? Infinity)) {
    second = best;
    best = rolled;
  }
  const tries = [best, second].filter((one) => one !== null && one.cost < account.cost + 60) as Account[];
  const trimmed = tries
    .map((one) => trim(fitOnce(one.fit, one.fault, one.depth, one.weight, field), field))
    .sort((a, b) => a.cost - b.cost)[0];
  return trimmed && trimmed.cost < account.cost - 1e-6 ? trimmed : null;
}

/** The track with its first flight taken for a roll and a fall, flat or in depth, whichever costs less. */
function rolls(account: Account, field: Field): Account | null {
  const { path, theta, knots } = account.fit;
  const sketch = rollFirst(sketchFrom(path, theta, knots), 0.4, field);
  if (!sketch || !keepsHand(sketch, field) || !(misfits(account, field) || bendsFirst(account))) return null;
  const [flat, deep] = [false, !field.scaled].map((depth) => {
    return trim(fitOnce(pathOf(sketch, null, depth, field), null, depth, account.weight, field), field);
  });
  return flat!.cost < deep!.cost ? flat! : deep!;
}

/** A shape fault on the first flight, whose start is not seen: a roll before a fall looks like one. */
function bendsFirst(account: Account): boolean {
  const { fault } = account;
  return fault?.kind === 'shape' && fault.span === 0;
}

/** Rounds that show whether a structure is worth fitting to the end. */
const GLANCE = 4;

/** Drawings at either end whose place in the structure is tried anew. */
const OUTER = 4;

function optionsFor(account: Account, field: Field): Option[] {
  const { path, theta, knots } = account.fit;
  const sketch = sketchFrom(path, theta, knots);
  const { spans } = sketch;
  const last = spans.length - 1;
  const { fault, depth } = account;
  const shape = path.shapeAt >= 0 ? theta[path.shapeAt]! : undefined;
  const options: Option[] = [];
  const add = (next: Sketch | null, shift: (span: number) => number = (span) => span, ends = false) => {
    if (!next) return;
    const moved = fault && 'span' in fault ? { ...fault, span: shift(fault.span) } : fault;
    options.push({ sketch: next, fault: moved, depth, shape, ends });
  };
  const same = (span: number) => span;
  const misfit = misfits(account, field);
  const { left } = account;
  const n = field.drawings.length;
  if (misfit || left.some((i) => i < OUTER)) {
    for (const count of [1, 2, 3]) add(restFirst(sketch, count, field), (span) => span + 1, true);
  }
  if (misfit || left.some((i) => i >= n - OUTER)) {
    for (const count of [1, 2, 3]) add(restLast(sketch, count, field), same, true);
    for (const count of [2, 3, 4]) add(flightLast(sketch, count, field), same, true);
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
    if (before === 'flight' && after === 'flight' && hardlyKicks(account, k)) {
      for (const name of field.airy ? [...SHAPE_NAMES, 'drag' as const] : SHAPE_NAMES) {
        for (const start of SHAPE_STARTS[name]) {
          options.push({
            sketch: joined,
            fault: { kind: 'shape', name, span: k - 1 },
            depth: false,
            shape: start.base + start.steps * field.step,
          });
        }
      }
    }
  }
  return options.filter((option) => keepsHand(option.sketch, field));
}

/** Whether an account leaves more unexplained than noise does. */
export function misfits(account: Account, field: Field): boolean {
  return (
    account.impossible > 0 ||
    Math.sqrt(account.noise2) > 1.5 * field.noise + 0.1 ||
    account.left.some((i) => account.left.includes(i + 1))
  );
}

/** Whether other structures are worth a try: misfit, or drawings left out near an end, where rest or a contact may explain them. */
export function isDoubtful(account: Account, field: Field): boolean {
  const n = field.drawings.length;
  return misfits(account, field) || bendsFirst(account) || account.left.some((i) => i < OUTER || i >= n - OUTER);
}

/** A contact that kicks far less than a bounce between two flights of these lengths would. */
function hardlyKicks(account: Account, k: number): boolean {
  const { knots, theta } = account.fit;
  const g = theta[0]!;
  const left = knots.t[k]! - knots.t[k - 1]!;
  const right = knots.t[k + 1]! - knots.t[k]!;
  const down = (knots.y[k]! - knots.y[k - 1]!) / left + 0.5 * g * left;
  const up = (knots.y[k + 1]! - knots.y[k]!) / right - 0.5 * g * right;
  return down - up < 0.3 * g * (left + right);
}
