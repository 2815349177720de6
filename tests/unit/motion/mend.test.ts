import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { bounceMarks, mended, onHold, readMarks, throwMarks } from './factories.ts';

type Warp = (u: number, length: number) => number;
const side = (u: number, length: number, curve: (s: number) => number) => {
  const s = (2 * u) / length - 1;
  return (length / 2) * (1 + Math.sign(s) * curve(Math.abs(s)));
};

/** A warp of time for each kind of shape fault, by its size. */
const WARPS: Record<string, (size: number) => { warpX?: Warp; warpY?: Warp }> = {
  apex: (size) => ({
    warpY: (u, length) => {
      const top = (0.5 + 0.2 * size) * length;
      return u < top ? (u * length) / 2 / top : length / 2 + ((u - top) * length) / 2 / (length - top);
    },
  }),
  straight: (size) => ({ warpY: (u, length) => side(u, length, (s) => s ** (1 - 0.35 * Math.abs(size))) }),
  hang: (size) => ({
    warpY: (u, length) => {
      const held = 2 + 3 * Math.abs(size);
      const inner = u < (length - held) / 2 ? u : Math.max((length - held) / 2, u - held);
      return (inner * length) / (length - held);
    },
  }),
  ease: (size) => ({ warpX: (u, length) => u + (0.6 * size * u * (u - length)) / length }),
  even: (size) => {
    const warp: Warp = (u, length) => {
      const strength = Math.abs(size);
      return side(u, length, (s) => (1 - strength) * s + strength * Math.sqrt(s));
    };
    return { warpX: warp, warpY: warp };
  },
};

describe('a mend applied mends', () => {
  it('on any faulty flight: reading it again gives no finding', () => {
    let found = 0;
    fc.assert(
      fc.property(
        fc.constantFrom(...Object.keys(WARPS)),
        fc.double({ min: 0.4, max: 1, noNaN: true }),
        fc.boolean(),
        fc.constantFrom(1, 2),
        fc.integer({ min: 1, max: 1e6 }),
        fc.double({ min: 18, max: 30, noNaN: true }),
        (kind, size, negative, hold, seed, length) => {
          const marks = throwMarks({
            takeOff: hold === 2 ? 3 : 3.2,
            landing: hold === 2 ? 3 + 2 * Math.round(length / 2) : 3.2 + length,
            frames: Math.ceil(length) + 8,
            height: 230,
            noise: 0.2,
            seed,
            ...WARPS[kind]!(negative ? -size : size),
          });
          const drawn = hold === 2 ? onHold(marks, 2) : marks;
          const reading = readMarks(drawn, { hold: hold as 1 | 2 });
          found += reading.findings.length;
          const again = readMarks(mended(drawn, reading, hold), { hold: hold as 1 | 2 });
          expect(again.findings.map((finding) => finding.kind)).toEqual([]);
        },
      ),
      { numRuns: 300, seed: 11 },
    );
    expect(found).toBeGreaterThan(260);
  });

  it('among bounces whose gravity changes', () => {
    const marks = bounceMarks({
      start: 3.3,
      lengths: [14.5, 13.5, 11],
      gravity: 6,
      gravities: [6, 3.9, 6],
      frames: 46,
      noise: 0.2,
    });
    const reading = readMarks(marks);
    expect(reading.findings).toHaveLength(1);
    expect(readMarks(mended(marks, reading)).findings).toEqual([]);
  });

  it('after a rebound that gains height', () => {
    const marks = bounceMarks({ start: 3.3, lengths: [12, 14.2], gravity: 6, frames: 34, noise: 0.2 });
    const reading = readMarks(marks);
    expect(reading.findings).toHaveLength(1);
    expect(readMarks(mended(marks, reading)).findings).toEqual([]);
  });

  it('after a drawing held too long', () => {
    const clean = throwMarks({ takeOff: 3.4, landing: 23.4, frames: 27, height: 220, noise: 0.2 });
    const marks = clean.map((mark, i) => (i >= 8 ? { ...mark, x: clean[i - 1]!.x, y: clean[i - 1]!.y } : mark));
    const reading = readMarks(marks);
    expect(reading.findings).toHaveLength(1);
    expect(readMarks(mended(marks, reading)).findings).toEqual([]);
  });

  it('moves whole drawings: on twos every second frame, with a timing chart between extremes', () => {
    const marks = onHold(throwMarks({ takeOff: 3, landing: 31, frames: 36, height: 230, ...WARPS.apex!(1) }), 2);
    const [finding] = readMarks(marks, { hold: 2 }).findings;
    expect(finding!.mend.every((move) => move.frame % 2 === 1)).toBe(true);
    const [up, down] = finding!.chart;
    expect(up!.ticks.every((tick, i) => tick > (up!.ticks[i - 1] ?? 0) && tick < 1)).toBe(true);
    expect(down!.from).toBe(up!.to);
  });

  it('keeps take-off and landing', () => {
    const marks = throwMarks({ takeOff: 3, landing: 25, frames: 28, height: 230, ...WARPS.straight!(1) });
    const [finding] = readMarks(marks).findings;
    expect(finding!.mend.every((move) => move.frame > 3 && move.frame < 25)).toBe(true);
  });
});
