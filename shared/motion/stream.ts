import type { Finding, Flight } from '../reading/document.ts';
import type { Tolerances } from '../reading/tolerances.ts';
import { compete } from './compete.ts';
import type { Account } from './account.ts';
import { covariance } from './fit.ts';
import { errorOf } from './errors.ts';
import { severityOf } from './findings/rule.ts';
import { measureOf } from './measures.ts';
import type { Drawing } from './drawings.ts';
import { prepare } from './prepare.ts';
import { SHAPE_NOTHING } from './shapes.ts';
import { oneFlight } from './sketchEdits.ts';
import { follow } from './follow.ts';
import type { Track } from './types.ts';
import { digits } from './words.ts';

/** The reading of one drawn stream: one flight a picture, told by its shape alone. */
export interface StreamReading {
  flights: Flight[];
  findings: Finding[];
}

const LEAST_POINTS = 5;

/**
 * Water or sparks drawn as one whole arc in a picture: the drops across it share one speed, so their places across stand for
 * time, and the arc must be a parabola. No claim on timing follows, hence no take-off, landing or gravity.
 */
export function readStream(track: Track, tolerances: Tolerances): StreamReading {
  const out: StreamReading = { flights: [], findings: [] };
  for (const { frame, points } of track.arcs ?? []) {
    const sorted = [...points].filter((p) => Number.isFinite(p.x) && Number.isFinite(p.y)).sort((a, b) => a.x - b.x);
    const first = sorted[0];
    const last = sorted[sorted.length - 1];
    if (sorted.length < LEAST_POINTS || !first || !last || last.x - first.x < 1) continue;
    const step = (last.x - first.x) / (sorted.length - 1);
    const drawings = sorted.map((point): Drawing => {
      const t = (point.x - first.x) / step;
      return { t, x: point.x - first.x, y: point.y - first.y, weight: 1, last: t, marks: [] };
    });
    const { field } = prepare({ drawings, origin: 0, centre: { x: 0, y: 0 } }, undefined);
    const sketch = oneFlight(field, 0, 0);
    if (!sketch) continue;
    const account = bestShape(compete(sketch, field.samples.weight, field).accounts);
    account.covariance = covariance(account.fit, { ...field.samples, weight: account.weight });
    tell(out, track, frame, account, first, step, tolerances);
  }
  return out;
}

/** The account that costs least among those that speak of shape. */
function bestShape(accounts: readonly Account[]): Account {
  const shapes = accounts.filter(
    (one) => !one.depth && (!one.fault || (one.fault.kind === 'shape' && ['power', 'apex'].includes(one.fault.name))),
  );
  return { ...(shapes[0] ?? accounts[0]!) };
}

function tell(
  out: StreamReading,
  track: Track,
  frame: number,
  account: Account,
  first: { x: number; y: number },
  step: number,
  tolerances: Tolerances,
): void {
  const { fit, fault } = account;
  const length = fit.knots.t[1]! - fit.knots.t[0]!;
  const g = fit.theta[0]!;
  const at = length / 2 - (fit.knots.y[1]! - fit.knots.y[0]!) / (length * g);
  const times = Float64Array.from({ length: 25 }, (_, i) => fit.knots.t[0]! + (length * i) / 24);
  const xs = new Float64Array(25);
  const ys = new Float64Array(25);
  follow({ ...fit.path, shape: null }, fit.theta, fit.knots, times, xs, ys);
  const id = `${track.id}${out.flights.length + 1}`;
  const power = fault?.kind === 'shape' && fault.name === 'power';
  const value = power ? fit.theta[fit.path.shapeAt]! : SHAPE_NOTHING.power;
  const se = power ? errorOf(account, (theta) => theta[fit.path.shapeAt]!) : 0;
  const inside = at > 0 && at < length;
  out.flights.push({
    id,
    takeOff: null,
    landing: null,
    judged: true,
    apex: inside
      ? {
          frame,
          x: first.x + at * step,
          y: first.y + Math.min(...ys),
          seFrame: 0,
          seY: Math.sqrt(account.noise2),
        }
      : null,
    across: { value: 0, se: 0 },
    gravity: { value: 0, se: 0, metric: null },
    residual: Math.sqrt(account.noise2),
    model: 'flat',
    measures: ['exponent-rise' as const, 'exponent-fall' as const].map((name) =>
      measureOf(name, { value, se }, account.freedom, {
        expected: 2,
        tolerance: tolerances.exponent.from,
        kind: value < 2 ? 'too-straight' : 'hang',
      }),
    ),
    trueArc: Array.from(xs, (x, i) => ({ frame, x: first.x + x, y: first.y + ys[i]! })),
  });
  const severity = power ? severityOf(value - 2, se, account.freedom, tolerances.exponent) : null;
  if (!severity) return;
  const straight = value < 2;
  out.findings.push({
    id: `${id}-${straight ? 'too-straight' : 'hang'}-${frame}`,
    kind: straight ? 'too-straight' : 'hang',
    object: track.id,
    flight: id,
    fromFrame: frame,
    toFrame: frame,
    severity,
    title: straight ? 'The stream is too straight' : 'The stream is too flat on top',
    detail: `Its arc bends with power ${digits(value)}, a stream of water with 2. ${straight ? 'Round the top and let the ends fall away' : 'Draw the top narrower'}.`,
    mend: [],
    chart: [],
  });
}
