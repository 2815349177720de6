import type { Mark, Reading } from '../reading/document.ts';

type Camera = Reading['camera'];
interface Placed {
  frame: number;
  x: number;
  y: number;
}

/**
 * Marks with the camera's move taken out, as the fit wants them: where things are on the stage, px of the first frame.
 * `offsets` say where the picture's corner lies on the stage and how much larger than on the first frame the stage
 * shows: stage = picture / zoom + (dx, dy).
 */
export function ontoStage(marks: Mark[], camera: Camera): Mark[] {
  if (!camera.moved) return marks;
  return marks.map((mark) => {
    const { dx, dy, zoom } = offsetAt(camera, mark.frame);
    return { ...mark, x: round(mark.x / zoom + dx), y: round(mark.y / zoom + dy) };
  });
}

/** The reading of marks on the stage, laid back over the pictures: every point where its own frame shows it. */
export function ontoPictures(reading: Reading): Reading {
  const { camera } = reading;
  if (!camera.moved) return reading;
  const back = <T extends Placed>(point: T): T => {
    const { dx, dy, zoom } = offsetAt(camera, point.frame);
    return { ...point, x: round((point.x - dx) * zoom), y: round((point.y - dy) * zoom) };
  };
  return {
    ...reading,
    objects: reading.objects.map((object) => ({
      ...object,
      marks: object.marks.map(back),
      contacts: object.contacts.map(back),
      flights: object.flights.map((flight) => ({
        ...flight,
        apex: flight.apex && back(flight.apex),
        trueArc: flight.trueArc.map(back),
      })),
    })),
  };
}

/** The camera at a moment, fractions of a frame between its two neighbours. */
function offsetAt(camera: Camera, frame: number): { dx: number; dy: number; zoom: number } {
  const { offsets } = camera;
  const first = offsets[0];
  if (!first) return { dx: 0, dy: 0, zoom: 1 };
  const place = Math.max(0, Math.min(offsets.length - 1, frame - first.frame));
  const before = offsets[Math.floor(place)];
  const after = offsets[Math.ceil(place)];
  const share = place - Math.floor(place);
  return {
    dx: before.dx + share * (after.dx - before.dx),
    dy: before.dy + share * (after.dy - before.dy),
    zoom: before.zoom + share * (after.zoom - before.zoom),
  };
}

function round(value: number): number {
  return Math.round(value * 1000) / 1000;
}
