import { describe, expect, it } from 'vitest';
import { cameraAt, stagedReading, toPicture, toStage } from '../../../src/lib/stage.ts';
import { buildReading, throwAt } from '../../support/readings.ts';

const pan = {
  moved: true,
  offsets: [
    { frame: 1, dx: 0, dy: 0, zoom: 1 },
    { frame: 11, dx: 200, dy: -40, zoom: 2 },
  ],
};

describe('a camera that moves', () => {
  it('is on its way between two of its frames and stays at its ends', () => {
    expect(cameraAt(pan, 6)).toEqual({ dx: 100, dy: -20, zoom: 1.5 });
    expect(cameraAt(pan, 40)).toEqual({ dx: 200, dy: -40, zoom: 2 });
    expect(cameraAt(pan, -3)).toEqual({ dx: 0, dy: 0, zoom: 1 });
  });

  it('shows a point of the stage where its picture has it, and back', () => {
    const camera = cameraAt(pan, 11);
    expect(toPicture({ x: 210, y: -30 }, camera)).toEqual({ x: 20, y: 20 });
    expect(toStage(toPicture({ x: 77, y: 5 }, camera), camera)).toEqual({ x: 77, y: 5 });
  });

  it('is taken out of everything a reading points at', () => {
    const seen = buildReading();
    const shaken = { ...seen, camera: pan };
    const [object] = stagedReading(shaken).objects;
    const mark = object!.marks.find((one) => one.frame === 11)!;
    expect(mark).toMatchObject(toStage(throwAt(11), cameraAt(pan, 11)));
    const point = object!.flights[0]!.trueArc.find((one) => one.frame === 11)!;
    expect(point).toMatchObject(toStage(throwAt(11), cameraAt(pan, 11)));
    expect(object!.flights[0]!.apex).not.toEqual(seen.objects[0]!.flights[0]!.apex);
  });
});

describe('a camera that stays', () => {
  it('leaves a reading as it is, whatever stands in its offsets', () => {
    const still = buildReading({ camera: { ...pan, moved: false } });
    expect(stagedReading(still)).toBe(still);
    expect(cameraAt(still.camera, 9)).toEqual({ dx: 0, dy: 0, zoom: 1 });
  });
});
