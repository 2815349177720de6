import type { Account, Fault, Field } from './account.ts';
import { PRIOR_FREEDOM } from './judge.ts';
import { fitStep } from './fit.ts';
import type { ShapeName } from './shapes.ts';
import { scoreBase, scoreGravity, scoreShape } from './score.ts';
import { pathOf, sketchFrom } from './sketch.ts';

/** Faults worth fitting: what one step away from the account without a fault promises to gain, best first. */
export interface Promise {
  fault: Fault | null;
  depth: boolean;
  gain: number;
}

const LEAST_PROMISE = 11;
const MOST_TRIED = 6;

/**
 * Tries every fault by one Gauss-Newton step from the account without one (a score test) and keeps those that promise most;
 * a track without a fault promises nothing and needs no further fits.
 */
export function promising(clean: Account, field: Field): Promise[] {
  const { path, theta, knots } = clean.fit;
  const base = sketchFrom(path, theta, knots);
  const samples = { ...field.samples, weight: clean.weight };
  const marks = 2 * (field.drawings.length - clean.left.length) + field.replicates.freedom;
  const squares = clean.noise2 * (clean.freedom + PRIOR_FREEDOM);
  const out: Promise[] = [];
  const marksOf = (gain: number) => marks * Math.log(squares / Math.max(squares - gain, 0.02 * squares));
  const offer = (fault: Fault | null, depth: boolean, gain: number | undefined) => {
    const worth = gain === undefined ? 0 : marksOf(gain);
    if (worth > LEAST_PROMISE) out.push({ fault, depth, gain: worth });
  };
  if (!clean.depth && !field.scaled) {
    const start = pathOf(base, null, true, field);
    offer(null, true, fitStep(start.path, start.theta, samples, 0)?.gain);
  }
  const scores = scoreBase(clean.fit, samples);
  for (const fault of scores ? possibleFaults(clean, field) : []) {
    if (fault.kind === 'held') out.push({ fault, depth: clean.depth, gain: Infinity });
    else if (fault.kind === 'gravity') offer(fault, clean.depth, scoreGravity(scores!, fault.span)?.gain);
    else offer(fault, clean.depth, scoreShape(scores!, fault.name, fault.span)?.gain);
  }
  out.sort((a, b) => b.gain - a.gain);
  const best = out.find((one) => Number.isFinite(one.gain))?.gain ?? 0;
  return out.filter((one, i) => i < MOST_TRIED && one.gain > 0.15 * best);
}

function possibleFaults(clean: Account, field: Field): Fault[] {
  const faults: Fault[] = [];
  const { fit } = clean;
  const { spans } = fit.path;
  const flights = spans.filter((span) => span.kind === 'flight').length;
  spans.forEach((span, index) => {
    if (span.kind !== 'flight' || isUnfree(field, fit.knots.t[index]!, fit.knots.t[index + 1]!)) return;
    const length = fit.knots.t[index + 1]! - fit.knots.t[index]!;
    const g = fit.theta[span.gravity]!;
    const apex = length / 2 - (fit.knots.y[index + 1]! - fit.knots.y[index]!) / (length * g);
    const names: ShapeName[] = ['ease', 'even-path'];
    if (!span.tangent && apex > 0.5 && apex < length - 0.5)
      names.push('apex', 'power', 'hang', 'hang-up', 'even-steps');
    if (field.airy && apex < 0.3 * length) names.splice(0, names.length, 'ease', 'drag');
    for (const name of names) faults.push({ kind: 'shape', name, span: index });
    const firstOfTwo = flights === 2 && !spans.slice(0, index).some((before) => before.kind === 'flight');
    if (flights > 1 && !firstOfTwo) faults.push({ kind: 'gravity', span: index });
  });
  const { drawings } = field;
  const steps = drawings.map((d, i) => (i ? Math.hypot(d.x - drawings[i - 1]!.x, d.y - drawings[i - 1]!.y) : 0));
  for (let i = 1; i < steps.length; i += 1) {
    const around = Math.max(steps[i - 1] ?? 0, steps[i + 1] ?? 0);
    if (
      isFlightAt(clean, field.samples.t[i - 1]!) &&
      isFlightAt(clean, field.samples.t[i]!) &&
      steps[i]! < 0.35 * around &&
      steps[i - 1]! > 2 * steps[i]! &&
      around > 3 * Math.sqrt(clean.noise2)
    ) {
      faults.push({ kind: 'held', drawing: i });
    }
  }
  return faults;
}

/** Whether someone said of a span that it is no free flight. */
export function isUnfree(field: Field, start: number, end: number): boolean {
  const middle = (start + end) / 2;
  return field.hand.notFree.some((span) => span.from <= middle && middle <= span.to);
}

function isFlightAt(account: Account, t: number): boolean {
  const { knots, path } = account.fit;
  return path.spans.some((span, k) => span.kind === 'flight' && knots.t[k]! <= t + 1e-9 && knots.t[k + 1]! >= t - 1e-9);
}
