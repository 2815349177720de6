import type { Measure } from '../reading/document.ts';
import type { FindingKind, MeasureName } from '../reading/kinds.ts';
import type { Account } from './account.ts';
import { pathOf, sketchFrom } from './sketch.ts';
import { fitStep } from './fit.ts';
import type { ShapeName } from './shapes.ts';
import { Z95, Z99_ONE, studentQuantile } from './statistics.ts';
import type { FlightView, TrackView } from './view.ts';

/** Value and standard deviation of one number. */
export interface Estimated {
  value: number;
  se: number;
}

/** A measure with its 95 % interval and its verdict against a tolerance around what is expected (interval test, methods 5). */
export function measureOf(
  name: MeasureName,
  estimate: Estimated,
  freedom: number,
  against: { expected: number; tolerance: number; kind: FindingKind; off?: boolean } | null,
): Measure {
  const half = studentQuantile(Z95, freedom) * estimate.se;
  const strict = studentQuantile(Z99_ONE, freedom) * estimate.se;
  let verdict: Measure['verdict'] = 'cannot-tell';
  if (against) {
    const distance = Math.abs(estimate.value - against.expected);
    if (distance - strict > against.tolerance) verdict = 'off';
    else if (distance + half < against.tolerance) verdict = 'true';
  } else verdict = 'true';
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

/** One shape number of a flight: the fitted one when the chosen account carries it, else one step away from that account. */
function shapeNumber(view: TrackView, flight: FlightView, name: ShapeName): Estimated | null {
  const { account, field } = view;
  const { fault, fit } = account;
  if (fault?.kind === 'shape' && fault.span === flight.span && fault.name === name && account.covariance) {
    const at = fit.path.shapeAt;
    return {
      value: fit.theta[at]!,
      se: Math.sqrt(Math.max(0, account.noise2 * account.covariance[at * fit.path.size + at]!)),
    };
  }
  const base: Account = fault?.kind === 'shape' && fault.span === flight.span ? view.contest.clean : account;
  const { path, theta, knots } = base.fit;
  const depth: [number, number] = base.depth ? [theta[path.depthAt]!, theta[path.depthAt + 1]!] : [0, 0];
  const start = pathOf(sketchFrom(path, theta, knots), { kind: 'shape', name, span: flight.span }, base.depth, field, {
    depth,
  });
  const step = fitStep(start.path, start.theta, { ...field.samples, weight: base.weight }, start.path.shapeAt);
  return step ? { value: step.value, se: step.unit * Math.sqrt(base.noise2) } : null;
}

/** The measures of one flight, by name. Those that its marks cannot decide are left out. */
export function measuresOf(view: TrackView, flight: FlightView): Measure[] {
  const { account, tolerances } = view;
  const { freedom } = account;
  const out: Measure[] = [];
  const inside = flight.apex > 1 && flight.apex < flight.length - 1;
  if (inside) {
    const apex = shapeNumber(view, flight, 'apex');
    if (apex) {
      const share = 0.5 + apex.value;
      out.push(
        measureOf('apex-time', { value: share, se: apex.se }, freedom, {
          expected: 0.5,
          tolerance: tolerances.apexTime.from,
          kind: 'apex-off-centre',
        }),
      );
    }
    const power = shapeNumber(view, flight, 'power');
    if (power) {
      const against = {
        expected: 2,
        tolerance: tolerances.exponent.from,
        kind: power.value < 2 ? ('too-straight' as const) : ('hang' as const),
      };
      out.push(
        measureOf('exponent-rise', power, freedom, against),
        measureOf('exponent-fall', power, freedom, against),
      );
      const share = 0.5 ** power.value;
      const se = share * Math.LN2 * power.se;
      for (const name of ['quarter-drop-before', 'quarter-drop-after'] as const) {
        out.push(
          measureOf(name, { value: share, se }, freedom, {
            expected: 0.25,
            tolerance: 0.25 * Math.LN2 * tolerances.exponent.from,
            kind: against.kind,
          }),
        );
      }
    }
  }
  const ease = shapeNumber(view, flight, 'ease');
  if (ease) {
    out.push(
      measureOf('across-drift', { value: 2 * ease.value, se: 2 * ease.se }, freedom, {
        expected: 0,
        tolerance: tolerances.acrossDrift.from,
        kind: 'across-uneven',
      }),
    );
  }
  const c = account.covariance;
  const g = account.fit.path.spans[flight.span]!.gravity;
  if (c) {
    out.push(
      measureOf(
        'gravity',
        { value: flight.gravity, se: Math.sqrt(Math.max(0, account.noise2 * c[g * account.fit.path.size + g]!)) },
        freedom,
        null,
      ),
    );
  }
  return out.filter((measure) => [measure.value, measure.low, measure.high].every(Number.isFinite));
}
