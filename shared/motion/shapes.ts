/**
 * The shape faults as changes of the time at which the true flight is shown: every kind bends the same flight by one number,
 * so that the kinds compete on the same residuals. `nothing` is the value at which the flight is true.
 */
export interface Shape {
  name: ShapeName;
  /** Index of the span it bends. */
  span: number;
  parameters: number;
  /** True where the flight's landing (or take-off) lies outside the strip, so that its own span is only what is seen. */
  openStart: boolean;
  openEnd: boolean;
}
export type ShapeName =
  | 'drag'
  | 'apex'
  | 'power'
  | 'power-rise'
  | 'power-fall'
  | 'hang'
  | 'hang-up'
  | 'ease'
  | 'even-path'
  | 'even-steps';

/** The shapes that compete; the one-sided powers are only measured. */
export const SHAPE_NAMES: readonly ShapeName[] = [
  'ease',
  'even-path',
  'apex',
  'power',
  'hang',
  'hang-up',
  'even-steps',
];

export const SHAPE_NOTHING: Record<ShapeName, number> = {
  drag: 0,
  apex: 0,
  power: 2,
  'power-rise': 2,
  'power-fall': 2,
  hang: 0,
  'hang-up': 0,
  ease: 0,
  'even-path': 0,
  'even-steps': 0,
};

/** Where the search for a shape's number starts (some more than once): a number, and a share of the time between drawings. */
export const SHAPE_STARTS: Record<ShapeName, readonly { base: number; steps: number }[]> = {
  drag: [{ base: 0, steps: 0 }],
  apex: [{ base: 0, steps: 0 }],
  power: [{ base: 2, steps: 0 }],
  'power-rise': [{ base: 2, steps: 0 }],
  'power-fall': [{ base: 2, steps: 0 }],
  hang: [
    { base: 0, steps: 1 },
    { base: 0, steps: 3.5 },
  ],
  'hang-up': [
    { base: 0, steps: 1 },
    { base: 0, steps: 3.5 },
  ],
  ease: [{ base: 0, steps: 0 }],
  'even-path': [{ base: 0.2, steps: 0 }],
  'even-steps': [{ base: 0.2, steps: 0 }],
};

/**
 * Time within the true flight at which its x and its y stand at time `u` after take-off, into `out`.
 * `length` is the flight's duration (without its hold at the top), `apex` the time of its apex (frames after take-off, may lie outside) and `bend` its
 * gravity over its speed across (1/frame).
 */
export function warpTime(
  shape: Shape,
  theta: Float64Array,
  at: number,
  u: number,
  length: number,
  apex: number,
  bend: number,
  out: Float64Array,
): void {
  const value = theta[at]!;
  let wx = u;
  let wy = u;
  switch (shape.name) {
    case 'drag':
      wy = apex + slowed(u - apex, value);
      break;
    case 'ease':
      wx = u + (value * u * (u - length)) / length;
      break;
    case 'apex': {
      const shifted = apex + value * length;
      if (u < shifted || shifted >= length) wy = (u * apex) / shifted;
      else wy = apex + ((u - shifted) * (length - apex)) / (length - shifted);
      break;
    }
    case 'power':
    case 'power-rise':
    case 'power-fall': {
      const side = u < apex ? -1 : 1;
      if (shape.name === (side < 0 ? 'power-fall' : 'power-rise')) break;
      const reach = reachOf(shape, side, length, apex);
      const share = Math.abs(u - apex) / reach;
      wy = apex + side * reach * share ** (value / 2);
      break;
    }
    case 'hang':
    case 'hang-up':
      wy = u < apex ? u : Math.max(apex, u - value);
      if (shape.name === 'hang') wx = wy;
      break;
    case 'even-steps': {
      const side = u < apex ? -1 : 1;
      const reach = reachOf(shape, side, length, apex);
      const share = Math.abs(u - apex) / reach;
      wy = apex + side * reach * ((1 - value) * share + value * Math.sqrt(share));
      wx = wy;
      break;
    }
    case 'even-path': {
      const ends = endsOf(shape, length, apex, bend);
      const way = ends.from + ((ends.to - ends.from) * (u - ends.start)) / (ends.end - ends.start);
      const even = apex + alongInverse(way, (u - apex) * bend) / bend;
      wy = (1 - value) * u + value * even;
      wx = wy;
      break;
    }
  }
  out[0] = wx;
  out[1] = wy;
}

/**
 * Time after the apex at which a thing without air would have fallen as far as one that air slows has after `s`: a fall with
 * drag goes (v²/g) ln cosh(g s / v), v being its terminal speed (OpenStax University Physics 1, 6.4); `value` is (g/v)².
 */
function slowed(s: number, value: number): number {
  if (s <= 0 || value < 1e-9) return s * (1 - (value * s * s) / 12);
  const rate = Math.sqrt(value);
  const x = rate * s;
  const logCosh = x + Math.log1p(Math.exp(-2 * x)) - Math.LN2;
  return Math.sqrt(2 * logCosh) / rate;
}

/** Length of the parabola y = q²/2 from its apex to slope `q`, doubled (closed form of the arc length). */
function along(q: number): number {
  return Math.asinh(q) + q * Math.sqrt(1 + q * q);
}

/** The slope at which `along` reaches `length`, by Newton's method from a slope nearby; the way grows evenly enough to end there. */
function alongInverse(length: number, guess: number): number {
  let q = guess;
  for (let i = 0; i < 12; i += 1) {
    const root = Math.sqrt(1 + q * q);
    const step = (Math.asinh(q) + q * root - length) / (2 * root);
    q -= step;
    if (Math.abs(step) < 1e-6 * (1 + Math.abs(q))) break;
  }
  return q;
}

/** Ends of the way along one arc, kept from call to call: they are the same for all drawings of a flight. */
const known = { length: Number.NaN, apex: 0, bend: 0, open: 0, start: 0, end: 0, from: 0, to: 0 };

function endsOf(shape: Shape, length: number, apex: number, bend: number): typeof known {
  const open = (shape.openStart ? 1 : 0) + (shape.openEnd ? 2 : 0);
  if (known.length === length && known.apex === apex && known.bend === bend && known.open === open) return known;
  known.length = length;
  known.apex = apex;
  known.bend = bend;
  known.open = open;
  known.start = open === 1 ? 2 * apex - length : 0;
  known.end = open === 2 && apex > 1 ? 2 * apex : length;
  known.from = along((known.start - apex) * bend);
  known.to = along((known.end - apex) * bend);
  return known;
}

/** Time from the apex to the end of the flight on one side; where that end is not seen, the other side's. */
function reachOf(shape: Shape, side: number, length: number, apex: number): number {
  const rise = Math.max(apex, 0.5);
  const fall = Math.max(length - apex, 0.5);
  if (side < 0) return shape.openStart && !shape.openEnd ? fall : rise;
  return shape.openEnd && !shape.openStart ? rise : fall;
}
