import type { FrameRate } from '../reading/document.ts';

/** Rates that pictures are shown at; whole ones come first where two lie too close to tell apart. */
const RATES: FrameRate[] = [
  { num: 24, den: 1 },
  { num: 25, den: 1 },
  { num: 30, den: 1 },
  { num: 12, den: 1 },
  { num: 15, den: 1 },
  { num: 48, den: 1 },
  { num: 50, den: 1 },
  { num: 60, den: 1 },
  { num: 24_000, den: 1001 },
  { num: 30_000, den: 1001 },
  { num: 60_000, den: 1001 },
  { num: 10, den: 1 },
  { num: 8, den: 1 },
];
/** How far a rate may be from a usual one, as a share: GIF writes hundredths of a second, WebP thousandths. */
const NEAR = 0.03;

export interface Unfolded {
  /** How many frames each picture is shown for. */
  repeats: number[];
  fps: FrameRate;
}

/**
 * Turns the time each picture shows into whole frames: programs that write animations merge equal neighbours into one
 * longer picture, and a reader has to take them apart again.
 * @param durations ms each picture shows
 */
export function unfoldDurations(durations: number[]): Unfolded {
  const shown = durations.filter((duration) => duration > 0).toSorted((a, b) => a - b);
  if (shown.length === 0) return { repeats: durations.map(() => 1), fps: RATES[0] };
  const unit = commonest(shown);
  const repeats = durations.map((duration) => Math.max(1, Math.round(duration / unit)));
  const frames = repeats.reduce((sum, repeat) => sum + repeat, 0);
  const total = durations.reduce((sum, duration) => sum + Math.max(0, duration), 0);
  return { repeats, fps: usualRate((1000 * frames) / total) };
}

/** The duration that most pictures have, neighbours a rounding apart taken together; the shortest of equals. */
function commonest(sorted: number[]): number {
  let best = { value: sorted[0], count: 0 };
  for (const value of sorted) {
    const alike = sorted.filter((other) => Math.abs(other - value) <= Math.max(1.01, 0.06 * value));
    if (alike.length > best.count) {
      best = { value: alike.reduce((sum, other) => sum + other, 0) / alike.length, count: alike.length };
    }
  }
  return best.value;
}

function usualRate(rate: number): FrameRate {
  const off = (usual: FrameRate): number => Math.abs(usual.num / usual.den / rate - 1);
  const near = RATES.filter((usual) => off(usual) <= NEAR).toSorted((a, b) => {
    const [x, y] = [off(a), off(b)];
    return Math.abs(x - y) < 0.0015 ? a.den - b.den : x - y;
  })[0];
  return near ?? { num: Math.max(1, Math.round(rate * 1000)), den: 1000 };
}
