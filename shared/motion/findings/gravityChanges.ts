import { errorOf } from '../errors.ts';
import { digits, percent } from '../words.ts';
import type { FindingRule } from './rule.ts';
import { severityOf } from './rule.ts';

/** One flight of a shot bends by another gravity than the others. */
export const gravityChanges: FindingRule = {
  kind: 'gravity-changes',
  find(view) {
    const { account } = view;
    const { fault, fit } = account;
    if (fault?.kind !== 'gravity' || view.light) return [];
    const flight = view.flights.find((one) => one.span === fault.span);
    if (!flight) return [];
    const own = fit.theta[1]!;
    const others = fit.theta[0]!;
    const ratio = own / others;
    const error = errorOf(account, (theta) => theta[1]! / theta[0]!);
    const size = Math.max(ratio, 1 / ratio) - 1;
    const severity = severityOf(size, error / Math.min(1, ratio * ratio), account.freedom, view.tolerances.gravity);
    if (!severity) return [];
    const strong = ratio > 1;
    return [
      {
        kind: 'gravity-changes' as const,
        flight,
        from: flight.start,
        to: flight.end,
        severity,
        title: strong ? 'Falls harder than the rest' : 'Floats more than the rest',
        detail:
          `This flight bends by ${digits(own)} px/f², the others by ${digits(others)}: ${percent(ratio - 1)} ${strong ? 'heavier' : 'lighter'} in one shot. ` +
          `Keep its contacts and ${strong ? 'lower' : 'raise'} the apex by ${digits(Math.abs(((own - others) * flight.length ** 2) / 8))} px, or give the flight ${strong ? 'more' : 'fewer'} frames.`,
      },
    ];
  },
};
