import { isRepeat } from '../scatter.ts';
import { shownAt } from '../view.ts';
import type { Draft, FindingRule } from './rule.ts';

/** A drawing is repeated where the pattern around it moves on. */
export const heldFrame: FindingRule = {
  kind: 'held-frame',
  find(view) {
    const { account, field } = view;
    const { fault } = account;
    const out: Draft[] = [];
    const tell = (drawing: number, late: boolean) => {
      const t = field.samples.t[drawing]!;
      const flight = view.flights.find((one) => one.start - 1 <= t && t <= one.end + 1) ?? view.flights[0];
      if (!flight) return;
      const dx = account.fit.xs[drawing]! - field.samples.x[drawing]!;
      const dy = account.fit.ys[drawing]! - field.samples.y[drawing]!;
      out.push({
        kind: 'held-frame',
        flight,
        from: t,
        to: t,
        severity: 'visible',
        title: 'A drawing is held',
        detail: late
          ? `Frame ${shownAt(view, t)} repeats the drawing before it, and everything after comes ${view.hold > 1 ? 'a drawing' : 'a frame'} late. Take the repeat out, so that the drawings after it move up.`
          : `Frame ${shownAt(view, t)} repeats the drawing before it while the thing is moving. Put the missing in-between there.`,
        ...(late ? {} : { move: [{ drawing, dx, dy }] }),
      });
    };
    if (fault?.kind === 'held') tell(fault.drawing, true);
    for (const i of account.left) if (isRepeat(view, i)) tell(i, false);
    return out;
  },
};
