import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { agreed } from '../../../shared/motion/agree.ts';
import type { Measure, Reading } from '../../../shared/reading/document.ts';
import { bounceMarks, normalFrom, readMarks, throwMarks } from './factories.ts';

const plain = { takeOff: 3.4, landing: 23.4, frames: 27, height: 220, noise: 0.3 };
const late = (u: number, length: number) => {
  const top = 0.62 * length;
  return u < top ? (u * length) / 2 / top : length / 2 + ((u - top) * length) / 2 / (length - top);
};

const off: Measure = {
  name: 'apex-time',
  value: 0.6,
  low: 0.58,
  high: 0.62,
  expected: 0.5,
  tolerance: 0.025,
  verdict: 'off',
  kind: 'apex-off-centre',
};

describe('measures and findings agree', () => {
  it('keeps a measure off that a finding of its kind carries', () => {
    expect(agreed([off], [{ kind: 'apex-off-centre' }])).toEqual([off]);
  });
  it('keeps it off beside another fault of the shape', () => {
    expect(agreed([off], [{ kind: 'hang' }])).toEqual([off]);
  });
  it.each([[[]], [[{ kind: 'pop' as const }]]])(
    'cannot tell without one, and the interval reaches the expected',
    (findings) => {
      expect(agreed([off], findings)).toEqual([{ ...off, low: 0.5, verdict: 'cannot-tell', kind: null }]);
    },
  );
  it('lets a single drawing be carried by any finding of the flight', () => {
    const drawing: Measure = { ...off, name: 'off-arc', expected: 0, kind: 'pop' };
    expect(agreed([drawing], [{ kind: 'held-frame' }])).toEqual([drawing]);
  });
  it('on any track: nothing is off in a flight without a finding, and no finding ends before it begins', () => {
    const uncarried = (reading: Reading) =>
      reading.objects.flatMap((object) =>
        object.flights
          .filter((flight) => !reading.findings.some((finding) => finding.flight === flight.id))
          .flatMap((flight) => flight.measures.filter((measure) => measure.verdict === 'off')),
      );
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 1e6 }),
        fc.array(fc.double({ min: 2.5, max: 14, noNaN: true }), { minLength: 1, maxLength: 4 }),
        fc.double({ min: 0, max: 9, noNaN: true }),
        fc.double({ min: 0, max: 2, noNaN: true }),
        (seed, lengths, speed, noise) => {
          const frames = Math.ceil(lengths.reduce((sum, one) => sum + one, 6));
          const normal = normalFrom(seed);
          const marks = bounceMarks({ start: 3.3, lengths, gravity: 5, frames, speed, noise, seed }).map((mark) =>
            mark.frame % 9 === seed % 9 ? { ...mark, x: mark.x + 20 * normal(), y: mark.y + 20 * normal() } : mark,
          );
          const reading = readMarks(marks);
          expect(uncarried(reading)).toEqual([]);
          for (const finding of reading.findings) expect(finding.fromFrame).toBeLessThanOrEqual(finding.toFrame);
        },
      ),
      { numRuns: 150, seed: 11 },
    );
  });
});

describe('a measure that a flight is too short or too small for', () => {
  it('is left out of a flight of four drawings', () => {
    const marks = bounceMarks({ start: 3.3, lengths: [14, 3.6], gravity: 6, frames: 21, noise: 0.3 });
    const names = readMarks(marks).objects[0]!.flights[1]!.measures.map((measure) => measure.name);
    expect(names).toContain('gravity');
    for (const name of ['exponent-rise', 'quarter-drop-after', 'apex-time', 'path-steps', 'across-drift', 'off-arc']) {
      expect(names).not.toContain(name);
    }
  });
  it('is left out across where a thing goes straight up and down', () => {
    const names = readMarks(throwMarks({ ...plain, speed: 0 })).objects[0]!.flights[0]!.measures.map((one) => one.name);
    expect(names).toContain('exponent-rise');
    expect(names).not.toContain('across-drift');
  });
  it('stays within what a drop can be: every quarter drop lies between the ends of its interval, near a quarter', () => {
    const { measures } = readMarks(throwMarks(plain)).objects[0]!.flights[0]!;
    const quarters = measures.filter((measure) => measure.name.startsWith('quarter-drop'));
    expect(quarters).toHaveLength(2);
    for (const one of quarters) {
      expect(one.low).toBeLessThan(one.value);
      expect(one.value).toBeLessThan(one.high);
      expect(Math.abs(one.value - 0.25)).toBeLessThan(0.02);
    }
  });
});

describe('the drift across', () => {
  const driftOf = (reading: Reading) =>
    reading.objects[0]!.flights[0]!.measures.find((measure) => measure.name === 'across-drift')!;
  it('is nothing where a flight with a late apex is drawn even across', () => {
    const reading = readMarks(throwMarks({ ...plain, warpY: late }));
    expect(reading.findings).toMatchObject([{ kind: 'apex-off-centre' }]);
    const drift = driftOf(reading);
    expect(drift.verdict).toBe('true');
    expect(Math.abs(drift.value)).toBeLessThan(0.03);
  });
  it('has its own sign and size where that flight also slows across', () => {
    // A scale holds at one distance from the camera: the flight is read flat.
    const scale = { pxPerMetre: (4.4 * 24 ** 2) / 9.80665 };
    const slows = (u: number, length: number) => u - (0.04 * u * (u - length)) / length;
    const drift = driftOf(readMarks(throwMarks({ ...plain, noise: 0.1, warpY: late, warpX: slows }), { scale }));
    expect(Math.abs(drift.value + 0.08)).toBeLessThan(0.02);
  });
});
