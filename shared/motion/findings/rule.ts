import type { FindingKind, Severity } from '../../reading/kinds.ts';
import type { Band } from '../../reading/tolerances.ts';
import type { Account } from '../account.ts';
import { errorOf } from '../errors.ts';
import { Z95_ONE, studentQuantile } from '../statistics.ts';
import type { FlightView, TrackView } from '../view.ts';

/** What a rule says about a track, before it is numbered and its mend is drawn. */
export interface Draft {
  kind: FindingKind;
  flight: FlightView;
  /** Local times of the first and last drawing it lies on. */
  from: number;
  to: number;
  severity: Severity;
  title: string;
  detail: string;
  /** Drawings (by index) that move; left out: those of the whole flight, to where the path without the fault has them. */
  move?: { drawing: number; dx: number; dy: number }[];
}

/** A kind of finding: looks at a track and says what it finds. Adding a kind is one such file and one line in `table.ts`. */
export interface FindingRule {
  kind: FindingKind;
  find(view: TrackView): Draft[];
}

/** Severity of a size, or null below the band: the size must lie past `from` by its error (an interval, not a test for zero). */
export function severityOf(size: number, error: number, freedom: number, band: Band): Severity | null {
  if (!(Math.abs(size) - studentQuantile(Z95_ONE, freedom) * error > band.from)) return null;
  const value = Math.abs(size);
  if (value >= band.strong) return 'strong';
  return value >= band.visible ? 'visible' : 'minor';
}

/** The shape fault that the chosen account carries on a flight, if its name is one of `names`. */
export function shapeOn(
  account: Account,
  flight: FlightView,
  names: readonly string[],
): { value: number; error: number } | null {
  const { fault, fit } = account;
  if (fault?.kind !== 'shape' || fault.span !== flight.span || !names.includes(fault.name)) return null;
  const at = fit.path.shapeAt;
  return { value: fit.theta[at]!, error: errorOf(account, (theta) => theta[at]!) };
}
