import type { Point, Reading } from '../../shared/reading/document.ts';

type Camera = Reading['camera'];

/**
 * A camera at a moment: where the picture's corner lies on the stage (px of the first frame), and how much larger than on
 * the first frame the stage is shown.
 */
export interface CameraPlace {
  dx: number;
  dy: number;
  zoom: number;
}

const STILL: CameraPlace = { dx: 0, dy: 0, zoom: 1 };

/** The camera at a time in frames; between two frames it is on its way. A still camera stays at the stage's corner. */
export function cameraAt(camera: Camera, frame: number): CameraPlace {
  const { moved, offsets } = camera;
  const first = offsets[0];
  const last = offsets.at(-1);
  if (!moved || !first || !last) return STILL;
  const after = offsets.find((place) => place.frame >= frame) ?? last;
  const before = offsets.findLast((place) => place.frame <= frame) ?? first;
  const share = after.frame === before.frame ? 0 : (frame - before.frame) / (after.frame - before.frame);
  return {
    dx: before.dx + share * (after.dx - before.dx),
    dy: before.dy + share * (after.dy - before.dy),
    zoom: before.zoom + share * (after.zoom - before.zoom),
  };
}

/** Where a point of a picture lies on the stage. */
export function toStage(point: Point, { dx, dy, zoom }: CameraPlace): Point {
  return { x: point.x / zoom + dx, y: point.y / zoom + dy };
}

/** Where a point of the stage lies in the picture of a camera. */
export function toPicture(point: Point, { dx, dy, zoom }: CameraPlace): Point {
  return { x: (point.x - dx) * zoom, y: (point.y - dy) * zoom };
}

/**
 * A reading with its points on the stage. The document says of each point where its own frame shows it; under a camera that
 * moves, drawings of different frames can be compared on the stage only. The reading itself under a still camera.
 */
export function stagedReading(reading: Reading): Reading {
  const { camera } = reading;
  if (!camera.moved) return reading;
  const staged = <P extends Point & { frame: number }>(point: P): P => ({
    ...point,
    ...toStage(point, cameraAt(camera, point.frame)),
  });
  return {
    ...reading,
    objects: reading.objects.map((object) => ({
      ...object,
      marks: object.marks.map(staged),
      contacts: object.contacts.map(staged),
      flights: object.flights.map((flight) => ({
        ...flight,
        apex: flight.apex && staged(flight.apex),
        trueArc: flight.trueArc.map(staged),
      })),
    })),
  };
}
