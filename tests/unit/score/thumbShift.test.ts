import { expect, it } from 'vitest';
import { thumbShift } from '../../../src/features/score/thumbShift.ts';

it('a narrow thumbnail shows the thing in its middle, and stops at the ends of the picture', () => {
  expect(thumbShift(0.5, 60, 30)).toBe(0.5);
  expect(thumbShift(0.05, 60, 30)).toBe(0);
  expect(thumbShift(0.98, 60, 30)).toBe(1);
  expect(thumbShift(0.4, 60, 30)).toBeCloseTo((24 - 15) / 30, 12);
});

it('a thumbnail that fits is not shifted', () => {
  expect(thumbShift(0.9, 20, 30)).toBe(0.5);
});
