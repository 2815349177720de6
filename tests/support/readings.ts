import type { Finding, Flight, Mark, Measure, ReadObject, Reading } from '../../shared/reading/document.ts';
import { READING_FORMAT } from '../../shared/reading/document.ts';

/** A throw from (120, 430) to (850, 430) in 20 frames from frame 3, 330 px high: px and frames, y downwards. */
export function throwAt(frame: number): { x: number; y: number } {
  const share = (frame - 3) / 20;
  return { x: 120 + 730 * share, y: 430 - 4 * 330 * share * (1 - share) };
}

export function buildMarks(frames: readonly number[], at = throwAt): Mark[] {
  return frames.map((frame) => ({ frame, ...at(frame), radius: 12, origin: 'found', confidence: 0.98 }));
}

export function buildMeasure(over: Partial<Measure> = {}): Measure {
  return {
    name: 'apex-time',
    value: 0.64,
    low: 0.63,
    high: 0.65,
    expected: 0.5,
    tolerance: 0.025,
    verdict: 'off',
    kind: 'apex-off-centre',
    ...over,
  };
}

/** A flight whose true arc is the throw of `throwAt`. */
export function buildFlight(frames: readonly number[], over: Partial<Flight> = {}): Flight {
  return {
    id: 'A1',
    takeOff: 3,
    landing: 23,
    judged: true,
    apex: { frame: 13, x: 485, y: 100, seFrame: 0.02, seY: 0.2 },
    across: { value: 36.5, se: 0.04 },
    gravity: { value: 6.6, se: 0.02, metric: null },
    residual: 0.42,
    model: 'flat',
    measures: [buildMeasure({ value: 0.5, low: 0.49, high: 0.51, verdict: 'true', kind: null })],
    trueArc: frames.map((frame) => ({ frame, ...throwAt(frame) })),
    ...over,
  };
}

export function buildFinding(over: Partial<Finding> = {}): Finding {
  return {
    id: 'A1-apex-off-centre-3',
    kind: 'apex-off-centre',
    object: 'A',
    flight: 'A1',
    fromFrame: 3,
    toFrame: 23,
    severity: 'strong',
    title: 'Apex sits late',
    detail: '2.8 frames past the middle. Up takes 12.8 frames, down takes 7.2.',
    mend: [{ frame: 11, dx: 1.2, dy: -84 }],
    chart: [{ from: 3, to: 13, ticks: [0.19, 0.36, 0.51] }],
    ...over,
  };
}

export function buildObject(over: Partial<ReadObject> = {}): ReadObject {
  const frames = Array.from({ length: 21 }, (_, index) => index + 3);
  return {
    id: 'A',
    what: 'thing',
    outcome: 'read',
    points: [],
    marks: buildMarks(frames),
    contacts: [],
    flights: [buildFlight(frames)],
    ...over,
  };
}

/** A reading of one true throw in a strip of 25 frames that the production counts from 1001. */
export function buildReading(over: Partial<Reading> = {}): Reading {
  return {
    format: READING_FORMAT,
    engine: '1.0.0',
    source: {
      kind: 'frames',
      frames: 25,
      width: 980,
      height: 520,
      firstFrame: 1001,
      fps: { num: 24, den: 1 },
      hold: 1,
      exposure: Array.from({ length: 25 }, (_, index) => index + 1),
      scale: null,
    },
    camera: { moved: false, offsets: [] },
    objects: [buildObject()],
    findings: [],
    cautions: [],
    ...over,
  };
}
