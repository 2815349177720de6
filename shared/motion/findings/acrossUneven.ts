import { digits, percent } from '../words.ts';
import type { FlightView, TrackView } from '../view.ts';
import { scatterAcross } from '../stepScatter.ts';
import type { Draft, FindingRule } from './rule.ts';
import { severityOf, shapeOn } from './rule.ts';

/**
 * Horizontal spacing is not uniform: it drifts (the thing slows in or out to a side, where nothing in the air pushes it), or its
 * steps scatter.
 */
export const acrossUneven: FindingRule = {
  kind: 'across-uneven',
  find(view) {
    return view.flights.flatMap((flight) => {
      const shape = shapeOn(view.account, flight, ['ease']);
      if (!shape) return scattered(view, flight);
      const drift = 2 * shape.value;
      const severity = severityOf(drift, 2 * shape.error, view.account.freedom, view.tolerances.acrossDrift);
      if (!severity || explainedByTilt(view, flight, shape.value)) return [];
      if (view.field.airy && drift < 0) return [];
      const { knots } = view.account.fit;
      const across = Math.abs(knots.x[flight.span + 1]! - knots.x[flight.span]!) / flight.length;
      return [
        {
          kind: 'across-uneven' as const,
          flight,
          from: flight.start,
          to: flight.end,
          severity,
          title: drift > 0 ? 'Speeds up across' : 'Slows down across',
          detail:
            `The spacing across ${drift > 0 ? 'grows' : 'shrinks'} by ${percent(drift)} of its mean over the flight; in the air nothing pushes it sideways. ` +
            `Space the drawings evenly across: ${digits(across * view.hold)} px every ${view.hold > 1 ? 'drawing' : 'frame'}.`,
        },
      ];
    });
  },
};

/** The steps across scatter: every drawing moves sideways to its place on the arc, its height stays. */
function scattered(view: TrackView, flight: FlightView): Draft[] {
  const { account, field, tolerances } = view;
  const scatter = scatterAcross(view, flight);
  const severity = scatter && severityOf(scatter.value, scatter.se, account.freedom, tolerances.acrossSpread);
  if (!severity) return [];
  const { samples } = field;
  const { knots, xs, ys } = account.fit;
  const across = Math.abs(knots.x[flight.span + 1]! - knots.x[flight.span]!) / flight.length;
  const move = field.drawings.flatMap((_, drawing) => {
    const t = samples.t[drawing]!;
    if (t < flight.start || t > flight.end) return [];
    const stray = account.left.includes(drawing);
    return [{ drawing, dx: xs[drawing]! - samples.x[drawing]!, dy: stray ? ys[drawing]! - samples.y[drawing]! : 0 }];
  });
  return [
    {
      kind: 'across-uneven',
      flight,
      from: flight.start,
      to: flight.end,
      severity,
      title: 'Steps across scatter',
      detail:
        `The steps across are wider and closer by turns, by ${percent(scatter.value)} of their mean; in the air they are all alike. ` +
        `Slide the drawings sideways to ${digits(across * view.hold)} px every ${view.hold > 1 ? 'drawing' : 'frame'}; their heights stay.`,
      move,
    },
  ];
}

/** Sideways pull as a share of gravity that a camera tilted by half a degree shows as well. */
const TILT = 0.01;

/** Whether the drift is so small against the fall that a camera hardly out of level draws the same. */
function explainedByTilt(view: TrackView, flight: FlightView, ease: number): boolean {
  const { knots } = view.account.fit;
  const across = Math.abs(knots.x[flight.span + 1]! - knots.x[flight.span]!);
  return (2 * Math.abs(ease) * across) / flight.length ** 2 < TILT * Math.abs(flight.gravity);
}
