import type { Reading } from '../../../shared/reading/document.ts';
import type { Drawing } from '../../lib/drawings.ts';
import type { NumberedFinding } from '../../lib/numberedFindings.ts';
import type { Playhead } from '../../lib/playhead.ts';
import type { Box } from './labels.ts';

/** One thing on the picture, ready to draw. */
export interface DrawnObject {
  id: string;
  drawings: Drawing[];
  flights: Reading['objects'][number]['flights'];
}

/** What every layer is given. Lengths are picture px; `unit` is how many of them one px of the screen is. */
export interface LayerProps {
  objects: readonly DrawnObject[];
  findings: readonly NumberedFinding[];
  firstFrame: number;
  playhead: Playhead;
  unit: number;
  /** What of the picture's plane is seen. */
  bounds: Box;
}
