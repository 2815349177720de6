import { describe, expect, it } from 'vitest';
import {
  columnMiddle,
  frameAt,
  layColumns,
  MIN_COLUMN,
  scrollToSee,
  THUMB_COLUMN,
  visibleFrames,
} from '../../../src/features/score/columns.ts';

describe('the frame axis of the score', () => {
  it('shares the room between the frames of a short strip', () => {
    const columns = layColumns(25, 950);
    expect(columns.width).toBe(38);
    expect(columns.total).toBe(950);
    expect(columnMiddle(columns, 1)).toBe(19);
  });

  it('keeps a column readable and scrolls when there are many frames', () => {
    const columns = layColumns(400, 950);
    expect(columns.width).toBe(MIN_COLUMN);
    expect(columns.total).toBe(400 * MIN_COLUMN);
    expect(layColumns(25, 300, THUMB_COLUMN).width).toBe(THUMB_COLUMN);
  });

  it('knows the frame under a place, also beyond the ends', () => {
    const columns = layColumns(25, 950);
    expect([frameAt(columns, -10), frameAt(columns, 0), frameAt(columns, 38), frameAt(columns, 5000)]).toEqual([
      1, 1, 2, 25,
    ]);
  });

  it('draws only what is seen and a few columns beside it', () => {
    const columns = layColumns(400, 720);
    const seen = visibleFrames(columns, 100 * MIN_COLUMN, 720, 3);
    expect(seen.from).toBe(98);
    expect(seen.to).toBe(101 + Math.floor(720 / MIN_COLUMN) + 3);
    expect(visibleFrames(columns, 0, 720, 3).from).toBe(1);
  });

  it('scrolls to a frame only when it is out of sight, and leaves room beside it', () => {
    const columns = layColumns(400, 720);
    expect(scrollToSee(columns, 10, 0, 720)).toBeNull();
    const right = scrollToSee(columns, 60, 0, 720)!;
    expect(60 * MIN_COLUMN).toBeLessThanOrEqual(right + 720 - 2 * MIN_COLUMN);
    expect(scrollToSee(columns, 1, 900, 720)).toBe(0);
    expect(scrollToSee(columns, 400, 0, 720)).toBe(columns.total - 720);
  });
});
