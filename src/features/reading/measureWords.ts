import type { Measure } from '../../../shared/reading/document.ts';
import type { MeasureName } from '../../../shared/reading/kinds.ts';
import { decimalsFor, shownNumber, shownPercent } from '../../lib/honestDigits.ts';

type Unit = 'share' | 'signed share' | 'exponent' | 'gravity' | 'ratio' | 'count';

/** What an animator calls each measure, and its unit. */
const MEASURES: Record<MeasureName, { words: string; unit: Unit }> = {
  'apex-time': { words: 'Apex in time', unit: 'share' },
  'quarter-drop-before': { words: 'Quarter in rise', unit: 'share' },
  'quarter-drop-after': { words: 'Quarter in fall', unit: 'share' },
  'exponent-rise': { words: 'Curve of rise', unit: 'exponent' },
  'exponent-fall': { words: 'Curve of fall', unit: 'exponent' },
  'across-drift': { words: 'Drift across', unit: 'signed share' },
  'across-spread': { words: 'Scatter across', unit: 'share' },
  'path-steps': { words: 'Steps on the arc', unit: 'share' },
  gravity: { words: 'Gravity', unit: 'gravity' },
  'gravity-ratio': { words: 'Gravity to others', unit: 'ratio' },
  'gravity-scale': { words: 'Gravity to scale', unit: 'ratio' },
  'rebound-height': { words: 'Rebound height', unit: 'ratio' },
  'rebound-period': { words: 'Rebound time', unit: 'ratio' },
  'off-arc': { words: 'Off the arc', unit: 'share' },
  repeats: { words: 'Repeats', unit: 'count' },
};

/** A number in the unit of a measure, with no more digits than `halfWidth` (half its interval) allows. */
export function shownIn(name: MeasureName, value: number, halfWidth: number): string {
  const { unit } = MEASURES[name];
  if (unit === 'share') return shownPercent(value);
  if (unit === 'signed share') return `${value > 0.005 ? '+' : ''}${shownPercent(value)}`;
  if (unit === 'gravity') return `${shownNumber(value, decimalsFor(halfWidth, 1))} px/f²`;
  if (unit === 'ratio') return `× ${shownNumber(value, decimalsFor(halfWidth, 2))}`;
  return shownNumber(value, unit === 'count' ? 0 : decimalsFor(halfWidth, 2));
}

/** The value of a measure as the margin shows it. */
export function shownValue(measure: Measure): string {
  return shownIn(measure.name, measure.value, (measure.high - measure.low) / 2);
}

export function measureWords(name: MeasureName): string {
  return MEASURES[name].words;
}

/** A measure with the words of its row. */
export interface GaugeRow {
  words: string;
  measure: Measure;
}

const PAIRS: { one: MeasureName; other: MeasureName; words: string }[] = [
  { one: 'quarter-drop-before', other: 'quarter-drop-after', words: 'Quarter drop' },
  { one: 'exponent-rise', other: 'exponent-fall', words: 'Curve' },
];

/** The rows of a flight's gauges: rise and fall share one row where they measure the same. */
export function gaugeRows(measures: readonly Measure[]): GaugeRow[] {
  return measures.flatMap((measure): GaugeRow[] => {
    const pair = PAIRS.find(({ one, other }) => measure.name === one || measure.name === other);
    if (!pair) return [{ words: measureWords(measure.name), measure }];
    const first = measures.find((candidate) => candidate.name === pair.one);
    const second = measures.find((candidate) => candidate.name === pair.other);
    const same = first && second && shownValue(first) === shownValue(second) && first.verdict === second.verdict;
    if (!same) return [{ words: measureWords(measure.name), measure }];
    return measure === first ? [{ words: pair.words, measure }] : [];
  });
}

/** A gauge drawn along an axis from 0 to 1. */
export interface Gauge {
  band: [number, number];
  interval: [number, number];
  marker: number;
  /** The value lies beyond the end of the axis. */
  beyond: boolean;
}

/** Only more than expected is off here: a rebound may always be lower. */
const NO_LOWER_EDGE: ReadonlySet<MeasureName> = new Set(['rebound-height', 'repeats', 'off-arc']);

/** The axis reaches this many tolerances to both sides of what is expected. */
const REACH = 4;

/** Where band, interval and marker of a measure stand on its gauge; null when nothing is expected of it. */
export function gaugeOf(measure: Measure): Gauge | null {
  const { expected, tolerance, value, low, high } = measure;
  if (expected === null || tolerance === null || !(tolerance > 0)) return null;
  const at = (number: number) => 0.5 + (number - expected) / (2 * REACH * tolerance);
  const hold = (share: number) => Math.min(1, Math.max(0, share));
  return {
    band: [NO_LOWER_EDGE.has(measure.name) ? 0 : at(expected - tolerance), at(expected + tolerance)],
    interval: [hold(at(low)), hold(at(high))],
    marker: hold(at(value)),
    beyond: at(value) < 0 || at(value) > 1,
  };
}
