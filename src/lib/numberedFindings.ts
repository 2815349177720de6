import type { Finding, Reading } from '../../shared/reading/document.ts';

/** A finding under the number that its badge carries in the picture, the score and the margin alike. */
export interface NumberedFinding extends Finding {
  number: number;
}

/** Numbers the findings of a reading from 1, in the order in which the reading lists them. */
export function numberedFindings(reading: Pick<Reading, 'findings'>): NumberedFinding[] {
  return reading.findings.map((finding, index) => ({ ...finding, number: index + 1 }));
}
