import type { Finding, Flight } from '../../../shared/reading/document.ts';
import { shownNumber, shownPercent } from '../../lib/honestDigits.ts';
import { trueApex } from './lines.ts';

/** "1 frame", "2.8 frames": a decimal only where it says something. */
const frameWord = (count: number) => {
  const size = Math.abs(count);
  const shown = shownNumber(size, Math.abs(size - Math.round(size)) < 0.05 ? 0 : 1);
  return `${shown} ${shown === '1' ? 'frame' : 'frames'}`;
};

/** Frames by which the apex as drawn comes after (positive) or before the apex of the true arc; null without either. */
export function apexShift(flight: Pick<Flight, 'apex' | 'trueArc'>): number | null {
  const should = trueApex(flight.trueArc);
  return flight.apex && should ? flight.apex.frame - should.frame : null;
}

/**
 * The measure beside a finding's badge, as few words as tell how much: "2.8 frames late". Null where the finding's title
 * says it all, or its flight carries no measure for it.
 */
export function calloutOf(finding: Finding, flight: Flight | undefined): string | null {
  const measure = flight?.measures.find((one) => one.kind === finding.kind && one.verdict === 'off');
  if (finding.kind === 'apex-off-centre') {
    const shift = flight ? apexShift(flight) : null;
    return shift === null ? null : `${frameWord(shift)} ${shift > 0 ? 'late' : 'early'}`;
  }
  if (finding.kind === 'pop') {
    const move = finding.mend.find((one) => one.frame >= finding.fromFrame && one.frame <= finding.toFrame);
    return move ? `${Math.round(Math.hypot(move.dx, move.dy))} px off the arc` : null;
  }
  if (!measure) return null;
  if (finding.kind === 'across-uneven' && measure.name === 'across-drift') {
    return `${shownPercent(Math.abs(measure.value))} ${measure.value < 0 ? 'slower' : 'faster'} across`;
  }
  if (finding.kind === 'bounce-gains') return `${shownNumber(measure.value, 2)} times as high`;
  return null;
}
