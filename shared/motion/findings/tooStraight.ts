import { digits } from '../words.ts';
import type { FindingRule } from './rule.ts';
import { severityOf, shapeOn } from './rule.ts';

/** Vertical spacing changes too little: the exponent of rise and fall lies below 2, up to straight lines with a corner. */
export const tooStraight: FindingRule = {
  kind: 'too-straight',
  find(view) {
    return view.flights.flatMap((flight) => {
      const shape = shapeOn(view.account, flight, ['power']);
      if (!shape || shape.value >= 2) return [];
      const severity = severityOf(2 - shape.value, shape.error, view.account.freedom, view.tolerances.exponent);
      if (!severity) return [];
      const step = Math.abs(flight.gravity) * view.hold * view.hold;
      return [
        {
          kind: 'too-straight' as const,
          flight,
          from: flight.start,
          to: flight.end,
          severity,
          title: shape.value < 1.25 ? 'Straight up, straight down' : 'Rise and fall are too even',
          detail:
            `The spacing up and down hardly changes towards the apex (it bends with power ${digits(shape.value)}, a throw with 2). ` +
            `Spacing should change by ${digits(step)} px every ${view.hold > 1 ? 'drawing' : 'frame'}: open it near the ends, close it towards the top.`,
        },
      ];
    });
  },
};
