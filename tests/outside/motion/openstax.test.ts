import { describe, expect, it } from 'vitest';
import type { FrameRate, Mark } from '../../../shared/reading/document.ts';
import { readMarks } from '../../unit/motion/factories.ts';

// Source of every case: OpenStax University Physics Volume 1, section 4.3 (UP1), and OpenStax College Physics 2e, section 3.4
// (CP), CC BY 4.0, as collected in the shelf's methods, section 2. Published answers are rounded; the tolerance is one in the
// last printed digit. Gravity there is 9.80 m/s².
const G = 9.8;

interface Launch {
  speed: number;
  /** Degrees above the horizon. */
  angle: number;
  /** Seconds in the air. */
  air: number;
  gravity?: number;
}

/** Marks of a launch as a camera sees it, at a scale that fits the picture, and the reading of them in seconds and metres. */
function shoot({ speed, angle, air, gravity = G }: Launch, fps: FrameRate) {
  const rate = fps.num / fps.den;
  const vx = speed * Math.cos((angle * Math.PI) / 180);
  const vy = speed * Math.sin((angle * Math.PI) / 180);
  const pxPerMetre =
    800 / Math.max(vx * air, (vy * vy) / (2 * gravity) + 1, Math.abs(vy * air - 0.5 * gravity * air * air));
  const samples = Math.max(12, Math.floor(air * rate));
  const slow = Math.max(1, Math.floor((air * rate) / samples));
  const marks: Mark[] = [];
  for (let frame = 1; (frame - 1) / rate <= air + 1e-9; frame += slow) {
    const t = (frame - 1) / rate;
    const height = vy * t - 0.5 * gravity * t * t;
    marks.push({ frame, x: 80 + vx * t * pxPerMetre, y: 600 - height * pxPerMetre, origin: 'import' });
  }
  const reading = readMarks(marks, { fps, scale: { pxPerMetre }, gravity, width: 0, height: 0 });
  const flight = reading.objects[0]!.flights[0]!;
  const g = flight.gravity.metric!.value;
  const across = (flight.across.value * rate) / pxPerMetre;
  const apex = flight.apex && {
    seconds: (flight.apex.frame - 1) / rate,
    height: (600 - flight.apex.y) / pxPerMetre,
    across: (flight.apex.x - 80) / pxPerMetre,
  };
  const up = apex ? g * apex.seconds : 0;
  return { reading, flight, g, across, apex, up };
}

describe.each([
  ['24', { num: 24, den: 1 }],
  ['24000/1001', { num: 24000, den: 1001 }],
])('at %s frames a second', (_, fps) => {
  it('UP1 Example 4.7, CP Example 3.4: fireworks, 70.0 m/s at 75.0°', () => {
    const { apex, g, up, reading } = shoot({ speed: 70, angle: 75, air: 9 }, fps);
    expect(reading.findings).toEqual([]);
    expect(g).toBeCloseTo(9.8, 3);
    expect(Math.abs(up - 67.6)).toBeLessThan(0.1);
    expect(Math.abs(apex!.height - 233)).toBeLessThan(1);
    expect(Math.abs(apex!.seconds - 6.9)).toBeLessThan(0.01);
    expect(Math.abs(apex!.across - 125)).toBeLessThan(1);
    expect(Math.abs(Math.hypot(apex!.height, apex!.across) - 264)).toBeLessThan(1);
  });

  it('UP1 Check 4.3: a rock thrown level at 15.0 m/s from 100.0 m strikes at 46.8 m/s, 71.3° below the horizon', () => {
    const air = Math.sqrt((2 * 100) / G);
    const { g, across } = shoot({ speed: 15, angle: 0, air }, fps);
    const down = g * air;
    expect(Math.abs(down - 44.3)).toBeLessThan(0.1);
    expect(Math.abs(Math.hypot(down, across) - 46.8)).toBeLessThan(0.1);
    expect(Math.abs((Math.atan2(down, across) * 180) / Math.PI - 71.3)).toBeLessThan(0.1);
  });

  it('UP1 Example 4.8: a tennis ball at 30 m/s and 45° is caught 10 m higher after 3.79 s at 26.5 m/s, 36.9° below', () => {
    const { g, across, apex } = shoot({ speed: 30, angle: 45, air: 3.7909 }, fps);
    const air = apex!.seconds + Math.sqrt((2 * (apex!.height - 10)) / g);
    const down = g * (air - apex!.seconds);
    expect(Math.abs(air - 3.79)).toBeLessThan(0.01);
    expect(Math.abs(2 * apex!.seconds - air - 0.54)).toBeLessThan(0.01);
    expect(Math.abs(down - 15.9)).toBeLessThan(0.1);
    expect(Math.abs(Math.hypot(down, across) - 26.5)).toBeLessThan(0.1);
    expect(Math.abs((Math.atan2(down, across) * 180) / Math.PI - 36.9)).toBeLessThan(0.1);
  });

  it.each([
    [30, 31.9, 0.58, 0.0064],
    [70, 37.0, 2.75, 0.0306],
  ])('UP1 Example 4.9: a golf ball over 90.0 m on the level at %i° leaves at %f m/s', (angle, speed, first, second) => {
    const exact = Math.sqrt((90 * G) / Math.sin((2 * angle * Math.PI) / 180));
    const air = (2 * exact * Math.sin((angle * Math.PI) / 180)) / G;
    const { g, across, up } = shoot({ speed: exact, angle, air }, fps);
    expect(Math.abs(Math.hypot(across, up) - speed)).toBeLessThan(0.1);
    expect(Math.abs(up / across - first)).toBeLessThan(0.01);
    expect(Math.abs(g / (2 * across ** 2) - second)).toBeLessThan(0.0001);
  });

  it('CP Example 3.5: a volcano rock at 25.0 m/s and 35.0° lands 20.0 m lower after 3.96 s at 31.9 m/s, 50.1° below', () => {
    const { g, across, apex } = shoot({ speed: 25, angle: 35, air: 3.9577 }, fps);
    const air = apex!.seconds + Math.sqrt((2 * (apex!.height + 20)) / g);
    const down = g * (air - apex!.seconds);
    expect(Math.abs(air - 3.96)).toBeLessThan(0.01);
    expect(Math.abs(Math.hypot(down, across) - 31.9)).toBeLessThan(0.1);
    expect(Math.abs((Math.atan2(down, across) * 180) / Math.PI - 50.1)).toBeLessThan(0.1);
  });

  it('UP1 problem: launched at 30°, on the level again after 20 s: 196 m/s, 490 m high, 3394 m far, (2550, 368) m at 15 s', () => {
    const { g, across, up, apex } = shoot({ speed: 196, angle: 30, air: 20 }, fps);
    expect(Math.abs(Math.hypot(across, up) - 196)).toBeLessThan(1);
    expect(Math.abs(apex!.height - 490)).toBeLessThan(1);
    expect(Math.abs(2 * apex!.seconds * across - 3394)).toBeLessThan(1.5);
    expect(Math.abs(across * 15 - 2550)).toBeLessThan(10);
    expect(Math.abs(up * 15 - 0.5 * g * 225 - 368)).toBeLessThan(1);
  });

  it('UP1 problem: a rock at 30 m/s and 53° from a 100 m cliff rises 29.3 m in 2.4 s and travels 136.44 m in 7.58 s', () => {
    const { g, across, up, apex } = shoot({ speed: 30, angle: 53, air: 7.58 }, fps);
    expect(Math.abs(apex!.height - 29.3)).toBeLessThan(0.1);
    expect(Math.abs(apex!.seconds - 2.4)).toBeLessThan(0.1);
    expect(Math.abs(apex!.across - 43.2)).toBeLessThan(1);
    const air = apex!.seconds + Math.sqrt((2 * (apex!.height + 100)) / g);
    expect(Math.abs(air - 7.58)).toBeLessThan(0.01);
    expect(Math.abs(across * air - 136.44)).toBeLessThan(0.6);
    // Printed from a launch speed rounded to 24.0 m/s up, 0.04 m/s more than exact: 0.25 m after 6 s.
    for (const [t, height] of [
      [2, 28.4],
      [4, 17.6],
      [6, -32.4],
    ] as const) {
      expect(Math.abs(up * t - 0.5 * g * t * t - height)).toBeLessThan(0.25);
    }
  });

  it('UP1 problem: soccer at 15 m/s and 45° goes 60.8 m on Mars (3.7 m/s²) and 137.8 m on the Moon (g/6)', () => {
    for (const [gravity, range] of [
      [3.7, 60.8],
      [G / 6, 137.8],
    ] as const) {
      const air = (2 * 15 * Math.SQRT1_2) / gravity;
      const { g, across, apex } = shoot({ speed: 15, angle: 45, air, gravity }, fps);
      expect(g).toBeCloseTo(gravity, 3);
      expect(Math.abs(2 * apex!.seconds * across - range)).toBeLessThan(0.1);
    }
  });

  it('UP1 problem: a football at 23.0 m/s and 10° goes 18.5 m on the level', () => {
    const { apex, across } = shoot({ speed: 23, angle: 10, air: 0.815 }, fps);
    expect(Math.abs(2 * apex!.seconds * across - 18.5)).toBeLessThan(0.1);
  });

  it('UP1 problem: over a canyon of 69.0 m at 35.8 m/s the launch is 15.9°', () => {
    const { apex, across, up } = shoot({ speed: 35.8, angle: 15.92, air: 2 }, fps);
    expect(Math.abs((Math.atan2(up, across) * 180) / Math.PI - 15.9)).toBeLessThan(0.1);
    expect(Math.abs(2 * apex!.seconds * across - 69)).toBeLessThan(0.1);
  });
});

describe('at a thousand frames a second, for what is over within a blink', () => {
  const fps = { num: 1000, den: 1 };
  it('UP1 problem: a bullet fired level at 200 m/s from 1.5 m is in the air 0.55 s and goes 110 m', () => {
    const { g, across } = shoot({ speed: 200, angle: 0, air: 0.5533 }, fps);
    const air = Math.sqrt((2 * 1.5) / g);
    expect(Math.abs(air - 0.55)).toBeLessThan(0.01);
    expect(Math.abs(across * air - 110)).toBeLessThan(1);
  });
  it('UP1 problem: a dart at 10 m/s over 2.4 m flies 0.24 s and drops 0.28 m', () => {
    const { g, across } = shoot({ speed: 10, angle: 0, air: 0.24 }, fps);
    const air = 2.4 / across;
    expect(Math.abs(air - 0.24)).toBeLessThan(0.01);
    expect(Math.abs(0.5 * g * air * air - 0.28)).toBeLessThan(0.01);
  });
});
