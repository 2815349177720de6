import { digits, frames } from '../words.ts';
import { shownAt } from '../view.ts';
import type { FindingRule } from './rule.ts';
import { severityOf, shapeOn } from './rule.ts';

/** The thing stays near the top too long: the exponent lies above 2, or drawings are held at the apex. */
export const hang: FindingRule = {
  kind: 'hang',
  find(view) {
    return view.flights.flatMap((flight) => {
      const top = flight.start + flight.apex;
      const held = shapeOn(view.account, flight, ['hang', 'hang-up']);
      if (held) {
        const band = { from: 0.75, visible: 1.75, strong: 3 };
        const severity = severityOf(Math.max(0, held.value), held.error, view.account.freedom, band);
        if (!severity) return [];
        return [
          {
            kind: 'hang' as const,
            flight,
            from: Math.max(flight.start, top - held.value / 2 - 1),
            to: Math.min(flight.end, top + held.value / 2 + 1),
            severity,
            title: 'Hangs at the top',
            detail:
              `It stays at the apex for ${frames(held.value)} around frame ${shownAt(view, top)}; a throw only passes through. ` +
              `Take the hold out and let the spacing close and open by ${digits(flight.gravity * view.hold * view.hold)} px every ${view.hold > 1 ? 'drawing' : 'frame'}.`,
          },
        ];
      }
      const shape = shapeOn(view.account, flight, ['power']);
      if (!shape || shape.value <= 2) return [];
      const severity = severityOf(shape.value - 2, shape.error, view.account.freedom, view.tolerances.exponent);
      if (!severity) return [];
      return [
        {
          kind: 'hang' as const,
          flight,
          from: flight.start,
          to: flight.end,
          severity,
          title: 'Hangs near the top',
          detail:
            `Too many drawings crowd the apex (spacing bends with power ${digits(shape.value)}, a throw with 2). ` +
            `Open the spacing near frame ${shownAt(view, top)} and close it towards the ends.`,
        },
      ];
    });
  },
};
