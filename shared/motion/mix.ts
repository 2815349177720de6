import type { Mark } from '../reading/document.ts';

/** A step from one frame to the next: its length, and the speed around it, px. */
interface Step {
  frame: number;
  length: number;
  around: number;
}

/** Fewest repeats a passage on twos is known by: one or two alone are held drawings, which are a fault. */
const LEAST_REPEATS = 3;

/** Fewest steps in a row, all moving on, that a passage on ones is known by. */
const LEAST_ONES = 5;

/**
 * Frames on which a new drawing appears where a passage on twos stands beside one on ones; null where there is no such mix. In a
 * passage on twos every second step stands still amid motion and the others go twice as far; in one on ones none stands still.
 */
export function findMix(marks: readonly Mark[]): number[] | null {
  const steps = stepsOf(marks);
  const fastest = Math.max(0, ...steps.map((step) => step?.around ?? 0));
  const moves = (step: Step | null) => step !== null && step.around > 0.2 * fastest && step.around > 1;
  // Amid motion: at the edge of a rest the step before or after stands still as well.
  const amid = (k: number) => [steps[k - 1], steps[k + 1]].every((one) => !one || one.length > 0.6 * steps[k]!.around);
  const stills = steps.map((step, k) => moves(step) && step!.length < 0.3 * step!.around && amid(k));
  const far = (step: Step | null) => moves(step) && step!.length > 1.3 * step!.around;
  const repeats = new Set<number>();
  let covered = steps.map(() => false);
  for (let first = 0; first < steps.length; first += 1) {
    if (!stills[first] || covered[first]) continue;
    let last = first;
    let count = 1;
    // Slow moments, as at an apex, neither show the pattern nor break it.
    for (let k = first + 2; k < steps.length && steps[k - 1] && steps[k]; k += 2) {
      if ((moves(steps[k - 1]!) && !far(steps[k - 1]!)) || (moves(steps[k]!) && !stills[k])) break;
      if (!stills[k]) continue;
      last = k;
      count += 1;
    }
    if (count < LEAST_REPEATS) continue;
    covered = covered.map((one, k) => one || (k >= first - 1 && k <= last + 1));
    for (const k of passage(steps, first, last)) repeats.add(steps[k]!.frame);
  }
  if (!repeats.size) return null;
  let run = 0;
  let ones = 0;
  for (let k = 0; k < steps.length; k += 1) {
    if (stills[k] && !covered[k]) return null;
    run = !covered[k] && moves(steps[k]!) ? run + 1 : 0;
    ones = Math.max(ones, run);
  }
  if (ones < LEAST_ONES) return null;
  return marks.filter((mark) => !repeats.has(mark.frame)).map((mark) => mark.frame);
}

/** The repeats of a passage from its first sure one to its last, and those just beyond that only their slowness made unsure. */
function passage(steps: readonly (Step | null)[], first: number, last: number): number[] {
  const sure: number[] = [];
  for (let k = first; k <= last; k += 2) sure.push(k);
  const limit = 2 * Math.max(...sure.map((k) => steps[k]!.length));
  const repeats = (k: number, inner: number) =>
    !!steps[k] && !!steps[inner] && steps[k].length <= limit && steps[inner].length > 2 * limit;
  for (let k = first - 2; repeats(k, k + 1); k -= 2) sure.push(k);
  for (let k = last + 2; repeats(k, k - 1); k += 2) sure.push(k);
  return sure;
}

/** Steps between marks of neighbouring frames, with the speed of two frames before to two after; null across a gap. */
function stepsOf(marks: readonly Mark[]): (Step | null)[] {
  return marks.slice(1).map((b, i) => {
    const a = marks[i]!;
    if (b.frame - a.frame !== 1) return null;
    // A window of an even count of frames holds as many repeats as new drawings, wherever it starts.
    const before = marks[Math.max(0, i - 1)]!;
    const after = marks[Math.min(marks.length - 1, i + 3)]!;
    const earlier = marks[Math.max(0, i - 2)]!;
    const later = marks[Math.min(marks.length - 1, i + 2)]!;
    return {
      frame: b.frame,
      length: Math.hypot(b.x - a.x, b.y - a.y),
      around: (speed(before, after) + speed(earlier, later)) / 2,
    };
  });
}

function speed(a: Mark, b: Mark): number {
  return Math.hypot(b.x - a.x, b.y - a.y) / Math.max(1, b.frame - a.frame);
}
