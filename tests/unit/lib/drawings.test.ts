import { describe, expect, it } from 'vitest';
import { arcAt } from '../../../src/lib/arcAt.ts';
import { drawingOn, drawingsOf } from '../../../src/lib/drawings.ts';

const mark = (frame: number, x = frame * 10, y = 100) => ({ frame, x, y, radius: 5, origin: 'found' as const });

describe('the drawings of a thing', () => {
  it('counts a drawing on twos once, and says how long it stands', () => {
    const marks = [1, 2, 3, 4, 5, 6].map((frame) => mark(frame));
    const drawings = drawingsOf({ marks }, { exposure: [1, 3, 5], frames: 6 });
    expect(drawings.map(({ frame, until }) => [frame, until])).toEqual([
      [1, 2],
      [3, 4],
      [5, 6],
    ]);
  });

  it('leaves out a drawing on which the thing is hidden, and finds one seen only on its second frame', () => {
    const drawings = drawingsOf({ marks: [mark(1), mark(6)] }, { exposure: [1, 3, 5], frames: 6 });
    expect(drawings.map((drawing) => drawing.frame)).toEqual([1, 5]);
    expect(drawings[1]!.x).toBe(60);
  });

  it('takes every mark as a drawing when nothing is known of the exposure', () => {
    expect(drawingsOf({ marks: [mark(4), mark(2)] }, { exposure: [], frames: 9 }).map((one) => one.frame)).toEqual([
      2, 4,
    ]);
  });

  it('finds the drawing shown on a held frame', () => {
    const drawings = drawingsOf({ marks: [mark(1), mark(3)] }, { exposure: [1, 3], frames: 4 });
    expect(drawingOn(drawings, 4)?.frame).toBe(3);
    expect(drawingOn(drawings, 5)).toBeUndefined();
  });
});

describe('a place on the true arc', () => {
  const fall = (frame: number) => ({ frame, x: 7 * frame, y: 3 * (frame - 9) ** 2 + 40 });
  const arc = [4, 6, 8, 10, 12].map(fall);

  it('is exact on a parabola between, on and beyond its points', () => {
    for (const frame of [3, 4, 7.25, 9, 11.9, 13]) {
      expect(arcAt(arc, frame)!.x).toBeCloseTo(fall(frame).x, 9);
      expect(arcAt(arc, frame)!.y).toBeCloseTo(fall(frame).y, 9);
    }
  });

  it('is unknown where there is no arc', () => {
    expect(arcAt([], 3)).toBeNull();
    expect(arcAt([fall(4)], 5)).toBeNull();
  });
});
