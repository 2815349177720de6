import type { Hold, Mark } from '../reading/document.ts';
import { findMix } from './mix.ts';

/** How long each drawing is shown, and on which frame the pattern starts. */
export interface HoldPattern {
  hold: Hold;
  phase: number;
  /** With a mix: the frames on which a new drawing appears. */
  starts: number[];
  caution?: string;
}

/** The pattern as told, with its phase found; or found altogether when nothing is told. */
export function holdOf(marks: readonly Mark[], told: Hold | undefined): HoldPattern {
  if (told === undefined) {
    const starts = findMix(marks);
    return starts ? { hold: 'mixed', phase: 1, starts, caution: MIXED } : findHold(marks);
  }
  if (told === 'mixed') return { hold: told, phase: 1, starts: exposureOf(marks), caution: MIXED };
  return { hold: told, phase: told === 1 ? 1 : findPhase(marks, told), starts: [] };
}

const MIXED = 'Ones and twos are mixed: every new drawing is read at the frame on which it appears.';

/** Frames on which a new drawing appears. */
export function exposuresOf(pattern: HoldPattern | undefined, frames: number): number[] {
  if (!pattern) return [];
  if (pattern.hold === 'mixed') return pattern.starts;
  const out: number[] = [];
  for (let frame = 1; frame <= frames; frame += 1) {
    if (frame === 1 || (frame - pattern.phase) % pattern.hold === 0) out.push(frame);
  }
  return out;
}

/**
 * Finds whether the drawings are on ones, twos or threes: within a drawing the marks differ by noise alone, between drawings
 * they move on. Only steps amid motion count, so that rests do not look like holds.
 */
export function findHold(marks: readonly Mark[]): HoldPattern {
  const ones: HoldPattern = { hold: 1, phase: marks[0]?.frame ?? 1, starts: [] };
  const steps = movingSteps(marks);
  if (steps.length < 4) return ones;
  let best = ones;
  let bestRatio = 0.3;
  for (const hold of [3, 2] as const) {
    for (let phase = 0; phase < hold; phase += 1) {
      const inside: number[] = [];
      const between: number[] = [];
      for (const step of steps) ((step.frame - phase) % hold === 0 ? between : inside).push(step.length);
      if (inside.length < 3 || between.length < 2) continue;
      const still = quantile(inside, 0.75);
      const moved = quantile(between, 0.4);
      const ratio = moved > 0 ? still / moved : Infinity;
      if (ratio < bestRatio) {
        bestRatio = ratio;
        best = { hold, phase, starts: [] };
      }
    }
    if (best.hold === 3) break;
  }
  return best;
}

/** Steps between marks of neighbouring frames, where the marks around them show that the thing is under way. */
function movingSteps(marks: readonly Mark[]): { frame: number; length: number }[] {
  const all: { frame: number; length: number; around: number }[] = [];
  for (let i = 1; i < marks.length; i += 1) {
    const a = marks[i - 1]!;
    const b = marks[i]!;
    if (b.frame - a.frame !== 1) continue;
    const before = marks[Math.max(0, i - 3)]!;
    const after = marks[Math.min(marks.length - 1, i + 2)]!;
    const around = Math.hypot(after.x - before.x, after.y - before.y) / Math.max(1, after.frame - before.frame);
    all.push({ frame: b.frame, length: Math.hypot(b.x - a.x, b.y - a.y), around });
  }
  const typical = quantile(
    all.map((one) => one.around),
    0.7,
  );
  return all.filter((one) => one.around > 0.25 * typical);
}

/** Phase at which a given hold fits best: drawings on twos may start on an odd or an even frame. */
export function findPhase(marks: readonly Mark[], hold: 2 | 3): number {
  let best = marks[0]?.frame ?? 1;
  let least = Infinity;
  for (let phase = 1; phase <= hold; phase += 1) {
    const inside: number[] = [];
    for (let i = 1; i < marks.length; i += 1) {
      const [a, b] = [marks[i - 1]!, marks[i]!];
      if (b.frame - a.frame === 1 && (b.frame - phase) % hold !== 0) inside.push(Math.hypot(b.x - a.x, b.y - a.y));
    }
    const still = inside.length ? quantile(inside, 0.8) : Infinity;
    if (still < least * 0.7) {
      least = still;
      best = phase;
    }
  }
  return best;
}

/** Exposures of a mix: a new drawing appears where the thing moved by more than the noise. */
export function exposureOf(marks: readonly Mark[]): number[] {
  const steps = marks.slice(1).map((mark, i) => Math.hypot(mark.x - marks[i]!.x, mark.y - marks[i]!.y));
  const noise = quantile(steps, 0.2);
  const limit = Math.max(0.5, Math.min(3 * noise, 0.3 * quantile(steps, 0.8)));
  return marks.filter((_, i) => i === 0 || steps[i - 1]! > limit).map((mark) => mark.frame);
}

/** Value below which the given share of the values lies; 0 for none. */
export function quantile(values: readonly number[], share: number): number {
  if (!values.length) return 0;
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.min(sorted.length - 1, Math.floor(share * sorted.length))]!;
}
