import type { Point } from '../../../shared/reading/document.ts';

/** The fault a path is drawn with. Left out: the path of free flight. */
export type PathFault =
  /** Rise time over flight time between level heights; 0.5 is right. */
  | { kind: 'apex-off-centre'; riseShare: number }
  /** Height follows |t|^p about the apex; 2 is right, below it is too straight, above it hangs. */
  | { kind: 'exponent'; p: number }
  /** Across speed grows from (1 - strength) to (1 + strength) of its mean. */
  | { kind: 'slow-out'; strength: number }
  /** One drawing moved off the path; `frame` counts from 1. */
  | { kind: 'pop'; frame: number; dx: number; dy: number }
  /** The drawing of the frame before is shown again; later ones keep their time. */
  | { kind: 'held'; frame: number };

export interface Toss {
  from: Point;
  to: Point;
  /** Frame of the last drawing at rest, from 1. */
  takeOff: number;
  /** Frames in the air; a fraction puts the landing between two frames. */
  airTime: number;
  /** px/frame², y growing downwards. */
  gravity: number;
  frames: number;
  fault?: PathFault;
}

/**
 * Where the thing's centre is drawn on every frame of a toss that rests, flies from one place to another and rests again.
 * Index 0 is frame 1; px. A fault in the rise or the fall needs level heights and is drawn to the height of the true arc.
 */
export function tossPath(toss: Toss): Point[] {
  const path = Array.from({ length: toss.frames }, (_, index) => placeAt(toss, index + 1));
  const fault = toss.fault;
  if (fault?.kind === 'pop') {
    const popped = path[fault.frame - 1]!;
    path[fault.frame - 1] = { x: popped.x + fault.dx, y: popped.y + fault.dy };
  }
  if (fault?.kind === 'held') path[fault.frame - 1] = path[fault.frame - 2]!;
  return path;
}

function placeAt(toss: Toss, frame: number): Point {
  const { from, to, airTime, gravity, fault } = toss;
  const time = frame - toss.takeOff;
  if (time <= 0) return from;
  if (time >= airTime) return to;

  const share = time / airTime;
  const across = fault?.kind === 'slow-out' ? (1 - fault.strength) * share + fault.strength * share ** 2 : share;
  const x = from.x + (to.x - from.x) * across;

  const height = (gravity * airTime ** 2) / 8;
  if (fault?.kind === 'apex-off-centre') {
    const rise = fault.riseShare;
    const away = share < rise ? (share - rise) / rise : (share - rise) / (1 - rise);
    return { x, y: from.y - height * (1 - away ** 2) };
  }
  if (fault?.kind === 'exponent') return { x, y: from.y - height * (1 - Math.abs(2 * share - 1) ** fault.p) };
  const upward = (to.y - from.y) / airTime - (gravity * airTime) / 2;
  return { x, y: from.y + upward * time + (gravity * time ** 2) / 2 };
}

export interface Bounces {
  /** Where the thing is let go, px. */
  from: Point;
  /** Frame of the last drawing before it is let go, from 1. */
  takeOff: number;
  /** Height of the thing's centre when it touches the ground, px. */
  groundY: number;
  /** px/frame. */
  across: number;
  /** px/frame² of the drop, then of each rebound. */
  gravity: number[];
  /** How high each rebound rises over the ground, px. */
  rebounds: number[];
  frames: number;
}

/** Frames on which a dropped thing touches the ground; fractions. One more than there are rebounds. */
export function contactsOf(bounces: Bounces): number[] {
  const drop = bounces.groundY - bounces.from.y;
  const contacts = [bounces.takeOff + Math.sqrt((2 * drop) / bounces.gravity[0]!)];
  for (const [index, height] of bounces.rebounds.entries()) {
    contacts.push(contacts.at(-1)! + 2 * Math.sqrt((2 * height) / bounces.gravity[index + 1]!));
  }
  return contacts;
}

/**
 * Where the centre of a dropped, bouncing thing is drawn on every frame; it stays where the last rebound lands.
 * Index 0 is frame 1; px.
 */
export function bouncePath(bounces: Bounces): Point[] {
  const contacts = contactsOf(bounces);
  const end = contacts.at(-1)!;
  return Array.from({ length: bounces.frames }, (_, index) => {
    const frame = Math.min(Math.max(index + 1, bounces.takeOff), end);
    const x = bounces.from.x + bounces.across * (frame - bounces.takeOff);
    if (frame >= end) return { x, y: bounces.groundY };
    const flight = contacts.findIndex((contact) => frame < contact);
    const gravity = bounces.gravity[flight]!;
    if (flight === 0) return { x, y: bounces.from.y + (gravity * (frame - bounces.takeOff) ** 2) / 2 };
    const since = frame - contacts[flight - 1]!;
    const until = contacts[flight]! - frame;
    return { x, y: bounces.groundY - (gravity * since * until) / 2 };
  });
}

/** Shows each drawing for two frames: frame 2k shows what frame 2k-1 shows. */
export function onTwos(path: Point[]): Point[] {
  return path.map((_, index) => path[index - (index % 2)]!);
}
