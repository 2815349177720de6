import { describe, expect, it } from 'vitest';
import { decimalsFor, shownNumber, shownPercent } from '../../../src/lib/honestDigits.ts';

describe('honest digits', () => {
  it('stops at the first digit of the uncertainty', () => {
    expect(decimalsFor(0.01)).toBe(2);
    expect(decimalsFor(0.04)).toBe(2);
    expect(decimalsFor(0.3)).toBe(1);
    expect(decimalsFor(4)).toBe(0);
    expect(decimalsFor(0.0001)).toBe(2);
    expect(decimalsFor(0.0001, 1)).toBe(1);
  });

  it('says no more than asked for when the uncertainty is unknown', () => {
    expect(decimalsFor(0)).toBe(2);
    expect(decimalsFor(Number.NaN)).toBe(2);
  });

  it('writes a real minus, and none before zero', () => {
    expect(shownNumber(-3.14, 1)).toBe('−3.1');
    expect(shownNumber(-0.04, 1)).toBe('0.0');
    expect(shownPercent(0.638)).toBe('64\u202f%');
  });
});
