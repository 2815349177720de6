import { describe, expect, it } from 'vitest';
import { flashesInASecond, MOST_FLASHES, meanLuminance } from '../../../src/features/playhead/flicker.ts';

const strip = (frames: number, at: (frame: number) => number) =>
  Array.from({ length: frames }, (_, frame) => at(frame));

describe('the mean luminance of a picture (WCAG 2.2, "relative luminance")', () => {
  it('is 0 for black, 1 for white, and weighs the colours as the eye does', () => {
    expect(meanLuminance([0, 0, 0, 255])).toBe(0);
    expect(meanLuminance([255, 255, 255, 255])).toBeCloseTo(1, 9);
    expect(meanLuminance([255, 0, 0, 255])).toBeCloseTo(0.2126, 9);
    expect(meanLuminance([0, 255, 0, 255, 0, 0, 0, 255])).toBeCloseTo(0.7152 / 2, 9);
  });
});

describe('flashes in a second (WCAG 2.2, success criterion 2.3.1: three flashes or below)', () => {
  it('counts a pair of opposing changes as one flash', () => {
    const everyFourth = strip(48, (frame) => (frame % 8 < 4 ? 0.1 : 0.6));
    expect(flashesInASecond(everyFourth, 24)).toBe(3);
    expect(flashesInASecond(everyFourth, 24)).toBeLessThanOrEqual(MOST_FLASHES);
  });

  it('warns of a strip that alternates light and dark every frame', () => {
    expect(
      flashesInASecond(
        strip(24, (frame) => (frame % 2 ? 0.1 : 0.6)),
        24,
      ),
    ).toBe(12);
    expect(
      flashesInASecond(
        strip(24, (frame) => (frame % 2 ? 0.1 : 0.6)),
        24,
      ),
    ).toBeGreaterThan(MOST_FLASHES);
  });

  it('is quiet for small changes, for changes among bright pictures, and for a still', () => {
    expect(
      flashesInASecond(
        strip(24, (frame) => (frame % 2 ? 0.3 : 0.36)),
        24,
      ),
    ).toBe(0);
    expect(
      flashesInASecond(
        strip(24, (frame) => (frame % 2 ? 0.82 : 0.98)),
        24,
      ),
    ).toBe(0);
    expect(
      flashesInASecond(
        strip(24, () => 0.4),
        24,
      ),
    ).toBe(0);
    expect(flashesInASecond([0.2], 24)).toBe(0);
  });

  it('counts a slow fade once, however many steps it takes', () => {
    expect(
      flashesInASecond(
        strip(24, (frame) => 0.05 + frame * 0.02),
        12,
      ),
    ).toBeLessThanOrEqual(1);
  });

  it('looks at the loop: a short strip flickers where its end meets its beginning', () => {
    expect(flashesInASecond([0.1, 0.1, 0.1, 0.6], 24)).toBeGreaterThan(MOST_FLASHES);
  });
});
