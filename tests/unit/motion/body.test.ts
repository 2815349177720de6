import { describe, expect, it } from 'vitest';
import { balanceOf } from '../../../shared/motion/body.ts';
import type { BodyPoint, BodyPointName } from '../../../shared/motion/types.ts';
import { readMarks } from './factories.ts';

/** A body whose balance point flies a parabola while its limbs swing about it. */
function leap(names: readonly BodyPointName[], every = 1, bend = 0): BodyPoint[] {
  const offsets: Record<string, [number, number]> = {
    head: [0, -75],
    shoulder: [0, -50],
    hip: [0, 5],
    'shoulder-left': [-14, -50],
    'shoulder-right': [14, -50],
    'elbow-left': [-26, -28],
    'elbow-right': [26, -28],
    'wrist-left': [-30, -6],
    'wrist-right': [30, -6],
    'hip-left': [-9, 5],
    'hip-right': [9, 5],
    'knee-left': [-10, 45],
    'knee-right': [10, 45],
    'ankle-left': [-10, 85],
    'ankle-right': [10, 85],
    feet: [0, 85],
  };
  const out: BodyPoint[] = [];
  for (let frame = 1; frame <= 25; frame += every) {
    const u = frame - 1;
    const top = 12 + bend;
    const s = u < top ? (u - top) / top : (u - top) / (24 - top);
    for (const name of names) {
      const [dx, dy] = offsets[name]!;
      out.push({ frame, name, x: 100 + 20 * u + dx, y: 150 + 220 * s * s + dy });
    }
  }
  return out;
}

const ALL: BodyPointName[] = [
  'head',
  ...(['shoulder', 'elbow', 'wrist', 'hip', 'knee', 'ankle'] as const).flatMap((joint): BodyPointName[] => [
    `${joint}-left`,
    `${joint}-right`,
  ]),
];
const THREE: BodyPointName[] = ['head', 'hip', 'feet'];

describe('a body is read at its balance point', () => {
  it('and is true where that flies a parabola, with few points or many', () => {
    for (const names of [THREE, ALL]) {
      const reading = readMarks([], { frames: 25 }, { what: 'body', points: leap(names) });
      expect(reading.objects[0]).toMatchObject({ what: 'body', outcome: 'read' });
      expect(reading.objects[0]!.marks[0]!.origin).toBe('balance');
      expect(reading.findings).toEqual([]);
    }
  });

  it('also from points placed on every fourth frame and carried between them', () => {
    const reading = readMarks([], { frames: 25 }, { what: 'body', points: leap(THREE, 4) });
    expect(reading.objects[0]!.marks).toHaveLength(25);
    expect(reading.findings).toEqual([]);
  });

  it('with wider intervals from three points than from thirteen', () => {
    const [few, many] = [THREE, ALL].map(
      (names) =>
        readMarks([], { frames: 25 }, { what: 'body', points: leap(names) }).objects[0]!.flights[0]!.gravity.se,
    );
    expect(few!).toBeGreaterThan(1.5 * many!);
  });

  it('and a late apex of it is found', () => {
    const reading = readMarks([], { frames: 25 }, { what: 'body', points: leap(ALL, 1, 4) });
    expect(reading.findings.map((finding) => finding.kind)).toEqual(['apex-off-centre']);
  });

  it('follows a character with shares of its own', () => {
    const points = leap(ALL);
    const usual = balanceOf(points)!.marks[0]!;
    const bigHead = balanceOf(points, { head: 0.4 })!.marks[0]!;
    expect(bigHead.y).toBeLessThan(usual.y - 5);
  });
});

describe('a body without points', () => {
  it('is measured and shown, but nothing in it is called a fault', () => {
    const marks = leap(['hip'], 1, 5).map(({ frame, x, y }) => ({ frame, x, y, origin: 'import' as const }));
    const reading = readMarks(marks, {}, { what: 'body' });
    expect(reading.objects[0]!.outcome).toBe('not-judged');
    expect(reading.objects[0]!.flights[0]!.judged).toBe(false);
    expect(reading.findings).toEqual([]);
    expect(reading.cautions.join(' ')).toContain('place its points');
  });
});

describe('a drawn stream', () => {
  const arc = (power: number) =>
    Array.from({ length: 21 }, (_, i) => ({ x: 200 + 20 * i, y: 150 + 180 * Math.abs(i / 10 - 1) ** power }));
  const read = (power: number) =>
    readMarks([], { frames: 3 }, { what: 'stream', arcs: [1, 2, 3].map((frame) => ({ frame, points: arc(power) })) });

  it('is read for its shape, one arc a picture, without a claim on timing', () => {
    const reading = read(2);
    expect(reading.findings).toEqual([]);
    expect(reading.objects[0]!.flights).toHaveLength(3);
    expect(reading.objects[0]!.flights[0]).toMatchObject({ takeOff: null, landing: null });
    expect(reading.cautions.join(' ')).toContain('timing is not');
  });
  it('is called too straight where it is', () => {
    expect(read(1.3).findings.map((finding) => finding.kind)).toEqual(['too-straight', 'too-straight', 'too-straight']);
  });
});
