import { errorOf } from '../errors.ts';
import { metresPerSecond2 } from '../units.ts';
import { percent } from '../words.ts';
import type { FindingRule } from './rule.ts';
import { severityOf } from './rule.ts';

/** A scale was given, and the gravity read is not the production's. */
export const gravityOffScale: FindingRule = {
  kind: 'gravity-off-scale',
  find(view) {
    const flight = view.flights[0];
    const { account } = view;
    if (!view.scale || view.light || account.depth || !flight) return [];
    const unit = metresPerSecond2(1, view) / view.expectedGravity;
    const ratio = account.fit.theta[0]! * unit;
    const error = errorOf(account, (theta) => theta[0]!) * unit;
    const size = Math.max(ratio, 1 / ratio) - 1;
    const severity = severityOf(size, error / Math.min(1, ratio * ratio), account.freedom, view.tolerances.gravity);
    if (!severity) return [];
    const read = ratio * view.expectedGravity;
    return [
      {
        kind: 'gravity-off-scale' as const,
        flight,
        from: flight.start,
        to: flight.end,
        severity,
        title: ratio < 1 ? 'Floats for its size' : 'Falls too hard for its size',
        detail:
          `At this scale it falls with ${read.toFixed(1)} m/s², where the production asks for ${view.expectedGravity.toFixed(1)}: ${percent(ratio - 1)} ${ratio < 1 ? 'too little' : 'too much'}. ` +
          `Keep the arc and give the flight ${percent(Math.sqrt(ratio) - 1)} ${ratio < 1 ? 'fewer' : 'more'} frames, or check the scale.`,
        move: [],
      },
    ];
  },
};
