import type { Hold, FrameRate, Mark, Reading, Source } from '../reading/document.ts';
import type { Tolerances } from '../reading/tolerances.ts';

/** One thing's marks over frames, as the finder, a hand or a file gives them. Camera moves are already taken out. */
export interface Track {
  /** A, B, C: as the finding names things. */
  id: string;
  marks: Mark[];
}

/** Everything `readMotion` needs to know of a take: no pictures, only where things were. */
export interface MotionInput {
  id?: string;
  kind: Source['kind'];
  /** Number of pictures, also those without a mark. */
  frames: number;
  /** Picture size in px; 0 when unknown (marks from a file). */
  width: number;
  height: number;
  firstFrame: number;
  fps: FrameRate;
  /** Left out: found from the marks. */
  hold?: Hold;
  scale?: { pxPerMetre: number } | null;
  camera?: Reading['camera'];
  tracks: Track[];
  /** Sentences that the finder wants to be said along with the engine's own. */
  cautions?: string[];
}

export interface MotionOptions {
  tolerances?: Tolerances;
}
