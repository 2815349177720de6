import type { FrameRate, Hold, Reading, Source } from '../reading/document.ts';
import type { Tolerances } from '../reading/tolerances.ts';

/** A picture as plain bytes: red, green, blue for each pixel, row by row from the top left. */
export interface Picture {
  width: number;
  height: number;
  data: Uint8Array;
}

/** A place on the picture of one frame, px; frames from 1. */
export interface PointAt {
  x: number;
  y: number;
  frame: number;
}

/** What an analysis needs to know of a take. Frames are files on disk, in order. */
export interface AnalysisRequest {
  id: string;
  framePaths: string[];
  /** Frame of the document each picture belongs to, from 1 and rising; left out: one after the other, none missing. */
  frameNumbers?: number[];
  kind: Extract<Source['kind'], 'frames' | 'strip' | 'animation' | 'video'>;
  /** What the production calls the first picture. */
  firstFrame: number;
  fps: FrameRate;
  /** Left out: found from the marks. */
  hold?: Hold;
  scale?: { pxPerMetre: number } | null;
  /** The production's gravity in m/s²; left out: standard gravity. */
  gravity?: number;
  tolerances?: Tolerances;
  /** `still` switches the search for a moving camera off. Left out: found. */
  camera?: 'still' | 'moving';
  /** Someone pointed at the thing: follow what is there and nothing else. */
  object?: PointAt;
}

export interface AnalysisProgress {
  done: number;
  total: number;
  phase: 'decoding' | 'finding' | 'reading';
}

export type ReportProgress = (progress: AnalysisProgress) => void;

export interface AnalysisResult {
  reading: Reading;
}
