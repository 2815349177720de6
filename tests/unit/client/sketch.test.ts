import { describe, expect, test } from 'vitest';
import { laneOf, mainObject, sketchSteps } from '../../../src/lib/sketchSpacing.ts';
import { sketchRegion } from '../../../src/lib/sketchRegion.ts';
import { buildFinding, buildSketch } from '../../support/wire.ts';

describe('the small lane of a card', () => {
  test('is a straight ramp through zero for a true arc, on its line at every bar', () => {
    const steps = sketchSteps(buildSketch(), 'up');
    expect(steps.map((step) => step.drawn)).toEqual([112, 80, 48, 16, -16, -48, -80, -112]);
    for (const step of steps) expect(step.true).toBeCloseTo(step.drawn, 6);
    expect(steps.every((step) => !step.off)).toBe(true);
  });

  test('is flat across, whichever side the thing flies to', () => {
    const sketch = buildSketch();
    const mirrored = buildSketch({ marks: sketch.marks.map((mark) => ({ ...mark, x: 640 - mark.x })) });
    expect(sketchSteps(sketch, 'across').map((step) => step.drawn)).toEqual(Array(8).fill(50));
    expect(sketchSteps(mirrored, 'across').map((step) => step.drawn)).toEqual(Array(8).fill(50));
  });

  test('counts a drawing that is held over frames once, at its speed', () => {
    const onTwos = buildSketch().marks.flatMap((mark) => {
      const frame = 2 + (mark.frame - 2) * 2;
      return [
        { ...mark, frame },
        { ...mark, frame: frame + 1 },
      ];
    });
    const steps = sketchSteps(buildSketch({ marks: onTwos, arcs: [] }), 'up');
    expect(steps.map((step) => step.drawn)).toEqual([56, 40, 24, 8, -8, -24, -40, -56]);
    expect(steps.every((step) => step.true === null)).toBe(true);
    expect(steps.map((step) => step.shownFor)).toEqual(Array(8).fill(2));
  });

  test('does not spread the first step over the rest before it, nor a step over frames it was not seen on', () => {
    const { marks } = buildSketch();
    const rest = [1, 0, -1, -2].map((frame) => ({ ...marks[0]!, frame }));
    expect(sketchSteps(buildSketch({ marks: [...rest, ...marks] }), 'up')[0]).toMatchObject({ frame: 3, drawn: 112 });
    const hidden = sketchSteps(buildSketch({ marks: marks.filter((mark) => mark.frame !== 4) }), 'up');
    expect(hidden[1]).toMatchObject({ frame: 5, drawn: 64 });
    expect(hidden[1]?.true).toBeCloseTo(64, 6);
  });

  test('marks the bars a finding speaks of where they leave the line, and no others', () => {
    const { marks } = buildSketch();
    // Frames 4 and 5 climb by the same amount; from 6 on every drawing is where it should be.
    const drawn = marks.map((mark) => (mark.frame === 4 ? { ...mark, y: mark.y + 16 } : mark));
    const sketch = buildSketch({ marks: drawn, findings: [buildFinding({ fromFrame: 2, toFrame: 8 })] });
    expect(
      sketchSteps(sketch, 'up')
        .filter((step) => step.off)
        .map((step) => step.frame),
    ).toEqual([4, 5]);
    const elsewhere = buildSketch({ marks: drawn, findings: [buildFinding({ fromFrame: 7, toFrame: 10 })] });
    expect(sketchSteps(elsewhere, 'up').some((step) => step.off)).toBe(false);
  });

  test('leaves bars grey that another lane speaks of', () => {
    const { marks } = buildSketch();
    const drawn = marks.map((mark) => (mark.frame === 4 ? { ...mark, y: mark.y + 16 } : mark));
    const across = buildSketch({ marks: drawn, findings: [buildFinding({ kind: 'across-uneven', toFrame: 8 })] });
    expect(sketchSteps(across, 'up').some((step) => step.off)).toBe(false);
    const pop = buildSketch({ marks: drawn, findings: [buildFinding({ kind: 'pop', toFrame: 8 })] });
    expect(sketchSteps(pop, 'up').some((step) => step.off)).toBe(true);
  });

  test('judges no step that a contact cuts', () => {
    const { arcs } = buildSketch();
    const points = arcs[0]!.points.slice(0, -1);
    const landing = { frame: 9.5, x: 475, y: 84 + 3.5 ** 2 * 16 };
    const sketch = buildSketch({
      arcs: [{ ...arcs[0]!, points: [...points, landing] }],
      findings: [buildFinding({ toFrame: 10 })],
    });
    expect(sketchSteps(sketch, 'up').at(-1)).toMatchObject({ frame: 10, true: null, off: false });
  });

  test('is the lane of the first finding', () => {
    expect(laneOf(buildSketch())).toBe('up');
    expect(laneOf(buildSketch({ findings: [buildFinding({ kind: 'across-uneven' })] }))).toBe('across');
  });

  test('follows the thing with the most marks', () => {
    const other = { object: 'B', frame: 3, x: 10, y: 10 };
    expect(mainObject(buildSketch({ marks: [other, ...buildSketch().marks] }))).toBe('A');
    expect(mainObject(buildSketch({ marks: [] }))).toBeNull();
    expect(sketchSteps(buildSketch({ marks: [], arcs: [] }), 'up')).toEqual([]);
  });
});

describe('the part of the picture a card shows', () => {
  test('holds every mark with room around, inside the picture', () => {
    const region = sketchRegion(buildSketch());
    expect(region.x).toBeLessThan(100);
    expect(region.x + region.width).toBeGreaterThan(500);
    expect(region.y).toBeGreaterThanOrEqual(0);
    expect(region.y + region.height).toBeLessThanOrEqual(400);
  });

  test('is the whole picture when nothing was found', () => {
    expect(sketchRegion(buildSketch({ marks: [], arcs: [] }))).toEqual({ x: 0, y: 0, width: 640, height: 400 });
  });
});
