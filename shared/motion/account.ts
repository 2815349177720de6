import type { Drawing } from './drawings.ts';
import type { PathFit, Samples } from './fit.ts';
import type { Honoured } from './hand.ts';
import type { ShapeName } from './shapes.ts';

/** One account of a track: what is assumed wrong (or nothing), and how well the whole path then fits. */
export interface Account {
  /** null: nothing is wrong. */
  fault: Fault | null;
  depth: boolean;
  fit: PathFit;
  /** Weights the fit used; 0 for drawings left out as off the arc. */
  weight: Float64Array;
  left: number[];
  /** Noise² per axis and mark, and the degrees of freedom behind it. */
  noise2: number;
  freedom: number;
  /** Minus twice the log likelihood, with the price of what is assumed: what accounts are compared by; less is better. */
  cost: number;
  /** Sum of squares of the marks about the path and about each other, px². */
  squares: number;
  /** How many of its contacts are no contacts. */
  impossible: number;
  /** Covariance of the parameters over noise², worked out for the account that is chosen. */
  covariance: Float64Array | null;
}

export type Fault =
  | { kind: 'shape'; name: ShapeName; span: number }
  | { kind: 'gravity'; span: number }
  | { kind: 'held'; drawing: number };

export interface Field {
  samples: Samples;
  drawings: readonly Drawing[];
  replicates: { sum: number; freedom: number };
  /** Frames from one drawing to the next, as most are. */
  step: number;
  /** Whether air may slow a fall: the thing is light, or a scale says how fast it is. */
  airy: boolean;
  /** Whether a scale was given: it holds at one distance from the camera, so that there is no motion in depth. */
  scaled: boolean;
  /** What someone set, in local time. */
  hand: Honoured;
  /** Noise per axis as neighbouring drawings show it, px. */
  noise: number;
}
