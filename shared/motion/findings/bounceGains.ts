import { percent } from '../words.ts';
import { shownAt } from '../view.ts';
import type { FindingRule } from './rule.ts';
import { severityOf } from './rule.ts';

/** A rebound rises higher than the bounce before allows. */
export const bounceGains: FindingRule = {
  kind: 'bounce-gains',
  find(view) {
    const { account, flights } = view;
    if (account.depth) return [];
    return flights.flatMap((flight, index) => {
      const before = flights[index - 1];
      if (!before || before.span !== flight.span - 1 || flight.apex <= 0 || flight.apex >= flight.length) return [];
      const fallen = before.gravity * (before.length - Math.max(0, before.apex)) ** 2;
      const risen = flight.gravity * flight.apex ** 2;
      const ratio = risen / fallen;
      if (!(ratio > 1)) return [];
      const error = ratioError(view.account, before, flight);
      const { from, visible, strong } = view.tolerances.bounceGain;
      const severity = severityOf(ratio - 1, error, account.freedom, {
        from: from - 1,
        visible: visible - 1,
        strong: strong - 1,
      });
      if (!severity) return [];
      return [
        {
          kind: 'bounce-gains' as const,
          flight,
          from: flight.start,
          to: flight.end,
          severity,
          title: 'Bounces higher than it fell',
          detail:
            `The rebound at frame ${shownAt(view, flight.start)} rises ${percent(ratio - 1)} higher than the fall before it. ` +
            `Lower the apex to below the one before, and give the flight fewer frames to match.`,
        },
      ];
    });
  },
};

function ratioError(
  account: { noise2: number },
  before: { length: number; gravity: number },
  after: { length: number; gravity: number },
): number {
  const noise = Math.sqrt(account.noise2);
  const one = noise / Math.max(1, (before.gravity * before.length ** 2) / 8);
  const two = noise / Math.max(1, (after.gravity * after.length ** 2) / 8);
  return 1.2 * Math.hypot(one, two);
}
