import type { Measure } from '../reading/document.ts';
import type { FindingKind, MeasureName } from '../reading/kinds.ts';
import type { Account } from './account.ts';
import { boundsOf, reboundOf } from './bounces.ts';
import { errorOf } from './errors.ts';
import { metresPerSecond2 } from './units.ts';
import { offArc, repeatsOf, stepScatter } from './scatter.ts';
import type { ScoreBase } from './score.ts';
import { scoreBase, scoreGravity, scoreShape } from './score.ts';
import type { ShapeName } from './shapes.ts';
import { SHAPE_NOTHING } from './shapes.ts';
import { Z95, Z99_ONE, studentQuantile } from './statistics.ts';
import type { FlightView, TrackView } from './view.ts';

/** Value and standard deviation of one number. */
export interface Estimated {
  value: number;
  se: number;
}

interface Against {
  expected: number;
  tolerance: number;
  kind: FindingKind;
}

/**
 * A measure with its 95 % interval and one of three verdicts: off when it lies past the tolerance by its error (1 % risk), true
 * when its interval lies within, else cannot-tell (interval-null and equivalence tests, methods 5). Without anything to hold it
 * against it is what it is, and true.
 */
export function measureOf(name: MeasureName, estimate: Estimated, freedom: number, against: Against | null): Measure {
  const half = studentQuantile(Z95, freedom) * estimate.se;
  const strict = studentQuantile(Z99_ONE, freedom) * estimate.se;
  const distance = against ? Math.abs(estimate.value - against.expected) : 0;
  let verdict: Measure['verdict'] = 'true';
  if (against && distance - strict > against.tolerance) verdict = 'off';
  else if (against && distance + half >= against.tolerance) verdict = 'cannot-tell';
  return {
    name,
    value: estimate.value,
    low: estimate.value - half,
    high: estimate.value + half,
    expected: against?.expected ?? null,
    tolerance: against?.tolerance ?? null,
    verdict,
    kind: verdict === 'off' && against ? against.kind : null,
  };
}

/** The measures of one flight, by name. Those that its marks cannot decide at all are left out. */
export function measuresOf(view: TrackView, flight: FlightView): Measure[] {
  const { account, tolerances } = view;
  const { freedom } = account;
  const out: Measure[] = [];
  const add = (name: MeasureName, estimate: Estimated | null, against: Against | null) => {
    if (!estimate || ![estimate.value, estimate.se].every(Number.isFinite)) return;
    out.push(measureOf(name, estimate, freedom, against));
  };
  if (flight.apex > 1 && flight.apex < flight.length - 1) shapesOfArc(view, flight, add);
  const ease = shapeNumber(view, flight, 'ease');
  add('across-drift', ease && { value: 2 * ease.value, se: 2 * ease.se }, {
    expected: 0,
    tolerance: tolerances.acrossDrift.from,
    kind: 'across-uneven',
  });
  add('across-spread', stepScatter(view, flight), {
    expected: 0,
    tolerance: tolerances.acrossSpread.from,
    kind: 'across-uneven',
  });
  add('path-steps', shapeNumber(view, flight, 'even-path'), {
    expected: 0,
    tolerance: tolerances.pathSteps.from,
    kind: 'spacing-off-path',
  });
  gravityOf(view, flight, add);
  const rebound = reboundOf(view, flight);
  if (rebound) {
    const bounds = boundsOf(tolerances.bounceGain);
    const gain = measureOf('rebound-height', rebound.height, freedom, { ...bounds, kind: 'bounce-gains' });
    out.push(rebound.height.value > 1 ? gain : { ...gain, verdict: 'true', kind: null });
    add('rebound-period', rebound.period, null);
  }
  add('off-arc', offArc(view, flight), { expected: 0, tolerance: tolerances.pop.from, kind: 'pop' });
  add('repeats', { value: repeatsOf(view, flight), se: 0 }, { expected: 0, tolerance: 0.5, kind: 'held-frame' });
  return out;
}

type Add = (name: MeasureName, estimate: Estimated | null, against: Against | null) => void;

function shapesOfArc(view: TrackView, flight: FlightView, add: Add): void {
  const { tolerances } = view;
  const apex = shapeNumber(view, flight, 'apex');
  add('apex-time', apex && { value: 0.5 + apex.value, se: apex.se }, {
    expected: 0.5,
    tolerance: tolerances.apexTime.from,
    kind: 'apex-off-centre',
  });
  for (const side of ['rise', 'fall'] as const) {
    const power = shapeNumber(view, flight, `power-${side}`);
    if (!power) continue;
    const kind = power.value < 2 ? 'too-straight' : 'hang';
    add(`exponent-${side}`, power, { expected: 2, tolerance: tolerances.exponent.from, kind });
    const share = 0.5 ** power.value;
    add(
      side === 'rise' ? 'quarter-drop-before' : 'quarter-drop-after',
      { value: share, se: share * Math.LN2 * power.se },
      { expected: 0.25, tolerance: 0.25 * Math.LN2 * tolerances.exponent.from, kind },
    );
  }
}

function gravityOf(view: TrackView, flight: FlightView, add: Add): void {
  const { account, tolerances } = view;
  const g = account.fit.path.spans[flight.span]!.gravity;
  const gravity = { value: flight.gravity, se: errorOf(account, (theta) => theta[g]!) };
  add('gravity', gravity, null);
  if (view.scale) {
    const ratio = metresPerSecond2(1, view) / view.expectedGravity;
    add(
      'gravity-scale',
      { value: gravity.value * ratio, se: gravity.se * ratio },
      { expected: 1, tolerance: tolerances.gravity.from, kind: 'gravity-off-scale' },
    );
  }
  if (view.flights.length < 2) return;
  add('gravity-ratio', gravityRatio(view, flight), {
    expected: 1,
    tolerance: tolerances.gravity.from,
    kind: 'gravity-changes',
  });
}

/** Gravity of one flight over that of the others. */
function gravityRatio(view: TrackView, flight: FlightView): Estimated | null {
  const { account } = view;
  const { fault } = account;
  if (fault?.kind === 'gravity') {
    if (fault.span !== flight.span) return null;
    const ratio = (theta: Float64Array) => theta[1]! / theta[0]!;
    return { value: ratio(account.fit.theta), se: errorOf(account, ratio) };
  }
  const scores = scoresOf(view, account);
  const score = scores && scoreGravity(scores, flight.span);
  const others = account.fit.theta[0]!;
  return score && { value: 1 + score.step / others, se: (score.unit * noiseAfter(view, account, score.gain)) / others };
}

/** One shape number of a flight: the fitted one when the chosen account carries it, else one step away from that account. */
function shapeNumber(view: TrackView, flight: FlightView, name: ShapeName): Estimated | null {
  const { account, contest } = view;
  const { fault, fit } = account;
  const here = fault?.kind === 'shape' && fault.span === flight.span;
  if (here && (fault.name === name || (fault.name === 'power' && name.startsWith('power')))) {
    return { value: fit.theta[fit.path.shapeAt]!, se: errorOf(account, (theta) => theta[fit.path.shapeAt]!) };
  }
  const base = here ? contest.clean : account;
  const scores = scoresOf(view, base);
  if (!scores || base.fit.path.spans[flight.span]?.kind !== 'flight') return null;
  const score = scoreShape(scores, name, flight.span);
  if (!score) return null;
  return { value: SHAPE_NOTHING[name] + score.step, se: score.unit * noiseAfter(view, base, score.gain) };
}

/** The score tests of an account, worked out once a view. */
function scoresOf(view: TrackView, account: Account): ScoreBase | null {
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
function noiseAfter(view: TrackView, base: Account, gain: number): number {
  const body = view.account.noise2 - view.account.squares / view.account.freedom;
  return Math.sqrt(Math.max(0, base.squares - gain) / Math.max(1, base.freedom - 1) + Math.max(0, body));
}
