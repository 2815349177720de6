import { describe, expect, it } from 'vitest';
import { reduce } from '../../../shared/finding/coarse.ts';
import { medianBytes } from '../../../shared/finding/median.ts';
import { labelRegions } from '../../../shared/finding/components.ts';
import { discOutline, fitOutline } from '../../../shared/finding/outline.ts';
import { silhouetteOf } from '../../../shared/finding/silhouette.ts';

const SIZE = 60;
const mask = (inside: (x: number, y: number) => boolean): Uint8Array =>
  Uint8Array.from({ length: SIZE * SIZE }, (_, at) => (inside((at % SIZE) + 0.5, Math.floor(at / SIZE) + 0.5) ? 1 : 0));

describe('a silhouette', () => {
  it('of a ring is that of the disc it encloses', () => {
    const ring = mask((x, y) => Math.abs(Math.hypot(x - 30.3, y - 28.6) - 15) < 1.5);
    const shape = silhouetteOf(ring, SIZE, SIZE, 1);
    expect(Math.abs((shape?.x ?? 0) - 30.3)).toBeLessThan(0.1);
    expect(Math.abs((shape?.y ?? 0) - 28.6)).toBeLessThan(0.1);
    expect(Math.sqrt((shape?.area ?? 0) / Math.PI)).toBeCloseTo(16.5, 0);
  });

  it('of a disc spreads by half its radius in every direction', () => {
    const shape = silhouetteOf(
      mask((x, y) => Math.hypot(x - 30, y - 30) < 20),
      SIZE,
      SIZE,
      1,
    );
    expect(shape?.long).toBeCloseTo(10, 1);
    expect(shape?.short).toBeCloseTo(10, 1);
  });

  it('counts the middle of the first pixel as (0.5, 0.5)', () => {
    const shape = silhouetteOf(
      mask((x, y) => x < 1 && y < 1),
      SIZE,
      SIZE,
      0,
    );
    expect([shape?.x, shape?.y]).toEqual([0.5, 0.5]);
  });

  it('of nothing is null', () => {
    expect(silhouetteOf(new Uint8Array(SIZE * SIZE), SIZE, SIZE, 2)).toBeNull();
  });
});

describe('regions', () => {
  it('join at corners, and a horseshoe is one', () => {
    const { regions } = labelRegions(Uint8Array.from([1, 0, 0, 1, 0, 1, 0, 0, 1, 0, 1, 1, 0, 0, 0, 0]), 4, 4);
    expect(regions.map((region) => region.area)).toEqual([5, 1]);
  });
});

describe('an outline', () => {
  const disc = (x: number, y: number, shows: (px: number) => boolean) => ({
    left: 100,
    top: 50,
    width: SIZE,
    height: SIZE,
    differences: mask((px, py) => shows(px) && Math.hypot(px - x, py - y) < 14).map((value) => value * 120),
  });

  it('finds a disc of its radius', () => {
    const fit = fitOutline(
      disc(31.4, 27.7, () => true),
      discOutline(14),
      { x: 128, y: 80 },
      6,
      120,
      [0],
    );
    expect(fit.x).toBeCloseTo(131.4, 0);
    expect(fit.y).toBeCloseTo(77.7, 0);
    expect(fit.support).toBeGreaterThan(0.9);
  });

  it('finds it behind a post that hides a third of it', () => {
    const fit = fitOutline(
      disc(31.4, 27.7, (x) => x < 36),
      discOutline(14),
      { x: 127, y: 78 },
      8,
      120,
      [0],
    );
    expect(Math.hypot(fit.x - 131.4, fit.y - 77.7)).toBeLessThan(0.8);
  });
});

describe('a reduced picture', () => {
  it.each([2, 3])('is the average of squares of %i px', (factor) => {
    const side = 2 * factor;
    const data = Uint8Array.from({ length: side * side * 3 }, (_, at) =>
      Math.floor(at / 3) % side < factor ? 40 : 90,
    );
    const small = reduce({ width: side, height: side, data }, factor);
    expect([small.width, small.height]).toEqual([2, 2]);
    expect([...small.data]).toEqual([40, 40, 40, 90, 90, 90, 40, 40, 40, 90, 90, 90]);
  });
});

describe('the median over time', () => {
  it('is what most pictures show', () => {
    const pictures = [10, 200, 12, 11, 255].map((value) => Uint8Array.of(value, 255 - value));
    const into = new Uint8Array(2);
    medianBytes(pictures, 0, 2, into, 0);
    expect([...into]).toEqual([12, 243]);
  });
});
