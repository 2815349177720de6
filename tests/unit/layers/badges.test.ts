import { describe, expect, it } from 'vitest';
import { dotsOf, placeBadges } from '../../../src/features/layers/badges.ts';
import { apexShift, calloutOf } from '../../../src/features/layers/callout.ts';
import { overlaps } from '../../../src/features/layers/labels.ts';
import { numberedFirst, placeNumbers } from '../../../src/features/layers/NumbersLayer.tsx';
import { buildFinding, buildFlight, buildMarks, buildMeasure } from '../../support/readings.ts';

const frames = Array.from({ length: 21 }, (_, index) => index + 3);
const lateApex = { frame: 15.8, x: 581, y: 100, seFrame: 0.02, seY: 0.2 };
const flight = buildFlight(frames, { apex: lateApex, measures: [buildMeasure()] });
const object = {
  id: 'A',
  drawings: buildMarks(frames).map((mark) => ({
    frame: mark.frame,
    until: mark.frame,
    x: mark.x,
    y: mark.y,
    radius: 12,
  })),
  flights: [flight],
};
const bounds = { left: 0, top: 0, width: 980, height: 520 };
const finding = { ...buildFinding(), number: 1 };

describe('the measure beside a badge', () => {
  it('says by how many frames an apex is late or early', () => {
    expect(apexShift(flight)).toBeCloseTo(2.8, 1);
    expect(calloutOf(finding, flight)).toBe('2.8 frames late');
    const early = buildFlight(frames, { apex: { ...lateApex, frame: 12 } });
    expect(calloutOf(finding, early)).toBe('1 frame early');
  });

  it('says how far a popped drawing is off', () => {
    const pop = buildFinding({ kind: 'pop', fromFrame: 11, toFrame: 11, mend: [{ frame: 11, dx: 30, dy: -40 }] });
    expect(calloutOf(pop, flight)).toBe('50 px off the arc');
  });

  it('is left out where the title says it all, or nothing was measured for it', () => {
    expect(calloutOf(buildFinding({ kind: 'hang' }), flight)).toBeNull();
    expect(calloutOf(finding, undefined)).toBeNull();
  });
});

describe('badges on the picture', () => {
  it('cover no drawing and stay inside', () => {
    const two = [finding, { ...buildFinding({ id: 'B', kind: 'too-straight', fromFrame: 3, toFrame: 11 }), number: 2 }];
    const badges = placeBadges([object], two, 1, bounds);
    expect(badges.map((badge) => badge.finding.number)).toEqual([1, 2]);
    for (const badge of badges) {
      expect(dotsOf([object], 4).some((dot) => overlaps(dot, badge))).toBe(false);
      expect(badge.left).toBeGreaterThanOrEqual(0);
      expect(badge.top).toBeGreaterThanOrEqual(0);
    }
    expect(overlaps(badges[0]!, badges[1]!)).toBe(false);
  });

  it('stand on the side to which the apex went', () => {
    const [late] = placeBadges([object], [finding], 1, bounds);
    expect(late!.left).toBeGreaterThan(lateApex.x);
    const early = { ...object, flights: [buildFlight(frames, { apex: { ...lateApex, frame: 11, x: 400 } })] };
    const [before] = placeBadges([early], [finding], 1, bounds);
    expect(before!.left + before!.width).toBeLessThan(400);
  });

  it('are left out for a finding without a drawing', () => {
    expect(placeBadges([{ ...object, drawings: [], flights: [] }], [finding], 1, bounds)).toEqual([]);
  });
});

describe('frame numbers on the picture', () => {
  it('tell the ends and the apex first, then every fifth of the production’s count', () => {
    expect(numberedFirst(object, 1001, 1).slice(0, 3)).toEqual([3, 23, 16]);
    expect(numberedFirst(object, 1001, 1)).toContain(10);
    expect(numberedFirst(object, 1001, 1)).not.toContain(11);
  });

  it('tell one number where several drawings stand on one spot', () => {
    const held = [1, 2].map((frame) => ({ frame, until: frame, x: 120, y: 430, radius: 12 }));
    const numbered = numberedFirst({ ...object, drawings: [...held, ...object.drawings] }, 1004, 5);
    expect(numbered).toContain(3);
    expect(numbered).not.toContain(2);
  });

  it('make room for a badge', () => {
    const badges = placeBadges([object], [finding], 1, bounds);
    for (const number of placeNumbers({ objects: [object], firstFrame: 1001, unit: 1, bounds }, badges)) {
      expect(badges.some((badge) => overlaps(badge, number))).toBe(false);
    }
  });
});
