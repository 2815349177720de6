import type { Mark, Reading } from '../../../shared/reading/document.ts';
import { readMotion } from '../../../shared/motion/read.ts';
import type { MotionInput, Track } from '../../../shared/motion/types.ts';

/** Seeded random numbers (mulberry32): the same seed gives the same track on every machine. */
export function randomFrom(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let t = state;
    t = Math.imul(t ^ (t >>> 15), t | 1);
    t ^= t + Math.imul(t ^ (t >>> 7), t | 61);
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
}

/** Normal numbers by the polar method of Box and Muller. */
export function normalFrom(seed: number): () => number {
  const random = randomFrom(seed);
  return () => Math.sqrt(-2 * Math.log(1 - random())) * Math.cos(2 * Math.PI * random());
}

export interface Throw {
  /** Frames (from 1, fractions allowed) of take-off and landing, both at the height `floor`. */
  takeOff: number;
  landing: number;
  frames: number;
  height: number;
  floor?: number;
  startX?: number;
  speed?: number;
  noise?: number;
  seed?: number;
  /** Time within the flight at which a true one would stand where this one does, for x and for y. */
  warpX?: (u: number, length: number) => number;
  warpY?: (u: number, length: number) => number;
}

/** Marks of a thing that rests, is thrown, and rests again. */
export function throwMarks(options: Throw): Mark[] {
  const { takeOff, landing, frames, height, floor = 400, startX = 120, speed = 18, noise = 0 } = options;
  const normal = normalFrom(options.seed ?? 1);
  const length = landing - takeOff;
  const g = (8 * height) / length ** 2;
  const same = (u: number) => u;
  return Array.from({ length: frames }, (_, i) => {
    const u = Math.min(length, Math.max(0, i + 1 - takeOff));
    const wx = (options.warpX ?? same)(u, length);
    const wy = (options.warpY ?? same)(u, length);
    return {
      frame: i + 1,
      x: startX + speed * wx + noise * normal(),
      y: floor + 0.5 * g * wy * (wy - length) + noise * normal(),
      origin: 'import' as const,
    };
  });
}

/** Bounces on one floor: each flight of given length in frames, all bent by one gravity unless `gravities` says otherwise. */
export function bounceMarks(options: {
  start: number;
  lengths: number[];
  gravity: number;
  gravities?: number[];
  frames: number;
  speed?: number;
  noise?: number;
  seed?: number;
}): Mark[] {
  const { start, lengths, gravity, frames, speed = 12, noise = 0 } = options;
  const normal = normalFrom(options.seed ?? 3);
  const ends = lengths.reduce<number[]>((all, length) => [...all, (all[all.length - 1] ?? start) + length], []);
  return Array.from({ length: frames }, (_, i) => {
    const t = i + 1;
    const moving = Math.min(Math.max(t, start), ends[ends.length - 1]!);
    const k = Math.min(
      ends.findIndex((end) => moving <= end),
      lengths.length - 1,
    );
    const u = moving - (k > 0 ? ends[k - 1]! : start);
    const g = options.gravities?.[k] ?? gravity;
    return {
      frame: t,
      x: 100 + speed * (moving - start) + noise * normal(),
      y: 420 + 0.5 * g * u * (u - lengths[k]!) + noise * normal(),
      origin: 'import' as const,
    };
  });
}

/** Every drawing shown `hold` times. */
export function onHold(marks: readonly Mark[], hold: number): Mark[] {
  return marks.map((mark) => {
    const shown = marks[Math.floor((mark.frame - 1) / hold) * hold]!;
    return { ...mark, x: shown.x, y: shown.y };
  });
}

/** Reads one track as file marks of a 960 x 540 picture at 24 frames a second, on ones unless told otherwise. */
export function readMarks(marks: Mark[], input: Partial<MotionInput> = {}, track: Partial<Track> = {}): Reading {
  return readMotion({
    kind: 'marks',
    frames: Math.max(0, ...marks.map((mark) => mark.frame)),
    width: 960,
    height: 540,
    firstFrame: 1,
    fps: { num: 24, den: 1 },
    hold: 1,
    tracks: [{ id: 'A', marks, ...track }],
    ...input,
  });
}

/** Marks with a finding's mend applied: every frame of a mended drawing moves along. */
export function mended(marks: readonly Mark[], reading: Reading, hold = 1): Mark[] {
  const moves = new Map(reading.findings.flatMap((finding) => finding.mend.map((move) => [move.frame, move] as const)));
  return marks.map((mark) => {
    const first = Math.floor((mark.frame - 1) / hold) * hold + 1;
    const move = moves.get(first);
    return move ? { ...mark, x: mark.x + move.dx, y: mark.y + move.dy } : mark;
  });
}
