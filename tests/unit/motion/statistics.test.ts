import { describe, expect, it } from 'vitest';
import { fitQuadratic } from '../../../shared/motion/parabola.ts';
import type { Mark } from '../../../shared/reading/document.ts';
import { normalFrom, readMarks } from './factories.ts';

const RUNS = 2000;
const HEIGHT = 200;
const NOISE = 0.5;

/** A symmetric arc over n frames whose limits are the strip's own, with noise (methods 5). */
function arc(n: number, normal: () => number): Mark[] {
  return Array.from({ length: n }, (_, i) => {
    const k = i - (n - 1) / 2;
    return {
      frame: i + 1,
      x: 100 + 20 * i + NOISE * normal(),
      y: 200 + ((4 * HEIGHT) / (n - 1) ** 2) * k * k + NOISE * normal(),
      origin: 'import' as const,
    };
  });
}

const deviation = (values: number[]) => {
  const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
  return Math.sqrt(values.reduce((sum, value) => sum + (value - mean) ** 2, 0) / (values.length - 1));
};

describe.each([9, 13, 17, 25])('over %i frames', (n) => {
  const a = (8 * HEIGHT) / (n - 1) ** 2;
  const middle = (n + 1) / 2;
  const normal = normalFrom(100 + n);
  const bound = Math.sqrt((720 * NOISE ** 2) / (n * (n ** 2 - 1) * (n ** 2 - 4)));
  const flights = Array.from({ length: RUNS }, () => readMarks(arc(n, normal)).objects[0]!.flights[0]!);
  // The bound is that of one flat arc between the strip's own ends. A handful of two thousand noises look like something else
  // (depth, a contact near an end, a shape that bends gravity far off); they are counted first and left out after.
  const read = flights.filter(
    (flight) =>
      flight.model === 'flat' &&
      flight.takeOff === null &&
      flight.landing === null &&
      Math.abs(flight.gravity.value - a) < 8 * bound,
  );

  it('almost every flight is read as it is: one arc, flat, whole', () => {
    expect(read.length).toBeGreaterThan(0.99 * RUNS);
  });

  it('gravity scatters as the Cramér-Rao bound says: 720 s² / n(n²-1)(n²-4)', () => {
    expect(Math.abs(deviation(read.map((flight) => flight.gravity.value)) / bound - 1)).toBeLessThan(0.05);
  });

  it('the apex scatters as its bound says: [var(b1) + ta² var(a)] / a²', () => {
    const apexBound = Math.sqrt((12 * NOISE ** 2) / (n * (n ** 2 - 1))) / a;
    expect(Math.abs(deviation(read.map((flight) => flight.apex!.frame)) / apexBound - 1)).toBeLessThan(0.05);
  });

  it('95 % intervals of gravity and apex time cover 93 to 97 %', () => {
    const gravity = read.filter((flight) => {
      const measure = flight.measures.find((one) => one.name === 'gravity')!;
      return measure.low <= a && a <= measure.high;
    }).length;
    const centred = read.filter((flight) => {
      const measure = flight.measures.find((one) => one.name === 'apex-time')!;
      return measure.low <= 0.5 && 0.5 <= measure.high;
    }).length;
    for (const covered of [gravity, centred]) {
      expect(covered / read.length).toBeGreaterThan(0.93);
      expect(covered / read.length).toBeLessThan(0.97);
    }
    expect(read.every((flight) => Math.abs(flight.apex!.frame - middle) < 0.1)).toBe(true);
  });
});

describe('one exponent for rise and fall', () => {
  // Standard deviations of p by the published closed form's column c k² ln|k| (methods 5, table: H 200 px, s 0.5 px).
  it.each([
    [9, 0.012],
    [13, 0.01],
    [17, 0.009],
    [25, 0.008],
  ])('over %i frames scatters by %f', (n, published) => {
    const normal = normalFrom(500 + n);
    const half = (n - 1) / 2;
    const times = Array.from({ length: n }, (_, i) => i - half);
    const column = times.map((k) => (k === 0 ? 0 : k * k * Math.log(Math.abs(k))));
    const rest = residualOf(times, column);
    const norm = rest.reduce((sum, value) => sum + value * value, 0);
    const c = HEIGHT / half ** 2;
    const powers = Array.from({ length: RUNS }, () => {
      const y = times.map((k) => c * k * k + NOISE * normal());
      return 2 + rest.reduce((sum, value, i) => sum + value * y[i]!, 0) / norm / c;
    });
    expect(Math.abs(deviation(powers) - published)).toBeLessThan(0.05 * published + 0.0005);
    const reading = readMarks(arc(n, normal)).objects[0]!.flights[0]!;
    const rise = reading.measures.find((measure) => measure.name === 'exponent-rise')!;
    expect(rise.low).toBeLessThan(2 + 0.1);
    expect(rise.high).toBeGreaterThan(2 - 0.1);
  });
});

/** What a quadratic over the times leaves of a column. */
function residualOf(times: number[], column: number[]): number[] {
  const fit = fitQuadratic(times, column);
  return column.map((value, i) => {
    const u = (times[i]! - fit.middle) / fit.half;
    return value - fit.c0 - u * (fit.c1 + u * fit.c2);
  });
}
