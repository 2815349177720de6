import { describe, expect, it } from 'vitest';
import { sketchPath } from '../../../src/features/reading/sketchPath.ts';
import { takeNews } from '../../../src/features/reading/takeNews.ts';
import { buildSketch } from '../../support/wire.ts';

const found = (kind: 'pop' | 'hang' | 'apex-off-centre', severity: 'minor' | 'visible' | 'strong') => ({
  kind,
  severity,
});

describe('what became of the findings of the take before', () => {
  it('counts what is mended, what is smaller and what is new', () => {
    const before = [found('apex-off-centre', 'strong'), found('pop', 'visible')];
    expect(takeNews(before, [found('apex-off-centre', 'minor')])).toBe('1 mended, 1 smaller');
    expect(takeNews(before, [])).toBe('2 mended');
    expect(takeNews([], [found('hang', 'minor')])).toBe('1 new');
  });

  it('matches two of a kind one by one', () => {
    const before = [found('pop', 'visible'), found('pop', 'visible')];
    expect(takeNews(before, [found('pop', 'visible')])).toBe('1 mended, 1 left');
  });

  it('says when something grew, and nothing when there was nothing', () => {
    expect(takeNews([found('hang', 'minor')], [found('hang', 'strong')])).toBe('1 larger');
    expect(takeNews([], [])).toBe('');
  });
});

describe('the small arc of a take', () => {
  const box = { width: 88, height: 46, pad: 8 };
  const places = (path: string) =>
    path
      .split(/[ML]/)
      .slice(1)
      .map((pair) => pair.split(' ').map(Number));

  it('fills its box without leaving it, both directions at one scale', () => {
    const points = places(sketchPath(buildSketch(), box));
    expect(points).toHaveLength(9);
    for (const [x, y] of points) {
      expect(x).toBeGreaterThanOrEqual(8);
      expect(x).toBeLessThanOrEqual(80);
      expect(y).toBeGreaterThanOrEqual(8);
      expect(y).toBeLessThanOrEqual(38);
    }
    const [first, middle] = [points[0]!, points[4]!];
    expect((middle[0]! - first[0]!) / (first[1]! - middle[1]!)).toBeCloseTo(200 / 256, 1);
  });

  it('draws what is aloft, and all of it where nothing flies', () => {
    const sketch = buildSketch();
    const held = [0, 1].map((frame) => ({ object: 'A', frame, x: 100, y: 340 }));
    expect(places(sketchPath({ ...sketch, marks: [...held, ...sketch.marks] }, box))).toHaveLength(9);
    expect(places(sketchPath({ marks: sketch.marks, arcs: [] }, box))).toHaveLength(9);
  });

  it('is empty for a strip in which nothing was seen', () => {
    expect(sketchPath({ marks: [], arcs: [] }, box)).toBe('');
  });
});
