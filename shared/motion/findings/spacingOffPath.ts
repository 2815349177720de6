import { digits, percent } from '../words.ts';
import type { FindingRule } from './rule.ts';
import { severityOf, shapeOn } from './rule.ts';

/** The line through the drawings is a good parabola, but the steps along it are not those of a fall. */
export const spacingOffPath: FindingRule = {
  kind: 'spacing-off-path',
  find(view) {
    return view.flights.flatMap((flight) => {
      const shape = shapeOn(view.account, flight, ['even-path', 'even-steps']);
      if (!shape) return [];
      const severity = severityOf(shape.value, shape.error, view.account.freedom, view.tolerances.pathSteps);
      if (!severity) return [];
      const step = digits(flight.gravity * view.hold * view.hold);
      const even = shape.value > 0;
      return [
        {
          kind: 'spacing-off-path' as const,
          flight,
          from: flight.start,
          to: flight.end,
          severity,
          title: even ? 'Spacing is too even along the arc' : 'Spacing bunches at the top',
          detail:
            `The arc itself is right, but the steps along it ${even ? `are ${percent(Math.min(1, shape.value))} of the way to equal steps` : 'crowd towards the apex'}. ` +
            `Slide the drawings along the arc: the steps up and down should change by ${step} px every ${view.hold > 1 ? 'drawing' : 'frame'}, close at the apex and wide at the ends.`,
        },
      ];
    });
  },
};
