import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Hold } from '../../../shared/reading/document.ts';
import { readingSchema } from '../../../shared/reading/document.ts';
import { bounceMarks, mended, normalFrom, onHold, readMarks, throwMarks } from './factories.ts';

const plain = { takeOff: 3.4, landing: 23.4, frames: 27, height: 220, noise: 0.3 };

describe('a true throw', () => {
  const reading = readMarks(throwMarks(plain));
  const flight = reading.objects[0]!.flights[0]!;

  it('has no finding', () => {
    expect(reading.findings).toEqual([]);
  });
  it('takes off and lands between frames', () => {
    expect(flight.takeOff).toBeCloseTo(3.4, 1);
    expect(flight.landing).toBeCloseTo(23.4, 1);
  });
  it('has its apex halfway and bends by 8 H / T²', () => {
    expect(flight.apex!.frame).toBeCloseTo(13.4, 1);
    expect(flight.gravity.value).toBeCloseTo((8 * 220) / 400, 1);
  });
  it('is a valid document', () => {
    expect(() => readingSchema.parse(reading)).not.toThrow();
  });
  it('says of every measure that it is true or cannot be told', () => {
    expect(flight.measures.map((measure) => measure.verdict)).not.toContain('off');
  });
});

describe('the same throw elsewhere', () => {
  it('reads the same a million pixels away at frame 100,000', () => {
    const near = readMarks(throwMarks(plain)).objects[0]!.flights[0]!;
    const marks = throwMarks(plain).map((mark) => ({
      ...mark,
      frame: mark.frame + 100_000,
      x: mark.x + 1e6,
      y: mark.y - 1e6,
    }));
    const reading = readMarks(marks);
    const far = reading.objects[0]!.flights[0]!;
    expect(reading.findings).toEqual([]);
    expect(far.takeOff! - 100_000).toBeCloseTo(near.takeOff!, 3);
    expect(far.gravity.value).toBeCloseTo(near.gravity.value, 3);
    expect(far.apex!.y + 1e6).toBeCloseTo(near.apex!.y, 2);
  });
});

const late = (u: number, length: number) => {
  const top = 0.62 * length;
  return u < top ? (u * length) / 2 / top : length / 2 + ((u - top) * length) / 2 / (length - top);
};
const straight = (u: number, length: number) => {
  const s = (2 * u) / length - 1;
  return (length / 2) * (1 + Math.sign(s) * Math.abs(s) ** 0.65);
};
const held = (u: number, length: number) => {
  const moving = length - 4;
  const inner = u < moving / 2 ? u : Math.max(moving / 2, u - 4);
  return (inner * length) / moving;
};
const eased = (u: number, length: number) => u + (0.5 * u * (u - length)) / length;
const even = (u: number, length: number) => {
  const s = (2 * u) / length - 1;
  return (length / 2) * (1 + Math.sign(s) * Math.sqrt(Math.abs(s)));
};

describe('one fault gives one finding, named as an animator would', () => {
  const cases: [string, Partial<Parameters<typeof throwMarks>[0]>, string, string][] = [
    ['a late apex', { warpY: late }, 'apex-off-centre', 'Apex sits late'],
    ['straight sides', { warpY: straight }, 'too-straight', 'Rise and fall are too even'],
    ['a hold at the top', { warpY: held }, 'hang', 'Hangs at the top'],
    ['a drift across', { warpX: eased }, 'across-uneven', 'Speeds up across'],
    ['equal steps', { warpX: even, warpY: even }, 'spacing-off-path', 'Spacing is too even along the arc'],
  ];
  it.each(cases)('%s', (_, warp, kind, title) => {
    const reading = readMarks(throwMarks({ ...plain, ...warp }), { firstFrame: 1001 });
    expect(reading.findings.map((finding) => finding.kind)).toEqual([kind]);
    expect(reading.findings[0]!.title).toBe(title);
    expect(reading.findings[0]!.severity).toBe('strong');
    expect(reading.findings[0]!.mend.length).toBeGreaterThan(3);
  });

  it('a popped drawing', () => {
    const marks = throwMarks(plain).map((mark) =>
      mark.frame === 9 ? { ...mark, x: mark.x + 9, y: mark.y - 6 } : mark,
    );
    const [finding, ...others] = readMarks(marks, { firstFrame: 1001 }).findings;
    expect(others).toEqual([]);
    expect(finding).toMatchObject({ kind: 'pop', fromFrame: 9, toFrame: 9 });
    expect(finding!.detail).toContain('1009');
  });

  it('a repeated drawing, with everything after it late', () => {
    const clean = throwMarks(plain);
    const marks = clean.map((mark, i) => (i >= 8 ? { ...mark, x: clean[i - 1]!.x, y: clean[i - 1]!.y } : mark));
    expect(readMarks(marks).findings).toMatchObject([{ kind: 'held-frame', fromFrame: 9 }]);
  });

  it('a drawing shown again in place of the next', () => {
    const clean = throwMarks(plain);
    const marks = clean.map((mark, i) => (i === 8 ? { ...mark, x: clean[7]!.x, y: clean[7]!.y } : mark));
    expect(readMarks(marks).findings).toMatchObject([{ kind: 'held-frame', fromFrame: 9 }]);
  });

  it('a flight that floats among others', () => {
    const marks = bounceMarks({
      start: 3.3,
      lengths: [14, 14.5, 11],
      gravity: 6,
      gravities: [6, 3.9, 6],
      frames: 46,
      noise: 0.3,
    });
    expect(readMarks(marks).findings).toMatchObject([
      { kind: 'gravity-changes', flight: 'A2', title: 'Floats more than the rest' },
    ]);
  });

  it('a rebound that gains height', () => {
    const marks = bounceMarks({ start: 3.3, lengths: [12, 14.2], gravity: 6, frames: 34, noise: 0.3 });
    expect(readMarks(marks).findings).toMatchObject([{ kind: 'bounce-gains', flight: 'A2' }]);
  });

  it('gravity that a scale belies', () => {
    const marks = throwMarks(plain);
    const metric = 4.4 * 24 ** 2;
    const right = readMarks(marks, { scale: { pxPerMetre: metric / 9.80665 } });
    const wrong = readMarks(marks, { scale: { pxPerMetre: (1.6 * metric) / 9.80665 } });
    expect(right.findings).toEqual([]);
    expect(wrong.findings).toMatchObject([{ kind: 'gravity-off-scale', title: 'Floats for its size' }]);
    expect(right.objects[0]!.flights[0]!.gravity.metric!.value).toBeCloseTo(9.8, 0);
  });
});

describe('steps across that scatter', () => {
  const scattered = (share: number, noise = 0.2) => {
    const normal = normalFrom(77);
    return throwMarks({ ...plain, noise }).map((mark) =>
      mark.frame > 3 && mark.frame < 24 ? { ...mark, x: mark.x + 18 * share * Math.SQRT1_2 * normal() } : mark,
    );
  };
  it('are told once, with a mend that slides the drawings sideways and then reads true', () => {
    const marks = scattered(0.25);
    const reading = readMarks(marks);
    expect(reading.findings).toMatchObject([{ kind: 'across-uneven', title: 'Steps across scatter' }]);
    expect(reading.findings[0]!.mend.length).toBeGreaterThan(15);
    const spread = reading.objects[0]!.flights[0]!.measures.find((measure) => measure.name === 'across-spread')!;
    expect(spread.verdict).toBe('off');
    expect(spread.low).toBeLessThan(0.25);
    expect(spread.high).toBeGreaterThan(0.25);
    expect(readMarks(mended(marks, reading)).findings).toEqual([]);
  });
  it('are left alone within the tolerance', () => {
    expect(readMarks(scattered(0.04)).findings).toEqual([]);
  });
  it('are left alone where noise scatters the heights as much', () => {
    expect(readMarks(throwMarks({ ...plain, speed: 9, noise: 1.5 })).findings).toEqual([]);
  });
});

describe('what is no fault', () => {
  it('bounces that lose height, with contacts between frames', () => {
    const reading = readMarks(bounceMarks({ start: 3.3, lengths: [14, 11.2, 9], gravity: 6, frames: 42, noise: 0.3 }));
    expect(reading.findings).toEqual([]);
    const landings = reading.objects[0]!.flights.map((flight) => flight.landing!);
    [17.3, 28.5, 37.5].forEach((time, i) => expect(Math.abs(landings[i]! - time)).toBeLessThan(0.06));
  });
  it('drawings on twos and threes, told or found', () => {
    for (const hold of [2, 3] as const) {
      const marks = onHold(throwMarks({ ...plain, takeOff: 4, landing: 40, frames: 45, noise: 0.2 }), hold);
      expect(readMarks(marks, { hold }).findings).toEqual([]);
      const found = readMarks(marks, { hold: undefined });
      expect(found.source.hold).toBe(hold);
      expect(found.findings).toEqual([]);
    }
  });
  it('motion away from the camera, which is said', () => {
    const marks = throwMarks({ ...plain, frames: 26 }).map((mark) => {
      const away = 1 + 0.02 * Math.min(20, Math.max(0, mark.frame - 3.4));
      return { ...mark, x: 480 + (mark.x - 480) / away, y: 270 + (mark.y - 270) / away };
    });
    const reading = readMarks(marks);
    expect(reading.findings).toEqual([]);
    expect(reading.objects[0]!.flights[0]!.model).toBe('depth');
    expect(reading.cautions.join(' ')).toContain('camera');
  });
  it('a roll over an edge', () => {
    const marks = Array.from({ length: 26 }, (_, i) => {
      const fallen = Math.max(0, i - 10.4);
      return { frame: i + 1, x: 100 + 14 * i, y: 200 + 0.9 * fallen ** 2, origin: 'import' as const };
    });
    const reading = readMarks(marks);
    expect(reading.findings).toEqual([]);
    expect(reading.objects[0]!.flights[0]!.takeOff).toBeCloseTo(11.4, 0);
  });
});

describe('input that cannot be read has a name', () => {
  it.each([
    ['nothing at all', [], 'too-few-marks'],
    ['three marks', throwMarks({ ...plain, frames: 3 }), 'too-few-marks'],
    ['a thing at rest', throwMarks({ ...plain, height: 0, speed: 0, noise: 0.1 }), 'no-motion'],
    [
      'a thing carried along',
      Array.from({ length: 20 }, (_, i) => ({ frame: i + 1, x: 10 * i, y: 300, origin: 'import' as const })),
      'not-in-flight',
    ],
  ])('%s', (_, marks, outcome) => {
    const reading = readMarks(marks);
    expect(reading.objects[0]!.outcome).toBe(outcome);
    expect(reading.findings).toEqual([]);
    expect(reading.cautions.length).toBeGreaterThan(0);
  });

  it('gives a valid document for any marks, never NaN and never an exception', () => {
    const place = fc.oneof(fc.double({ min: -2000, max: 2000, noNaN: true }), fc.constantFrom(0, 1e6, 300));
    const mark = fc.record({ frame: fc.integer({ min: 1, max: 60 }), x: place, y: place });
    fc.assert(
      fc.property(
        fc.array(mark, { maxLength: 30 }),
        fc.constantFrom<Hold | undefined>(1, 2, 3, 'mixed', undefined),
        (marks, hold) => {
          const reading = readMarks(
            marks.map((one) => ({ ...one, origin: 'import' as const })),
            { hold },
          );
          readingSchema.parse(reading);
          expect(JSON.stringify(reading)).not.toContain('null,null,null');
        },
      ),
      { numRuns: 150, seed: 7 },
    );
  });
});
