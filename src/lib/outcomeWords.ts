import type { Outcome } from '../../shared/reading/document.ts';

/** What a card says of a reading that judged nothing, and of one that did. */
export const OUTCOME_WORDS: Record<Outcome, string> = {
  read: 'Reads true',
  'too-few-marks': 'Too few drawings to read',
  'no-motion': 'Nothing moves here',
  'not-in-flight': 'Nothing flies free here',
  'not-judged': 'Measured, not judged',
};
