import type { Hold, Mark } from '../reading/document.ts';

/** One drawing: the marks of all the frames that show it, taken together. Times are frames, positions px. */
export interface Drawing {
  /** Frame on which it first appears; that is the moment it stands for. */
  t: number;
  x: number;
  y: number;
  /** How many marks were averaged. */
  weight: number;
  /** Last frame that shows it. */
  last: number;
  marks: Mark[];
  /** True where its marks disagree far beyond noise and one of them was taken. */
  disputed?: boolean;
}

/** Marks of a track in order of frames: one a frame (the later one wins), only finite ones. */
export function orderedMarks(marks: readonly Mark[]): Mark[] {
  const byFrame = new Map<number, Mark>();
  for (const mark of marks) {
    if (Number.isFinite(mark.x) && Number.isFinite(mark.y) && Number.isFinite(mark.frame))
      byFrame.set(mark.frame, mark);
  }
  return [...byFrame.values()].sort((a, b) => a.frame - b.frame);
}

/**
 * Marks gathered into drawings. On twos and threes the exposures start at frames `phase`, `phase + hold`, …; with a mix they
 * start where `starts` says. A drawing whose marks disagree keeps them both: the reading weighs the mean of them.
 */
export function gatherDrawings(
  marks: readonly Mark[],
  hold: Hold,
  phase: number,
  starts: readonly number[],
): Drawing[] {
  const drawings: Drawing[] = [];
  let next = 0;
  for (const mark of marks) {
    let first = mark.frame;
    let last = mark.frame;
    if (hold === 'mixed') {
      while (next + 1 < starts.length && starts[next + 1]! <= mark.frame) next += 1;
      first = starts[next] ?? mark.frame;
      last = Math.max(mark.frame, (starts[next + 1] ?? mark.frame + 1) - 1);
    } else if (hold > 1) {
      first = phase + Math.floor((mark.frame - phase) / hold) * hold;
      last = first + hold - 1;
    }
    const current = drawings[drawings.length - 1];
    if (current && current.t === first) current.marks.push(mark);
    else drawings.push({ t: first, x: 0, y: 0, weight: 0, last, marks: [mark] });
  }
  for (const drawing of drawings) placeDrawing(drawing);
  settleDisputes(drawings);
  return drawings;
}

/** Marks of one drawing that disagree far beyond the others' noise: the one nearer to the drawings around it stands. */
function settleDisputes(drawings: Drawing[]): void {
  const spreads = drawings
    .filter((drawing) => drawing.weight > 1)
    .map((drawing) =>
      drawing.marks.reduce((sum, mark) => sum + (mark.x - drawing.x) ** 2 + (mark.y - drawing.y) ** 2, 0),
    )
    .sort((a, b) => a - b);
  const limit = Math.max(4, 8 * Math.sqrt((spreads[Math.floor(spreads.length / 2)] ?? 0) / 1.4));
  drawings.forEach((drawing, i) => {
    const [first, ...others] = drawing.marks;
    if (!first || !others.some((mark) => Math.hypot(mark.x - first.x, mark.y - first.y) > limit)) return;
    const around = [drawings[i - 1], drawings[i + 1]].filter((one) => one !== undefined);
    if (!around.length) return;
    const x = around.reduce((total, one) => total + one.x, 0) / around.length;
    const y = around.reduce((total, one) => total + one.y, 0) / around.length;
    const distance = (mark: Mark) => Math.hypot(mark.x - x, mark.y - y);
    const trusted = drawing.marks.reduce((best, mark) => (distance(mark) < distance(best) ? mark : best));
    drawing.x = trusted.x;
    drawing.y = trusted.y;
    drawing.weight = 1;
    drawing.disputed = true;
  });
}

/**
 * Drawings that stand out from the drawings around them: without them the path nearby is smooth, with them it is not.
 * Corners at contacts stay rough whichever drawing is taken out, so they are no suspects. `noise` is px per axis.
 */
export function suspects(drawings: readonly Drawing[], noise: number): number[] {
  const kept = drawings.map((_, i) => i);
  const out: number[] = [];
  const least = Math.max(6, 5 * noise);
  for (let round = 0; round < 3; round += 1) {
    const gains = kept.map((_, k) => gainWithout(drawings, kept, k, noise, least));
    const found = kept.filter(
      (_, k) => gains[k]! > 8 && gains.slice(Math.max(0, k - 4), k + 5).every((one) => one <= gains[k]!),
    );
    if (!found.length) break;
    out.push(...found);
    for (const i of found) kept.splice(kept.indexOf(i), 1);
  }
  return out;
}

/** How many times smoother the drawings around one are without it; 0 where it does not stand out by `least` px at all. */
function gainWithout(
  drawings: readonly Drawing[],
  kept: readonly number[],
  k: number,
  noise: number,
  least: number,
): number {
  const window = kept.slice(Math.max(0, k - 4), k + 5);
  if (window.length < 6) return 0;
  const rough = roughness(drawings, window);
  if (Math.sqrt(rough) <= least) return 0;
  const without = window.filter((i) => i !== kept[k]);
  return rough / (roughness(drawings, without) + 2 * without.length * noise * noise);
}

/** Sum of squared third differences of a run of drawings, each scaled to the noise of one drawing, px². */
function roughness(drawings: readonly Drawing[], run: readonly number[]): number {
  let sum = 0;
  for (let k = 3; k < run.length; k += 1) {
    const [a, b, c, d] = [drawings[run[k - 3]!]!, drawings[run[k - 2]!]!, drawings[run[k - 1]!]!, drawings[run[k]!]!];
    sum += thirdDifference(a, b, c, d, 'x') ** 2 + thirdDifference(a, b, c, d, 'y') ** 2;
  }
  return sum;
}

/** Third difference over unequal times, scaled so that noise of 1 px per drawing gives 1 px. */
export function thirdDifference(a: Drawing, b: Drawing, c: Drawing, d: Drawing, axis: 'x' | 'y'): number {
  const wa = 1 / ((a.t - b.t) * (a.t - c.t) * (a.t - d.t));
  const wb = 1 / ((b.t - a.t) * (b.t - c.t) * (b.t - d.t));
  const wc = 1 / ((c.t - a.t) * (c.t - b.t) * (c.t - d.t));
  const wd = 1 / ((d.t - a.t) * (d.t - b.t) * (d.t - c.t));
  const norm = Math.sqrt(wa * wa + wb * wb + wc * wc + wd * wd);
  return (wa * a[axis] + wb * b[axis] + wc * c[axis] + wd * d[axis]) / norm;
}

function placeDrawing(drawing: Drawing): void {
  const { marks } = drawing;
  drawing.weight = marks.length;
  drawing.x = marks.reduce((sum, mark) => sum + mark.x, 0) / marks.length;
  drawing.y = marks.reduce((sum, mark) => sum + mark.y, 0) / marks.length;
}

/** Noise per axis (px) as the marks of one drawing disagree about it, with the degrees of freedom behind it. */
export function replicateNoise(drawings: readonly Drawing[]): { sum: number; freedom: number } {
  const squares: { sum: number; freedom: number }[] = [];
  for (const drawing of drawings) {
    if (drawing.weight < 2) continue;
    const x = drawing.marks.reduce((total, mark) => total + mark.x, 0) / drawing.marks.length;
    const y = drawing.marks.reduce((total, mark) => total + mark.y, 0) / drawing.marks.length;
    let sum = 0;
    for (const mark of drawing.marks) sum += (mark.x - x) ** 2 + (mark.y - y) ** 2;
    squares.push({ sum, freedom: 2 * (drawing.weight - 1) });
  }
  squares.sort((a, b) => a.sum / a.freedom - b.sum / b.freedom);
  const kept = squares.slice(0, Math.ceil(squares.length * 0.85));
  return kept.reduce((all, one) => ({ sum: all.sum + one.sum, freedom: all.freedom + one.freedom }), {
    sum: 0,
    freedom: 0,
  });
}
