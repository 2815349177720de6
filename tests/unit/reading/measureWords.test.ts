import { describe, expect, it } from 'vitest';
import { MEASURE_NAMES } from '../../../shared/reading/kinds.ts';
import { gaugeOf, gaugeRows, measureWords, shownValue } from '../../../src/features/reading/measureWords.ts';
import { buildMeasure } from '../../support/readings.ts';

describe('a measure in the margin', () => {
  it('has words of its own for every name the reading knows', () => {
    const words = MEASURE_NAMES.map(measureWords);
    expect(new Set(words).size).toBe(MEASURE_NAMES.length);
    for (const [index, word] of words.entries()) expect(word).not.toBe(MEASURE_NAMES[index]);
  });

  it('carries its unit and no more digits than it deserves', () => {
    expect(shownValue(buildMeasure())).toBe('64\u202f%');
    expect(shownValue(buildMeasure({ name: 'exponent-rise', value: 1.2534, low: 1.24, high: 1.27 }))).toBe('1.25');
    expect(shownValue(buildMeasure({ name: 'exponent-rise', value: 1.2534, low: 0.9, high: 1.6 }))).toBe('1.3');
    expect(shownValue(buildMeasure({ name: 'gravity', value: 6.604, low: 6.56, high: 6.64 }))).toBe('6.6 px/f²');
    expect(shownValue(buildMeasure({ name: 'across-drift', value: 0.22, low: 0.2, high: 0.24 }))).toBe('+22\u202f%');
    expect(shownValue(buildMeasure({ name: 'across-drift', value: -0.1, low: -0.2, high: 0 }))).toBe('−10\u202f%');
    expect(shownValue(buildMeasure({ name: 'repeats', value: 2, low: 2, high: 2 }))).toBe('2');
  });
});

describe('a gauge', () => {
  it('has its tolerance in the middle and its marker where the value lies', () => {
    const gauge = gaugeOf(buildMeasure({ value: 0.55, low: 0.54, high: 0.56 }))!;
    expect((gauge.band[0] + gauge.band[1]) / 2).toBeCloseTo(0.5, 12);
    expect(gauge.marker).toBeCloseTo(0.75, 12);
    expect(gauge.interval[0]).toBeLessThan(gauge.marker);
    expect(gauge.interval[1]).toBeGreaterThan(gauge.marker);
    expect(gauge.beyond).toBe(false);
  });

  it('stops at its end and says so when the value lies far off', () => {
    expect(gaugeOf(buildMeasure({ value: 0.9, low: 0.85, high: 0.95 }))).toMatchObject({ marker: 1, beyond: true });
    expect(gaugeOf(buildMeasure({ value: 0.1, low: 0.05, high: 0.15 }))).toMatchObject({ marker: 0, beyond: true });
  });

  it('has no lower edge where only more is off', () => {
    const rebound = buildMeasure({
      name: 'rebound-height',
      value: 0.64,
      low: 0.6,
      high: 0.7,
      expected: 1,
      tolerance: 0.03,
    });
    expect(gaugeOf(rebound)!.band[0]).toBe(0);
  });

  it('is not drawn where nothing is expected', () => {
    expect(gaugeOf(buildMeasure({ name: 'gravity', expected: null, tolerance: null }))).toBeNull();
  });
});

describe('rise and fall', () => {
  const rise = buildMeasure({ name: 'exponent-rise', value: 2, low: 1.99, high: 2.01, verdict: 'true', kind: null });

  it('share a row when they measure the same', () => {
    const rows = gaugeRows([rise, { ...rise, name: 'exponent-fall' }]);
    expect(rows.map((row) => row.words)).toEqual(['Curve']);
  });

  it('stand apart when one of them is off', () => {
    const fall = buildMeasure({ name: 'exponent-fall', value: 1.4, low: 1.39, high: 1.41 });
    expect(gaugeRows([rise, fall]).map((row) => row.words)).toEqual(['Curve of rise', 'Curve of fall']);
    expect(gaugeRows([fall]).map((row) => row.words)).toEqual(['Curve of fall']);
  });
});
