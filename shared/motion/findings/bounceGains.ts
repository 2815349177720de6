import { boundsOf, reboundOf } from '../bounces.ts';
import { shownAt } from '../view.ts';
import { percent } from '../words.ts';
import type { FindingRule } from './rule.ts';
import { severityOf } from './rule.ts';

/** A rebound rises higher than the fall before it allows; twice running is strong however little it gains. */
export const bounceGains: FindingRule = {
  kind: 'bounce-gains',
  find(view) {
    const { bounceGain } = view.tolerances;
    const band = {
      from: boundsOf(bounceGain).tolerance,
      visible: bounceGain.visible - 1,
      strong: bounceGain.strong - 1,
    };
    let running = 0;
    return view.flights.flatMap((flight) => {
      const height = reboundOf(view, flight)?.height;
      const severity =
        height && height.value > 1 ? severityOf(height.value - 1, height.se, view.account.freedom, band) : null;
      running = severity ? running + 1 : 0;
      if (!height || !severity) return [];
      return [
        {
          kind: 'bounce-gains' as const,
          flight,
          from: flight.start,
          to: flight.end,
          severity: running > 1 ? 'strong' : severity,
          title: 'Bounces higher than it fell',
          detail:
            `The rebound at frame ${shownAt(view, flight.start)} rises ${percent(height.value - 1)} higher than the fall before it, as if something pushed. ` +
            `Lower the apex to no more than the one before, and let the flight end sooner to match.`,
        },
      ];
    });
  },
};
