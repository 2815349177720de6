import { frames } from '../words.ts';
import { shownAt } from '../view.ts';
import type { FindingRule } from './rule.ts';
import { severityOf, shapeOn } from './rule.ts';

/** The two sides of the arc do not match: between level heights the apex is not halfway in time. */
export const apexOffCentre: FindingRule = {
  kind: 'apex-off-centre',
  find(view) {
    return view.flights.flatMap((flight) => {
      const shape = shapeOn(view.account, flight, ['apex']);
      if (!shape) return [];
      const rise = (flight.apex + shape.value * flight.length) / flight.apex;
      const fall = (flight.length - flight.apex - shape.value * flight.length) / (flight.length - flight.apex);
      const share = rise / (rise + fall);
      const severity = severityOf(share - 0.5, shape.error, view.account.freedom, view.tolerances.apexTime);
      if (!severity) return [];
      const late = share > 0.5;
      const drawn = flight.start + flight.apex + shape.value * flight.length;
      const due = flight.start + flight.apex;
      const by = Math.abs(shape.value * flight.length);
      return [
        {
          kind: 'apex-off-centre' as const,
          flight,
          from: flight.start,
          to: flight.end,
          severity,
          title: late ? 'Apex sits late' : 'Apex sits early',
          detail:
            `The top comes ${frames(by)} too ${late ? 'late' : 'early'}: at ${Math.round(share * 100)} % of the time between level heights, where a throw has it at 50 %. ` +
            `Move the drawings so that the apex falls at frame ${shownAt(view, due)} instead of ${shownAt(view, drawn)}; ` +
            `the ${late ? 'rise needs wider and the fall closer' : 'rise needs closer and the fall wider'} spacing.`,
        },
      ];
    });
  },
};
