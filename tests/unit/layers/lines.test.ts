import { describe, expect, it } from 'vitest';
import {
  arrowHead,
  drawingsUnder,
  mendArrows,
  moveInWords,
  quarterDrop,
  trueApex,
} from '../../../src/features/layers/lines.ts';
import { buildFlight, throwAt } from '../../support/readings.ts';

const frames = Array.from({ length: 21 }, (_, index) => index + 3);
const drawing = (frame: number, until = frame) => ({ frame, until, x: 100, y: 200, radius: 5 });

describe('a mend in words', () => {
  it('says up and down as the eye sees them, the larger move first', () => {
    expect(moveInWords(1.2, -84.3)).toBe('up 84, right 1');
    expect(moveInWords(-12, 3)).toBe('left 12, down 3');
    expect(moveInWords(0.3, 0.2)).toBe('stay');
  });
});

describe('the arrows of a mend', () => {
  it('lead from the drawing as it is to where it should be', () => {
    expect(mendArrows([{ frame: 7, dx: 5, dy: -9 }], [drawing(7)])).toEqual([
      { frame: 7, from: { x: 100, y: 200 }, to: { x: 105, y: 191 }, words: 'up 9, right 5' },
    ]);
  });

  it('find the drawing that is held on the frame, and leave out a hidden one and one that stays', () => {
    expect(mendArrows([{ frame: 8, dx: 5, dy: 0 }], [drawing(7, 8)])[0]!.frame).toBe(7);
    expect(mendArrows([{ frame: 12, dx: 5, dy: 0 }], [drawing(7, 8)])).toEqual([]);
    expect(mendArrows([{ frame: 7, dx: 0.1, dy: 0 }], [drawing(7)])).toEqual([]);
  });

  it('end in a head that is never longer than the arrow', () => {
    expect(arrowHead({ x: 0, y: 0 }, { x: 0, y: -4 }, 10).shaftEnd.y).toBeCloseTo(0, 12);
    expect(arrowHead({ x: 0, y: 0 }, { x: 0, y: -40 }, 10).shaftEnd).toEqual({ x: 0, y: -30 });
  });
});

describe('the drawings under a finding', () => {
  it('count a held drawing that reaches into its frames', () => {
    const drawings = [drawing(1, 2), drawing(3, 4), drawing(5, 6)];
    expect(drawingsUnder({ fromFrame: 4, toFrame: 5 }, drawings).map((one) => one.frame)).toEqual([3, 5]);
  });
});

describe('the quarter drop', () => {
  const { trueArc } = buildFlight(frames);

  it('finds the apex of the true arc between drawings too', () => {
    const odd = frames.filter((frame) => frame % 2 === 0).map((frame) => ({ frame, ...throwAt(frame) }));
    expect(trueApex(odd)!.frame).toBeCloseTo(13, 1);
    expect(trueApex(odd)!.y).toBeCloseTo(100, 1);
  });

  it('lies a quarter of the way down, halfway in time on both sides', () => {
    const quarter = quarterDrop(trueArc)!;
    expect(quarter.quarterY).toBeCloseTo(100 + 330 / 4, 6);
    expect(quarter.sides).toHaveLength(2);
    for (const side of quarter.sides) expect(side.half.y).toBeCloseTo(quarter.quarterY, 6);
  });

  it('speaks only of a side that is long enough', () => {
    expect(quarterDrop(trueArc.filter((point) => point.frame >= 13))!.sides).toHaveLength(1);
    expect(quarterDrop([])).toBeNull();
  });
});
