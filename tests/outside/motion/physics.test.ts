import { describe, expect, it } from 'vitest';
import { balanceOf } from '../../../shared/motion/body.ts';
import type { BodyPoint, BodyPointName } from '../../../shared/motion/types.ts';
import { STANDARD_GRAVITY } from '../../../shared/motion/units.ts';
import type { Mark } from '../../../shared/reading/document.ts';
import { bounceMarks, readMarks, throwMarks } from '../../unit/motion/factories.ts';

const fall = (across: number): Mark[] =>
  Array.from({ length: 22 }, (_, i) => {
    const u = Math.max(0, i + 1 - 4);
    return { frame: i + 1, x: 100 + across * u, y: 60 + 0.5 * 1.6 * u * u, origin: 'import' as const };
  });

describe('gravity', () => {
  it('is 9.80665 m/s² (3rd CGPM 1901, declaration point 3), and what falls so is read so at any rate', () => {
    expect(STANDARD_GRAVITY).toBe(9.80665);
    for (const fps of [
      { num: 24, den: 1 },
      { num: 25, den: 1 },
      { num: 30, den: 1 },
      { num: 24000, den: 1001 },
    ]) {
      const pxPerMetre = 100;
      // Screen units: a = g * (px per metre) / fps² (methods, section 4); at 100 px/m 1.7025, 1.5691, 1.0896 px/f².
      const a = (9.80665 * pxPerMetre * fps.den ** 2) / fps.num ** 2;
      const marks = throwMarks({ takeOff: 3.4, landing: 27.4, frames: 31, height: (a * 24 ** 2) / 8 });
      const reading = readMarks(marks, { fps, scale: { pxPerMetre } });
      expect(reading.objects[0]!.flights[0]!.gravity.metric!.value).toBeCloseTo(9.80665, 3);
      expect(reading.findings).toEqual([]);
    }
  });
});

describe('a fall from rest (common practice, no source)', () => {
  const flight = readMarks(fall(0)).objects[0]!.flights[0]!;
  const at = (frame: number) => flight.trueArc.find((point) => point.frame === frame)!.y;

  it('goes 1 : 3 : 5 : 7 in equal times', () => {
    const first = at(8) - at(4);
    [3, 5, 7].forEach((times, i) => expect((at(12 + 4 * i) - at(8 + 4 * i)) / first).toBeCloseTo(times, 6));
  });
  it('has gone a quarter of its drop at half the time', () => {
    expect((at(12) - at(4)) / (at(20) - at(4))).toBeCloseTo(0.25, 6);
  });
  it('lands together with the same thing thrown level beside it', () => {
    const beside = readMarks(fall(14)).objects[0]!.flights[0]!;
    expect(beside.gravity.value).toBeCloseTo(flight.gravity.value, 6);
    expect(beside.takeOff!).toBeCloseTo(flight.takeOff!, 3);
  });
});

describe('a quarter of the drop at half the time (common practice, no source)', () => {
  it('is a measure of every arc, on both sides of its apex', () => {
    const { measures } = readMarks(throwMarks({ takeOff: 3.4, landing: 27.4, frames: 31, height: 220 })).objects[0]!
      .flights[0]!;
    for (const name of ['quarter-drop-before', 'quarter-drop-after']) {
      const measure = measures.find((one) => one.name === name)!;
      expect(measure.value).toBeCloseTo(0.25, 3);
      expect(measure.verdict).toBe('true');
    }
  });
});

describe('rebounds as the rules of sport ask for them', () => {
  const ratioOf = (drop: number, rebound: number) => {
    const gravity = 5;
    const first = 2 * Math.sqrt((2 * 160) / gravity);
    const second = first * Math.sqrt(rebound / drop);
    const marks = bounceMarks({
      start: 3.3,
      lengths: [first, second],
      gravity,
      frames: Math.ceil(first + second + 6),
      speed: 9,
    });
    const reading = readMarks(marks);
    expect(reading.findings).toEqual([]);
    return reading.objects[0]!.flights[1]!.measures.find((measure) => measure.name === 'rebound-height')!;
  };
  it.each([
    ['a tennis ball of type 2 (ITF technical page "Rebound")', 254, 135],
    ['the same ball, highest', 254, 147],
    ['a high-altitude tennis ball (ITF, same page)', 254, 122],
    ['a table tennis ball on steel (ITTF ball directive B.7, at second hand)', 305, 240],
    ['the same ball, highest', 305, 260],
    ['a table tennis table (laws, at second hand)', 30, 23],
    // The basketball rule measures the drop at the bottom of the ball and the rebound at its top: 0.24 m are taken off.
    ['a basketball (older international rule, secondary pages)', 180, 120 - 24],
    ['a football, Quality Pro (retailer page)', 200, 165],
  ])('%s: %i to %i', (_, drop, rebound) => {
    const measure = ratioOf(drop, rebound);
    expect(measure.value).toBeCloseTo(rebound / drop, 3);
    expect(measure.verdict).toBe('true');
  });
  it('height goes with the square of the period: e = T2 / T1 = √(H2 / H1) (methods, section 4)', () => {
    const marks = bounceMarks({ start: 3.3, lengths: [16, 12.4], gravity: 5, frames: 36 });
    const { measures } = readMarks(marks).objects[0]!.flights[1]!;
    const [height, period] = ['rebound-height', 'rebound-period'].map(
      (name) => measures.find((one) => one.name === name)!,
    );
    expect(period!.value ** 2).toBeCloseTo(height!.value, 3);
  });
});

describe('the balance point (Dempster 1955 as adapted by Winter; shares in methods, section 10)', () => {
  it('agrees with a computation by hand', () => {
    const places: Record<string, [number, number]> = {
      head: [100, 20],
      'shoulder-left': [90, 50],
      'shoulder-right': [110, 50],
      'elbow-left': [80, 80],
      'elbow-right': [120, 80],
      'wrist-left': [75, 105],
      'wrist-right': [125, 105],
      'hip-left': [94, 110],
      'hip-right': [106, 110],
      'knee-left': [92, 155],
      'knee-right': [108, 155],
      'ankle-left': [90, 200],
      'ankle-right': [110, 200],
    };
    const points = Object.entries(places).map(
      ([name, [x, y]]): BodyPoint => ({ frame: 1, name: name as BodyPointName, x, y }),
    );
    // By hand: 0.081·20 + 0.497·80 + 2·[0.028·(50+0.436·30) + 0.016·(80+0.43·25) + 0.006·105 + 0.1·(110+0.433·45)
    // + 0.0465·(155+0.433·45) + 0.0145·200] = 1.62 + 39.76 + 3.53248 + 2.904 + 1.26 + 25.897 + 16.227105 + 5.8
    expect(balanceOf(points)!.marks[0]!.y).toBeCloseTo(97.000585, 5);
    expect(balanceOf(points)!.marks[0]!.x).toBeCloseTo(100, 9);
  });
});
