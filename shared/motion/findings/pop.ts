import { digits, percent } from '../words.ts';
import { shownAt } from '../view.ts';
import { isRepeat, localStep, standsAlone } from '../scatter.ts';
import { scatterAcross } from '../stepScatter.ts';
import type { Draft, FindingRule } from './rule.ts';
import { severityOf } from './rule.ts';

/** One drawing sits off the arc the others agree on. */
export const pop: FindingRule = {
  kind: 'pop',
  find(view) {
    const { account, field, tolerances } = view;
    const { xs, ys } = account.fit;
    const { samples } = field;
    const out: Draft[] = [];
    for (const i of account.left) {
      if (isRepeat(view, i) || !standsAlone(view, i)) continue;
      const t = samples.t[i]!;
      const flight = view.flights.find((one) => one.start <= t && t <= one.end);
      if (!flight) continue;
      const dx = xs[i]! - samples.x[i]!;
      const dy = ys[i]! - samples.y[i]!;
      const off = Math.hypot(dx, dy);
      const step = localStep(view, i);
      const noise = Math.sqrt(account.noise2);
      const bent =
        (account.fault?.kind === 'shape' && account.fault.span === flight.span) || scatterAcross(view, flight) !== null;
      const least = Math.max(1, (bent ? 9 : 4) * noise, (bent ? tolerances.pop.visible : tolerances.pop.from) * step);
      if (off < least) continue;
      const severity = severityOf(off / Math.max(step, 1), 0, account.freedom, tolerances.pop) ?? 'minor';
      out.push({
        kind: 'pop',
        flight,
        from: t,
        to: t,
        severity,
        title: 'One drawing pops',
        detail:
          `Frame ${shownAt(view, t)} sits ${digits(off)} px off the arc its neighbours agree on (${percent(off / Math.max(step, 1))} of a step). ` +
          `Move it ${direction(dx, dy)}.`,
        move: [{ drawing: i, dx, dy }],
      });
    }
    return out;
  },
};

function direction(dx: number, dy: number): string {
  const parts: string[] = [];
  if (Math.abs(dx) >= 0.5) parts.push(`${digits(Math.abs(dx))} px ${dx > 0 ? 'right' : 'left'}`);
  if (Math.abs(dy) >= 0.5) parts.push(`${digits(Math.abs(dy))} px ${dy > 0 ? 'down' : 'up'}`);
  return parts.join(' and ') || 'by less than a pixel';
}
