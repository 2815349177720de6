import { shownAt } from '../view.ts';
import type { FindingRule } from './rule.ts';

/** A drawing is repeated where the pattern around it moves on. */
export const heldFrame: FindingRule = {
  kind: 'held-frame',
  find(view) {
    const { fault } = view.account;
    if (fault?.kind !== 'held') return [];
    const t = view.field.samples.t[fault.drawing]!;
    const flight = view.flights.find((one) => one.start - 1 <= t && t <= one.end + 1) ?? view.flights[0];
    if (!flight) return [];
    const inserted = fault.mode === 'inserted';
    return [
      {
        kind: 'held-frame' as const,
        flight,
        from: t,
        to: t,
        severity: 'visible' as const,
        title: 'A drawing is held',
        detail:
          `Frame ${shownAt(view, t)} repeats the drawing before it while the thing is moving` +
          (inserted
            ? `, and everything after comes ${view.hold > 1 ? 'one drawing' : 'one frame'} late. Take the repeat out, so that the drawings after it move up.`
            : `. Put an in-between there.`),
      },
    ];
  },
};
