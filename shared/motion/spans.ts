import type { Drawing } from './drawings.ts';
import type { Piece } from './partition.ts';
import type { Polynomial } from './polynomial.ts';
import { fitPolynomial, speedAt, valueAt } from './polynomial.ts';

/** A stretch of drawings with one way of moving, before the path is fitted. */
export interface Stretch {
  kind: 'rest' | 'roll' | 'flight';
  tangent: boolean;
  from: number;
  to: number;
  first: Motion;
  last: Motion;
}

/** How a piece moves: one polynomial each for x and y, and the error of its speed at its ends over noise. */
interface Motion {
  piece: Piece;
  x: Polynomial;
  y: Polynomial;
  speedError: number;
  /** Time of its last drawing. */
  until: number;
}

/**
 * Joins pieces to stretches. Contacts push up and nothing else does: a cut where the speed jumps upwards is a contact, a cut
 * without such a jump lies inside one flight, however its spacing is drawn.
 */
export function stretchesOf(
  drawings: readonly Drawing[],
  pieces: readonly Piece[],
  noise: number,
  suspects: readonly number[] = [],
): Stretch[] {
  const motions = pieces.filter((piece) => piece.kind !== 'lost').map((piece) => motionOf(drawings, piece, suspects));
  const kick = LEAST_KICK * typicalBend(motions) * typicalStep(drawings);
  const out: Stretch[] = [];
  motions.forEach((motion, index) => {
    const before = out[out.length - 1];
    const next = motions[index + 1];
    const kind = kindOf(motion, before, next, noise, kick);
    const fresh: Stretch = {
      kind,
      tangent: false,
      from: motion.piece.from,
      to: motion.piece.to,
      first: motion,
      last: motion,
    };
    if (!before) {
      out.push(fresh);
      return;
    }
    const cut = cutBetween(before, fresh, drawings, noise, kick);
    if (cut === 'none') {
      before.to = fresh.to;
      before.last = motion;
      return;
    }
    fresh.tangent = cut === 'let-go';
    out.push(fresh);
  });
  return out;
}

/** A contact kicks the thing up by at least this many steps of gravity; what jumps less is spacing. */
const LEAST_KICK = 1.5;

/** Speed down (px/frame) at which a stretch ends. */
function endSpeed(stretch: Stretch): number {
  const { piece } = stretch.last;
  return piece.kind === 'rest' ? 0 : speedAt(stretch.last.y, stretch.last.until);
}

function typicalBend(motions: readonly Motion[]): number {
  const bends = motions
    .filter((motion) => motion.piece.kind === 'flight')
    .map((motion) => (2 * motion.y.c[2]!) / motion.y.half ** 2)
    .sort((a, b) => a - b);
  return bends[Math.floor(bends.length / 2)] ?? 0;
}

function typicalStep(drawings: readonly Drawing[]): number {
  const steps = drawings
    .slice(1)
    .map((d, i) => d.t - drawings[i]!.t)
    .sort((a, b) => a - b);
  return steps[Math.floor(steps.length / 2)] ?? 1;
}

function motionOf(drawings: readonly Drawing[], piece: Piece, suspects: readonly number[]): Motion {
  const part = drawings.slice(piece.from, piece.to + 1).filter((_, i) => !suspects.includes(piece.from + i));
  const times = part.map((d) => d.t);
  const flat = piece.kind === 'rest';
  const line = flat ? 0 : 1;
  const x = fitPolynomial(
    times,
    part.map((d) => d.x),
    line,
  );
  const y = fitPolynomial(
    times,
    part.map((d) => d.y),
    piece.kind === 'flight' ? 2 : line,
  );
  const n = part.length;
  const span = Math.max(1, times[n - 1]! - times[0]!);
  const speedError = flat ? 0 : (piece.kind === 'flight' ? 12 : 3.5) / (span * Math.sqrt(n));
  return { piece, x, y, speedError, until: times[n - 1]! };
}

function kindOf(
  motion: Motion,
  before: Stretch | undefined,
  next: Motion | undefined,
  noise: number,
  kick: number,
): Stretch['kind'] {
  const { piece } = motion;
  if (piece.kind === 'rest') {
    if (before?.kind === 'flight' && next && endSpeed(before) < kick) return 'flight';
    if (before && next && piece.to - piece.from < 2) return 'flight';
    return 'rest';
  }
  if (piece.kind === 'line') {
    const down = speedAt(motion.y, motion.y.middle);
    const across = Math.abs(speedAt(motion.x, motion.x.middle));
    const level = Math.abs(down) < 0.12 * across + 3 * noise * motion.speedError;
    if (level && across > 0 && (!before || before.kind !== 'flight' || endSpeed(before) > kick)) {
      return 'roll';
    }
  }
  return 'flight';
}

function cutBetween(
  a: Stretch,
  b: Stretch,
  drawings: readonly Drawing[],
  noise: number,
  kick: number,
): 'contact' | 'let-go' | 'none' {
  const t = (drawings[a.last.piece.to]!.t + drawings[b.first.piece.from]!.t) / 2;
  const va = a.kind === 'rest' ? 0 : speedAt(a.last.y, t);
  const vb = b.kind === 'rest' ? 0 : speedAt(b.first.y, t);
  const jump = vb - va;
  const error = 3 * noise * Math.hypot(a.last.speedError, b.first.speedError);
  const turned = secant(b, drawings, 'start') - secant(a, drawings, 'end');
  const upward = turned < -0.5 * kick && jump < -error && -jump > 0.3 * (Math.abs(va) + Math.abs(vb)) && -jump > kick;
  if (upward) return 'contact';
  if (a.kind !== b.kind) {
    if (b.kind === 'flight') return 'let-go';
    return a.kind === 'flight' && b.kind === 'rest' && a.to - a.from < 2 ? 'none' : 'contact';
  }
  return 'none';
}

/** Mean speed down over the two steps nearest to one end of a stretch, px/frame: not misled by a bent little piece. */
function secant(stretch: Stretch, drawings: readonly Drawing[], end: 'start' | 'end'): number {
  const { piece } = end === 'start' ? stretch.first : stretch.last;
  if (piece.kind === 'rest') return 0;
  const reach = Math.min(2, piece.to - piece.from);
  const [a, b] = end === 'start' ? [piece.from, piece.from + reach] : [piece.to - reach, piece.to];
  return (drawings[b]!.y - drawings[a]!.y) / Math.max(1, drawings[b]!.t - drawings[a]!.t);
}

/** First guess of the moment at which two stretches meet: where their heights cross between their nearest drawings. */
export function meetingTime(a: Stretch, b: Stretch, drawings: readonly Drawing[]): number {
  const low = drawings[a.to]!.t;
  const high = drawings[b.from]!.t;
  if (b.tangent) return low;
  const gap = (t: number) =>
    Math.hypot(valueAt(a.last.x, t) - valueAt(b.first.x, t), valueAt(a.last.y, t) - valueAt(b.first.y, t));
  let best = (low + high) / 2;
  let least = Infinity;
  for (let k = 0; k <= 16; k += 1) {
    const t = low + ((high - low) * k) / 16;
    const distance = gap(t);
    if (distance < least) {
      least = distance;
      best = t;
    }
  }
  return best;
}

/** Place of a stretch at a time, px, by its nearest piece. */
export function placeOf(stretch: Stretch, end: 'start' | 'end', t: number): { x: number; y: number } {
  const motion = end === 'start' ? stretch.first : stretch.last;
  return { x: valueAt(motion.x, t), y: valueAt(motion.y, t) };
}
