import type { Finding, Measure } from '../reading/document.ts';
import type { FindingKind, MeasureName } from '../reading/kinds.ts';

/** Faults of a whole flight's shape: a measure of that flight that is off beside one of them is off because of it. */
const OF_THE_SHAPE: readonly FindingKind[] = [
  'apex-off-centre',
  'too-straight',
  'hang',
  'across-uneven',
  'spacing-off-path',
];

/** Measures of single drawings: any finding of the flight may carry them. */
const OF_A_DRAWING: readonly MeasureName[] = ['off-arc', 'repeats'];

/**
 * Makes the measures of a flight agree with its findings. A measure alone calls a number off by one step away from the account
 * that was chosen; where the contest of whole accounts found no fault there, it cannot be told, and the interval is widened to
 * hold the expected value, which the chosen account has.
 */
export function agreed(measures: readonly Measure[], findings: readonly Pick<Finding, 'kind'>[]): Measure[] {
  return measures.map((measure) => {
    if (measure.verdict !== 'off' || measure.expected === null || isCarried(measure, findings)) return measure;
    return {
      ...measure,
      low: Math.min(measure.low, measure.expected),
      high: Math.max(measure.high, measure.expected),
      verdict: 'cannot-tell',
      kind: null,
    };
  });
}

function isCarried(measure: Measure, findings: readonly Pick<Finding, 'kind'>[]): boolean {
  return findings.some(
    ({ kind }) => kind === measure.kind || OF_THE_SHAPE.includes(kind) || OF_A_DRAWING.includes(measure.name),
  );
}
