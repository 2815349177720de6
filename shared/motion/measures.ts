import type { Measure } from '../reading/document.ts';
import type { FindingKind, MeasureName } from '../reading/kinds.ts';
import { boundsOf, reboundOf } from './bounces.ts';
import { errorOf } from './errors.ts';
import { metresPerSecond2 } from './units.ts';
import { offArc, repeatsOf } from './scatter.ts';
import { stepScatter } from './stepScatter.ts';
import { scoreGravity } from './score.ts';
import type { Estimated } from './shapeNumber.ts';
import { acrossDrift, noiseAfter, scoresOf, shapeNumber } from './shapeNumber.ts';
import { Z95, Z99_ONE, studentQuantile } from './statistics.ts';
import type { FlightView, TrackView } from './view.ts';

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

/** Measures that are lengths over lengths: their intervals end at nothing. */
const NEVER_BELOW_NOTHING: readonly MeasureName[] = ['across-spread', 'off-arc'];

/** The measures of one flight, by name. Those that its marks cannot decide at all are left out. */
export function measuresOf(view: TrackView, flight: FlightView): Measure[] {
  const { account, tolerances } = view;
  const { freedom } = account;
  const out: Measure[] = [];
  const add = (name: MeasureName, estimate: Estimated | null, against: Against | null) => {
    if (!estimate || ![estimate.value, estimate.se].every(Number.isFinite)) return;
    const measure = measureOf(name, estimate, freedom, against);
    out.push(NEVER_BELOW_NOTHING.includes(name) ? { ...measure, low: Math.max(0, measure.low) } : measure);
  };
  if (flight.apex > 1 && flight.apex < flight.length - 1) out.push(...shapesOfArc(view, flight));
  add('across-drift', acrossDrift(view, flight), {
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

/** What the two sides of an arc tell: those of a side with too few drawings are left out. */
function shapesOfArc(view: TrackView, flight: FlightView): Measure[] {
  const { account, tolerances } = view;
  const out: Measure[] = [];
  const apex = shapeNumber(view, flight, 'apex');
  if (apex) {
    const time = { value: 0.5 + apex.value, se: apex.se };
    const against = { expected: 0.5, tolerance: tolerances.apexTime.from, kind: 'apex-off-centre' as const };
    out.push(measureOf('apex-time', time, account.freedom, against));
  }
  for (const side of ['rise', 'fall'] as const) {
    const power = shapeNumber(view, flight, `power-${side}`);
    if (!power || !Number.isFinite(power.se)) continue;
    const kind = power.value < 2 ? ('too-straight' as const) : ('hang' as const);
    const tolerance = tolerances.exponent.from;
    const exponent = measureOf(`exponent-${side}`, power, account.freedom, { expected: 2, tolerance, kind });
    out.push(exponent, {
      ...exponent,
      name: side === 'rise' ? 'quarter-drop-before' : 'quarter-drop-after',
      // The drop at half the time is 0.5 to the exponent: the interval goes over with it, turned round, and so does the verdict.
      value: 0.5 ** exponent.value,
      low: 0.5 ** exponent.high,
      high: 0.5 ** exponent.low,
      expected: 0.25,
      tolerance: 0.25 * Math.LN2 * tolerance,
    });
  }
  return out;
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
