import { type Finding, type Flight, shownFrame } from '../../../shared/reading/document.ts';
import { decimalsFor, shownNumber } from '../../lib/honestDigits.ts';
import { measureWords } from './measureWords.ts';

/**
 * "frames 1003 – 1023", in the production's numbers. An end that lies outside the strip is marked by dots at the last drawing
 * that is there.
 */
export function flightSpan(flight: Pick<Flight, 'takeOff' | 'landing' | 'trueArc'>, firstFrame: number): string {
  const shown = (frame: number | undefined) =>
    frame === undefined ? '' : String(shownFrame(Math.round(frame), firstFrame));
  const from = flight.takeOff === null ? `…${shown(flight.trueArc[0]?.frame)}` : shown(flight.takeOff);
  const to = flight.landing === null ? `${shown(flight.trueArc.at(-1)?.frame)}…` : shown(flight.landing);
  return `frames ${from} – ${to}`;
}

/** A side of a flight shorter than this many frames is none. */
const SIDE = 0.5;

function riseAndFall(flight: Flight): string | null {
  if (!flight.apex || flight.takeOff === null || flight.landing === null) return null;
  const decimals = Math.max(1, decimalsFor(2 * flight.apex.seFrame, 1));
  const up = flight.apex.frame - flight.takeOff;
  const down = flight.landing - flight.apex.frame;
  if (up < SIDE && down < SIDE) return null;
  if (up < SIDE) return `It only falls, for ${shownNumber(down, decimals)} frames.`;
  if (down < SIDE) return `It only rises, for ${shownNumber(up, decimals)} frames.`;
  return `Up takes ${shownNumber(up, decimals)} frames, down takes ${shownNumber(down, decimals)}.`;
}

const lower = (title: string) => title.charAt(0).toLowerCase() + title.slice(1);

/** A gauge may lie outside its tolerance without a finding of its own; the sentence then does not say that all is true. */
function trueOrNearly(flight: Flight): string {
  const [first, ...rest] = flight.measures.filter((measure) => measure.verdict === 'off');
  if (!first) return 'Reads true.';
  const which = rest.length > 0 ? `${rest.length + 1} measures lie` : `${measureWords(first.name)} lies`;
  return `Nothing to mend, though ${lower(which)} outside the tolerance.`;
}

/** What a flight's card says before its gauges: whether it reads true, and how it goes up and down. */
export function flightSentence(flight: Flight, findings: readonly Pick<Finding, 'title'>[]): string {
  if (!flight.judged) return 'Measured, not judged: someone said it does not fly free.';
  const parts = riseAndFall(flight);
  if (findings.length === 0) return [trueOrNearly(flight), parts].filter(Boolean).join(' ');
  const [first, ...rest] = findings.map((finding) => finding.title);
  const off = rest.length === 0 ? `${first}.` : `${[first, ...rest.map(lower)].join(', ')}.`;
  return [off, parts].filter(Boolean).join(' ');
}
