import { z } from 'zod';

/** The ten kinds of finding, as `reading-format` names them. Order is the order in which screens list them. */
export const FINDING_KINDS = [
  'apex-off-centre',
  'too-straight',
  'hang',
  'across-uneven',
  'spacing-off-path',
  'gravity-changes',
  'gravity-off-scale',
  'pop',
  'held-frame',
  'bounce-gains',
] as const;
export const findingKindSchema = z.enum(FINDING_KINDS);
export type FindingKind = z.infer<typeof findingKindSchema>;

/** How much a finding shows: `minor` is a note, `visible` is seen, `strong` is seen at once. */
export const severitySchema = z.enum(['minor', 'visible', 'strong']);
export type Severity = z.infer<typeof severitySchema>;

export const MEASURE_NAMES = [
  'apex-time',
  'quarter-drop-before',
  'quarter-drop-after',
  'exponent-rise',
  'exponent-fall',
  'across-drift',
  'across-spread',
  'path-steps',
  'gravity',
  'gravity-ratio',
  'gravity-scale',
  'rebound-height',
  'rebound-period',
  'off-arc',
  'repeats',
] as const;
export const measureNameSchema = z.enum(MEASURE_NAMES);
export type MeasureName = z.infer<typeof measureNameSchema>;
