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
  return drawings;
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
    let sum = 0;
    for (const mark of drawing.marks) sum += (mark.x - drawing.x) ** 2 + (mark.y - drawing.y) ** 2;
    squares.push({ sum, freedom: 2 * (drawing.weight - 1) });
  }
  squares.sort((a, b) => a.sum / a.freedom - b.sum / b.freedom);
  const kept = squares.slice(0, Math.ceil(squares.length * 0.85));
  return kept.reduce((all, one) => ({ sum: all.sum + one.sum, freedom: all.freedom + one.freedom }), {
    sum: 0,
    freedom: 0,
  });
}
