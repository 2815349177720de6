import type { Shape } from './shapes.ts';

/** One stretch of the path between two knots. */
export interface Span {
  kind: 'rest' | 'roll' | 'flight';
  /** A flight that begins without a jump of speed up or down: it rolls off an edge, or is let go. */
  tangent: boolean;
  /** Which of the gravities in the parameters bends it. */
  gravity: number;
}

/**
 * The whole track as one continuous motion. Between knots (contacts, and the two ends of the strip) the thing rests, rolls or
 * flies; knot times are unknowns like knot places, so a contact lies where the paths meet and not on a drawing.
 *
 * Parameters: gravities first, then for every knot its time (when free), x and y (when free), then the depth pair, then the
 * parameter of the shape fault. px and frames, y grows downwards.
 */
export interface Path {
  spans: Span[];
  /** Per knot: index of its time in the parameters, or -1 with the fixed time in `fixedTime`. */
  timeAt: Int32Array;
  fixedTime: Float64Array;
  /** Per knot: index of x and of y; -1 where it follows from the span before it. */
  xAt: Int32Array;
  yAt: Int32Array;
  gravities: number;
  /** Index of the depth pair: relative depth speed (1/frame) and the share of depth per px of height; -1 when flat. */
  depthAt: number;
  /** Index of the shape parameter, -1 without. */
  shapeAt: number;
  shape: Shape | null;
  /** Drawings from this index on are shown late by `delay` frames (a drawing held too long). */
  delayFrom: number;
  delay: number;
  size: number;
  /** Per parameter: first and last span whose places depend on it. */
  reach: Int32Array;
  /** Per parameter: the knot it places where the path depends on it in a straight line, else -1. */
  straight: Int32Array;
}

/** Lays out the parameters of a path whose spans are known. `fixed` are the times of the two outer knots. */
export function layOut(
  spans: Span[],
  fixed: { start: number; end: number; pins?: readonly (number | null)[] },
  options: Partial<Path> = {},
): Path {
  const knots = spans.length + 1;
  const gravities = 1 + spans.reduce((most, span) => Math.max(most, span.gravity), 0);
  const path: Path = {
    spans,
    timeAt: new Int32Array(knots).fill(-1),
    fixedTime: new Float64Array(knots),
    xAt: new Int32Array(knots).fill(-1),
    yAt: new Int32Array(knots).fill(-1),
    gravities,
    depthAt: -1,
    shapeAt: -1,
    shape: null,
    delayFrom: Infinity,
    delay: 0,
    size: gravities,
    reach: new Int32Array(0),
    straight: new Int32Array(0),
    ...options,
  };
  path.fixedTime[0] = fixed.start;
  path.fixedTime[knots - 1] = fixed.end;
  for (let k = 0; k < knots; k += 1) {
    const before = spans[k - 1];
    const after = spans[k];
    const pin = fixed.pins?.[k] ?? null;
    if (before && after && pin === null) path.timeAt[k] = path.size++;
    if (pin !== null) path.fixedTime[k] = pin;
    const followsRest = before?.kind === 'rest';
    if (!followsRest) path.xAt[k] = path.size++;
    const level = before?.kind === 'roll' && !(options.depthAt !== undefined && options.depthAt >= 0);
    const followsY = followsRest || level || (before?.kind === 'flight' && before.tangent);
    if (!followsY) path.yAt[k] = path.size++;
  }
  if (options.depthAt !== undefined && options.depthAt >= 0) {
    path.depthAt = path.size;
    path.size += 2;
  }
  if (path.shape) {
    path.shapeAt = path.size;
    path.size += path.shape.parameters;
  }
  path.reach = reachOf(path);
  path.straight = straightOf(path);
  return path;
}

/** Parameters that place a knot and nothing bends by: no depth, no shape fault beside them, nothing tangent to them. */
function straightOf(path: Path): Int32Array {
  const straight = new Int32Array(path.size).fill(-1);
  if (path.depthAt >= 0) return straight;
  const last = path.spans.length - 1;
  const bendsX = path.shape !== null && !KEEPS_X.has(path.shape.name);
  const bendsY = path.shape !== null && path.shape.name !== 'ease';
  for (let k = 0; k <= last + 1; k += 1) {
    const [x, y] = [path.xAt[k]!, path.yAt[k]!];
    if (x >= 0 && !(bendsX && reaches(path, x)) && !rolls(path, x)) straight[x] = k;
    if (y >= 0 && !((bendsX || bendsY) && reaches(path, y)) && !rolls(path, y)) straight[y] = k;
  }
  return straight;
}

/** Shapes that leave the way across as it is, a straight line in time. */
const KEEPS_X: ReadonlySet<string> = new Set(['apex', 'power', 'power-rise', 'power-fall', 'hang-up', 'drag']);

/** Whether a parameter moves the span that carries the shape fault. */
function reaches(path: Path, at: number): boolean {
  const span = path.shape!.span;
  return path.reach[2 * at]! <= span && span <= path.reach[2 * at + 1]!;
}

/** Whether a parameter moves a span whose end follows from its start. */
function rolls(path: Path, at: number): boolean {
  for (let s = path.reach[2 * at]!; s <= path.reach[2 * at + 1]!; s += 1) if (path.spans[s]!.tangent) return true;
  return false;
}

/** Which spans each parameter moves: a knot moves the spans beside it and those whose knots follow from it. */
function reachOf(path: Path): Int32Array {
  const last = path.spans.length - 1;
  const reach = new Int32Array(2 * path.size);
  for (let p = 0; p < path.size; p += 1) reach[2 * p + 1] = last;
  if (path.depthAt >= 0) return reach;
  for (let k = 0; k <= last + 1; k += 1) {
    let end = Math.min(last, k);
    while (end < last && (path.xAt[end + 1]! < 0 || path.yAt[end + 1]! < 0)) end += 1;
    for (const at of [path.timeAt[k]!, path.xAt[k]!, path.yAt[k]!]) {
      if (at < 0) continue;
      reach[2 * at] = Math.max(0, k - 1);
      reach[2 * at + 1] = end;
    }
  }
  if (path.shape) reach[2 * path.shapeAt] = reach[2 * path.shapeAt + 1] = path.shape.span;
  return reach;
}
