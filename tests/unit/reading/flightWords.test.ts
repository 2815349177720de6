import { describe, expect, it } from 'vitest';
import { flightSentence, flightSpan } from '../../../src/features/reading/flightWords.ts';
import { buildFlight, buildMeasure } from '../../support/readings.ts';

const frames = [3, 13, 23];

describe('the sentence of a flight', () => {
  it('says that it reads true, and how long it goes up and down', () => {
    expect(flightSentence(buildFlight(frames), [])).toBe('Reads true. Up takes 10.0 frames, down takes 10.0.');
  });

  it('names what is off first', () => {
    const late = buildFlight(frames, { apex: { frame: 15.8, x: 581, y: 100, seFrame: 0.02, seY: 0.2 } });
    expect(flightSentence(late, [{ title: 'Apex sits late' }, { title: 'Rise is too even' }])).toBe(
      'Apex sits late, rise is too even. Up takes 12.8 frames, down takes 7.2.',
    );
  });

  it('speaks of one side when a thing only falls or only rises', () => {
    const rolledOff = buildFlight(frames, { apex: { frame: 3.1, x: 120, y: 100, seFrame: 0.02, seY: 0.2 } });
    expect(flightSentence(rolledOff, [])).toBe('Reads true. It only falls, for 19.9 frames.');
  });

  it('keeps silent about an end that lies outside the strip', () => {
    expect(flightSentence(buildFlight(frames, { takeOff: null }), [])).toBe('Reads true.');
    expect(flightSpan(buildFlight(frames, { takeOff: null }), 1001)).toBe('frames …1003 – 1023');
  });

  it('says that nothing was judged where someone said that it does not fly free', () => {
    expect(flightSentence(buildFlight(frames, { judged: false }), [])).toMatch(/not judged/);
  });

  it('does not call a flight true while one of its gauges is off', () => {
    const flight = buildFlight(frames, { measures: [buildMeasure({ name: 'path-steps', kind: null })] });
    expect(flightSentence(flight, [])).toMatch(
      /^Nothing to mend, though steps on the arc lies outside the tolerance\./,
    );
  });
});
