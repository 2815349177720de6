import { describe, expect, it } from 'vitest';
import { laneScale, laneY, spacingOf, trueLines } from '../../../src/features/score/spacing.ts';
import { packRows } from '../../../src/features/score/rows.ts';
import { buildFlight, buildMarks, throwAt } from '../../support/readings.ts';

const frames = Array.from({ length: 21 }, (_, index) => index + 3);
const source = { exposure: [], frames: 25 };

describe('the spacing lanes', () => {
  it('shows a true throw as a flat row across and a straight ramp through zero up and down', () => {
    const object = { marks: buildMarks(frames), flights: [buildFlight(frames)] };
    const across = spacingOf(object, source, [], 'across').map((bar) => bar.drawn);
    for (const step of across) expect(step).toBeCloseTo(across[0]!, 9);
    const up = spacingOf(object, source, [], 'up').map((bar) => bar.drawn);
    const ramp = up.slice(1).map((step, index) => step - up[index]!);
    for (const change of ramp) expect(change).toBeCloseTo(ramp[0]!, 9);
    expect(up[0]).toBeGreaterThan(0);
    expect(up.at(-1)).toBeCloseTo(-up[0]!, 9);
  });

  it('puts the blue line where the bars of a true throw end', () => {
    const object = { marks: buildMarks(frames), flights: [buildFlight(frames)] };
    for (const bar of spacingOf(object, source, [], 'up')) expect(bar.drawn).toBeCloseTo(bar.true!, 9);
    const [line] = trueLines(spacingOf(object, source, [], 'up'));
    expect(line!.points).toHaveLength(20);
    expect(line!.points[0]!.frame).toBe(4);
  });

  it('counts px a frame on twos, not px a drawing, and lets the bar stand under both frames', () => {
    const twos = frames.filter((frame) => frame % 2 === 1);
    const object = { marks: buildMarks(twos), flights: [buildFlight(twos)] };
    const [bar] = spacingOf(object, { exposure: twos, frames: 24 }, [], 'across');
    expect(bar!.drawn).toBeCloseTo(throwAt(5).x - throwAt(4).x, 9);
    expect([bar!.frame, bar!.until]).toEqual([5, 6]);
  });

  it('shows a throw to the left as bars that stand up', () => {
    const marks = buildMarks(frames).map((mark) => ({ ...mark, x: 900 - mark.x }));
    const flight = buildFlight(frames);
    const left = {
      ...flight,
      across: { value: -flight.across.value, se: 0.1 },
      trueArc: flight.trueArc.map((point) => ({ ...point, x: 900 - point.x })),
    };
    expect(spacingOf({ marks, flights: [left] }, source, [], 'across').every((bar) => bar.drawn > 0)).toBe(true);
  });

  it('calls a bar off only where a finding speaks of it and it leaves its line', () => {
    const marks = buildMarks(frames).map((mark) => (mark.frame === 10 ? { ...mark, y: mark.y - 40 } : mark));
    const object = { marks, flights: [buildFlight(frames)] };
    const pop = { kind: 'pop' as const, flight: 'A1', fromFrame: 10, toFrame: 10 };
    const off = spacingOf(object, source, [pop], 'up').filter((bar) => bar.off);
    expect(off.map((bar) => bar.frame)).toEqual([10]);
    expect(spacingOf(object, source, [], 'up').some((bar) => bar.off)).toBe(false);
    expect(spacingOf(object, source, [{ ...pop, kind: 'across-uneven' }], 'up').some((bar) => bar.off)).toBe(false);
  });

  it('has no blue line outside a flight', () => {
    const object = { marks: buildMarks([1, 2, ...frames]), flights: [buildFlight(frames)] };
    const [first] = spacingOf(object, source, [], 'up');
    expect(first).toMatchObject({ frame: 2, true: null, flight: null });
  });
});

describe('the scale of a lane', () => {
  const bar = (drawn: number, should: number | null = drawn, flight: string | null = 'A1') => ({
    frame: 1,
    until: 1,
    drawn,
    true: should,
    flight,
    off: false,
  });

  it('keeps bars and blue line inside the lane', () => {
    const scale = laneScale([bar(40, 60), bar(-20, -30)], 100, 5);
    expect(laneY(scale, 60, 100)).toBeCloseTo(5, 9);
    expect(laneY(scale, -30, 100)).toBeCloseTo(95, 9);
    expect(scale.zero).toBeCloseTo(65, 9);
  });

  it('is not set by what happens outside flights', () => {
    const scale = laneScale([bar(40), bar(900, null, null)], 100, 5);
    expect(laneY(scale, 40, 100)).toBeCloseTo(5, 9);
    expect(laneY(scale, 900, 100)).toBe(0);
  });

  it('draws nothing, and divides by nothing, when nothing moves', () => {
    expect(laneScale([bar(0)], 100, 5)).toEqual({ zero: 95, perUnit: 0 });
    expect(laneScale([], 100, 5)).toEqual({ zero: 95, perUnit: 0 });
  });
});

describe('rows of labels', () => {
  it('share a row while they do not meet', () => {
    expect(
      packRows([
        { left: 0, right: 50 },
        { left: 60, right: 90 },
        { left: 40, right: 70 },
        { left: 96, right: 99 },
      ]),
    ).toEqual([0, 0, 1, 0]);
  });
});
