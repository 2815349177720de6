import { describe, expect, it } from 'vitest';
import { around, overlaps, placeLabels } from '../../../src/features/layers/labels.ts';

const bounds = { left: 0, top: 0, width: 400, height: 300 };
const label = (key: string, x: number, y: number, must = false) => ({
  key,
  x,
  y,
  width: 40,
  height: 14,
  away: 6,
  must,
});

describe('labels over the picture', () => {
  it('stand above left of their point when that is free', () => {
    const [placed] = placeLabels([label('1011', 200, 150)], [], bounds);
    expect(placed).toMatchObject({ left: 154, top: 130 });
  });

  it('cover neither marks nor each other', () => {
    const points = Array.from({ length: 8 }, (_, index) => ({ x: 60 + index * 24, y: 150 }));
    const marks = points.map((point) => around(point, 5));
    const placed = placeLabels(
      points.map((point, index) => label(String(index), point.x, point.y)),
      marks,
      bounds,
    );
    for (const one of placed) {
      expect(marks.some((mark) => overlaps(one, mark))).toBe(false);
      expect(placed.some((other) => other !== one && overlaps(one, other))).toBe(false);
    }
    expect(placed.length).toBeGreaterThan(2);
  });

  it('stay inside the picture at its corner', () => {
    const [placed] = placeLabels([label('1001', 4, 4)], [], bounds);
    expect(placed!.left).toBeGreaterThanOrEqual(0);
    expect(placed!.top).toBeGreaterThanOrEqual(0);
  });

  it('are left out where nothing is free, unless they must stand', () => {
    const wall = [{ left: 0, top: 0, width: 400, height: 300 }];
    expect(placeLabels([label('7', 200, 150)], wall, bounds)).toEqual([]);
    expect(placeLabels([label('7', 200, 150, true)], wall, bounds)).toHaveLength(1);
  });
});
