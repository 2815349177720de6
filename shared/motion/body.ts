import type { Mark } from '../reading/document.ts';
import type { BodyPoint, BodyPointName, SegmentName } from './types.ts';

/** A balance point on every frame between the first and the last that carry points, and how far it may be off, px. */
export interface Balance {
  marks: Mark[];
  points: BodyPoint[];
  error: number;
}

interface Segment {
  name: SegmentName;
  share: number;
  /** From the proximal to the distal point; the mass sits at `ratio` of the way. */
  from: BodyPointName[];
  to: BodyPointName[];
  ratio: number;
}

const SIDES = ['left', 'right'] as const;

/**
 * Mass shares and centres of the segments of a body: Dempster 1955 as adapted by Winter, Biomechanics and Motor Control of Human
 * Movement (values as in methods 10; both sides together make 1). The hand goes with the wrist and the foot with the ankle where
 * no points of their own are placed.
 */
const SEGMENTS: readonly Segment[] = [
  { name: 'head', share: 0.081, from: ['head'], to: ['head'], ratio: 0 },
  { name: 'trunk', share: 0.497, from: ['shoulder'], to: ['hip'], ratio: 0.5 },
  ...SIDES.flatMap((side): Segment[] => [
    { name: 'upper-arm', share: 0.028, from: [`shoulder-${side}`], to: [`elbow-${side}`], ratio: 0.436 },
    { name: 'forearm', share: 0.016, from: [`elbow-${side}`], to: [`wrist-${side}`], ratio: 0.43 },
    { name: 'hand', share: 0.006, from: [`wrist-${side}`], to: [`wrist-${side}`], ratio: 0 },
    { name: 'thigh', share: 0.1, from: [`hip-${side}`], to: [`knee-${side}`], ratio: 0.433 },
    { name: 'shank', share: 0.0465, from: [`knee-${side}`], to: [`ankle-${side}`], ratio: 0.433 },
    { name: 'foot', share: 0.0145, from: [`ankle-${side}`], to: [`ankle-${side}`], ratio: 0 },
  ]),
];

/**
 * Merged segments for bodies with few points (Winter, from memory in methods 10): head-arms-trunk 0.678 at 0.626 of the way from
 * the hips to the shoulders, both legs 0.322 at 0.447 from the hips. The shoulders lie at about 0.65 of the way to the head
 * (our estimate).
 */
const COARSE = { upper: 0.678, legs: 0.322, upperRatio: 0.626, legRatio: 0.447, shoulders: 0.65 };

/** Least and most uncertain: 1 % of body height with all 14 points, 3 % with three (from memory, an estimate). */
const ERROR = { all: 0.01, three: 0.03 };

type Places = Map<BodyPointName, { x: number; y: number }>;

/**
 * The balance point of a body from points placed on some frames and carried smoothly between them (a cubic
 * through them that keeps a parabola a parabola). Null where no frame carries head, hips and feet in some form.
 */
export function balanceOf(
  points: readonly BodyPoint[],
  shares: Partial<Record<SegmentName, number>> = {},
): Balance | null {
  const names = [...new Set(points.map((point) => point.name))];
  const frames = points.map((point) => point.frame);
  if (names.length < 3) return null;
  const first = Math.min(...frames);
  const last = Math.max(...frames);
  const carried = new Map(names.map((name) => [name, carry(points.filter((point) => point.name === name))]));
  const marks: Mark[] = [];
  const all: BodyPoint[] = [];
  let tallest = 0;
  for (let frame = first; frame <= last; frame += 1) {
    const places: Places = new Map();
    for (const [name, at] of carried) {
      const place = at(frame);
      if (place) {
        places.set(name, place);
        all.push({ frame, name, ...place });
      }
    }
    const centre = centreOf(places, shares);
    if (!centre) continue;
    const ys = [...places.values()].map((place) => place.y);
    tallest = Math.max(tallest, Math.max(...ys) - Math.min(...ys));
    marks.push({ frame, x: centre.x, y: centre.y, origin: 'balance' });
  }
  if (!marks.length) return null;
  const detail = Math.min(1, Math.max(0, (names.length - 3) / 10));
  return { marks, points: all, error: tallest * (ERROR.three + detail * (ERROR.all - ERROR.three)) };
}

/** Weighted mean of the segments whose points are there; with few points, of head-arms-trunk and legs. */
function centreOf(places: Places, shares: Partial<Record<SegmentName, number>>): { x: number; y: number } | null {
  const shoulder = places.get('shoulder') ?? middle(places, 'shoulder-left', 'shoulder-right');
  const hip = places.get('hip') ?? middle(places, 'hip-left', 'hip-right');
  const at = (name: BodyPointName) => {
    const own = places.get(name);
    if (own) return own;
    if (name === 'shoulder' || name.startsWith('shoulder')) return shoulder;
    if (name === 'hip' || name.startsWith('hip')) return hip;
    return undefined;
  };
  if (!shoulder || !places.has('knee-left')) return coarseCentre(places, hip);
  let x = 0;
  let y = 0;
  let mass = 0;
  for (const segment of SEGMENTS) {
    const from = at(segment.from[0]!);
    const to = at(segment.to[0]!) ?? from;
    if (!from || !to) continue;
    const share = shares[segment.name] ?? segment.share;
    x += share * (from.x + segment.ratio * (to.x - from.x));
    y += share * (from.y + segment.ratio * (to.y - from.y));
    mass += share;
  }
  return mass > 0.5 ? { x: x / mass, y: y / mass } : coarseCentre(places, hip);
}

function coarseCentre(places: Places, hip: { x: number; y: number } | undefined): { x: number; y: number } | null {
  const head = places.get('head');
  const feet = places.get('feet') ?? middle(places, 'ankle-left', 'ankle-right');
  if (!head || !hip || !feet) return null;
  const blend = (axis: 'x' | 'y') =>
    COARSE.upper * (hip[axis] + COARSE.upperRatio * COARSE.shoulders * (head[axis] - hip[axis])) +
    COARSE.legs * (hip[axis] + COARSE.legRatio * (feet[axis] - hip[axis]));
  return { x: blend('x'), y: blend('y') };
}

function middle(places: Places, a: BodyPointName, b: BodyPointName): { x: number; y: number } | undefined {
  const p = places.get(a);
  const q = places.get(b);
  if (!p || !q) return p ?? q;
  return { x: (p.x + q.x) / 2, y: (p.y + q.y) / 2 };
}

/** A point carried between the frames on which it was placed; undefined beyond them. */
function carry(placed: BodyPoint[]): (frame: number) => { x: number; y: number } | undefined {
  const sorted = [...placed].sort((a, b) => a.frame - b.frame);
  const t = sorted.map((point) => point.frame);
  const x = slopesOf(
    t,
    sorted.map((point) => point.x),
  );
  const y = slopesOf(
    t,
    sorted.map((point) => point.y),
  );
  return (frame) => {
    const k = t.findLastIndex((time) => time <= frame);
    if (k < 0 || (k === t.length - 1 && frame !== t[k])) return undefined;
    if (frame === t[k]) return { x: sorted[k]!.x, y: sorted[k]!.y };
    const h = t[k + 1]! - t[k]!;
    const u = (frame - t[k]!) / h;
    const cubic = (p: number, q: number, m: number, n: number) =>
      p * (1 + 2 * u) * (1 - u) ** 2 + q * u * u * (3 - 2 * u) + h * (m * u * (1 - u) ** 2 + n * u * u * (u - 1));
    return {
      x: cubic(sorted[k]!.x, sorted[k + 1]!.x, x[k]!, x[k + 1]!),
      y: cubic(sorted[k]!.y, sorted[k + 1]!.y, y[k]!, y[k + 1]!),
    };
  };
}

/** Slopes for a cubic through values: central differences, so that parabolas are carried exactly between even frames. */
function slopesOf(t: readonly number[], values: readonly number[]): number[] {
  return values.map((value, k) => {
    if (values.length < 2) return 0;
    if (k === 0) return endSlope(t, values, 0, 1, 2);
    const n = values.length - 1;
    if (k === n) return endSlope(t, values, n, n - 1, n - 2);
    const before = (value - values[k - 1]!) / (t[k]! - t[k - 1]!);
    const after = (values[k + 1]! - value) / (t[k + 1]! - t[k]!);
    const left = t[k]! - t[k - 1]!;
    const right = t[k + 1]! - t[k]!;
    return (before * right + after * left) / (left + right);
  });
}

function endSlope(t: readonly number[], values: readonly number[], a: number, b: number, c: number): number {
  const near = (values[b]! - values[a]!) / (t[b]! - t[a]!);
  if (values[c] === undefined) return near;
  const far = (values[c]! - values[b]!) / (t[c]! - t[b]!);
  return near - ((far - near) * (t[b]! - t[a]!)) / (t[c]! - t[a]!);
}
