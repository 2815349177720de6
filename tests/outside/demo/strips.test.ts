import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { analyseFrames } from '../../../server/analysis/analyseFrames.ts';
import { drawStrip } from '../../../server/scripts/demo/drawStrip.ts';
import { DEMO_STRIPS, type DemoStrip } from '../../../server/scripts/demo/strips.ts';
import type { Reading } from '../../../shared/reading/document.ts';

// The outside truth here is the drawing itself: where each thing was put, and the one fault that was put in
// (server/scripts/demo/flight.ts). The engine sees nothing but the pictures.

let folder: string;

beforeAll(async () => {
  folder = await mkdtemp(path.join(tmpdir(), 'spandrel-demo-strips-'));
});

afterAll(async () => {
  await rm(folder, { recursive: true, force: true });
});

const strips: [string, DemoStrip][] = Object.entries(DEMO_STRIPS);

describe.each(strips)('the drawn strip %s', (id, strip) => {
  let reading: Reading;

  beforeAll(async () => {
    const framePaths = await drawStrip(strip, path.join(folder, id.replace('/', '-')));
    const request = { id, framePaths, kind: 'frames', firstFrame: strip.firstFrame, fps: strip.fps } as const;
    ({ reading } = await analyseFrames(request, () => {}));
  });

  it(`is found to have ${strip.fault ?? 'no fault'} and nothing else`, () => {
    expect(reading.findings.map(({ kind }) => kind)).toEqual(strip.fault === null ? [] : [strip.fault]);
    expect(reading.objects.map(({ outcome }) => outcome)).toEqual(['read']);
    expect(reading.objects[0]!.flights).toHaveLength(strip.flights);
    expect(reading.source.hold).toBe(strip.hold);
  });

  it('has its marks within a pixel of where the thing was drawn, on every frame it moves', () => {
    const at = new Map(reading.objects[0]!.marks.map((mark) => [mark.frame, mark]));
    const rests = ({ x, y }: { x: number; y: number }) =>
      [strip.path[0]!, strip.path.at(-1)!].some((rest) => rest.x === x && rest.y === y);
    const off = strip.path.flatMap((place, index) => {
      if (rests(place)) return [];
      const mark = at.get(index + 1);
      const distance = mark ? Math.hypot(mark.x - place.x, mark.y - place.y) : Number.POSITIVE_INFINITY;
      return distance < 1 ? [] : [{ frame: index + 1, distance }];
    });
    expect(off).toEqual([]);
  });
});
