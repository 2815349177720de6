import type { Field } from './account.ts';
import type { Drawing } from './drawings.ts';
import { replicateNoise, suspects } from './drawings.ts';
import { honoured } from './hand.ts';
import { quantile } from './hold.ts';
import { partition, roughNoise } from './partition.ts';
import type { Stretch } from './spans.ts';
import { stretchesOf } from './spans.ts';
import type { HandWork } from './types.ts';

/** A track in local coordinates, so that frames near 100,000 and places near 10⁶ px lose no digits. */
export interface Local {
  drawings: Drawing[];
  /** Document frame of local time 0, and picture place of the local origin, px. */
  origin: number;
  centre: { x: number; y: number };
}

/**
 * Times count from the first drawing. Places count from the middle of the picture, which is where a camera looks, or from the
 * middle of the drawings where the picture's size is not known or the drawings lie far outside it.
 */
export function toLocal(drawings: readonly Drawing[], width: number, height: number): Local {
  const origin = drawings[0]!.t;
  const x = quantile(
    drawings.map((drawing) => drawing.x),
    0.5,
  );
  const y = quantile(
    drawings.map((drawing) => drawing.y),
    0.5,
  );
  const inside =
    width > 0 && height > 0 && Math.abs(x - width / 2) < 2 * width && Math.abs(y - height / 2) < 2 * height;
  const centre = inside ? { x: width / 2, y: height / 2 } : { x, y };
  return {
    drawings: drawings.map((drawing) => ({
      ...drawing,
      t: drawing.t - origin,
      x: drawing.x - centre.x,
      y: drawing.y - centre.y,
    })),
    origin,
    centre,
  };
}

/** What the search works on: drawings as numbers, their noise, what a hand set, and the first cut into stretches. */
export interface Prepared {
  field: Field;
  stretches: Stretch[];
  /** Drawings that stand out from their neighbours, and those that no piece claims. */
  odd: number[];
  lost: number[];
  /** Whether anything moves at all. */
  moves: boolean;
}

/** Weight of a drawing in a span that is no free flight: enough to carry the path through, too little to pull at anything. */
const UNFREE_WEIGHT = 1e-4;

/** Marks of one drawing that agree better than this were found in the same picture twice, px. */
const SAME_PICTURE = 0.05;

const NOISE = { least: 0.25, most: 3 };

export function prepare(local: Local, hand: HandWork | undefined, air = { airy: false, scaled: false }): Prepared {
  const set = honoured(hand, local.origin);
  const unfree = (t: number) => set.notFree.some((span) => span.from < t && t < span.to);
  const drawings = local.drawings.map((one) => (unfree(one.t) ? { ...one, weight: one.weight * UNFREE_WEIGHT } : one));
  const replicates = tellingReplicates(drawings);
  const rough = replicates.freedom >= 6 ? Math.sqrt(replicates.sum / replicates.freedom) : roughNoise(drawings);
  const noise = Math.min(NOISE.most, Math.max(NOISE.least, rough));
  const odd = suspects(drawings, noise);
  const trusted = drawings.map((_, i) => i).filter((i) => !odd.includes(i));
  const pieces = partition(
    trusted.map((i) => ({ ...drawings[i]!, weight: Math.max(1, drawings[i]!.weight) })),
    noise,
  ).map((piece) => ({ ...piece, from: trusted[piece.from]!, to: trusted[piece.to]! }));
  const number = (pick: (drawing: Drawing) => number) => Float64Array.from(drawings, pick);
  const steps = drawings.slice(1).map((drawing, i) => drawing.t - drawings[i]!.t);
  return {
    field: {
      drawings,
      replicates,
      noise: rough,
      step: quantile(steps, 0.5),
      hand: set,
      ...air,
      samples: {
        t: number((one) => one.t),
        x: number((one) => one.x),
        y: number((one) => one.y),
        weight: number((one) => one.weight),
      },
    },
    stretches: stretchesOf(drawings, pieces, noise, odd),
    odd,
    lost: pieces.filter((piece) => piece.kind === 'lost').map((piece) => piece.from),
    moves: Math.hypot(spread(drawings, 'x'), spread(drawings, 'y')) >= 6 * noise,
  };
}

/**
 * Noise as the marks of one drawing disagree about it, where that says something: the same picture seen twice gives the same
 * mark, however unsteady the hand that drew it.
 */
function tellingReplicates(drawings: readonly Drawing[]): { sum: number; freedom: number } {
  const replicates = replicateNoise(drawings);
  return replicates.sum < SAME_PICTURE ** 2 * replicates.freedom ? { sum: 0, freedom: 0 } : replicates;
}

/** Middle 90 % of the places on one axis, px: one stray mark is no motion. */
function spread(drawings: readonly Drawing[], axis: 'x' | 'y'): number {
  const values = drawings.map((drawing) => drawing[axis]).sort((a, b) => a - b);
  const drop = values.length > 6 ? Math.ceil(values.length * 0.05) : 0;
  return values[values.length - 1 - drop]! - values[drop]!;
}
