import type { Mark, Reading } from '../../shared/reading/document.ts';

type Offsets = Reading['camera']['offsets'];

interface Placed {
  tracks: { id: string; marks: Mark[] }[];
  camera: Reading['camera'];
}

/**
 * The finder counts pictures; where some are missing between them, frames run on. Marks go to the frames of their
 * pictures and missing frames have none. The camera was somewhere on every frame, so its path is drawn straight through.
 * @param frameNumbers frame of the document for each picture, from 1 and rising
 */
export function atTheirFrames<Found extends Placed>(found: Found, frameNumbers: number[]): Found {
  const frameOf = (picture: number): number => frameNumbers[picture - 1] ?? picture;
  return {
    ...found,
    tracks: found.tracks.map((track) => ({
      ...track,
      marks: track.marks.map((mark) => ({ ...mark, frame: frameOf(mark.frame) })),
    })),
    camera: {
      ...found.camera,
      offsets: everyFrame(found.camera.offsets.map((at) => ({ ...at, frame: frameOf(at.frame) }))),
    },
  };
}

function everyFrame(offsets: Offsets): Offsets {
  return offsets.flatMap((at, index) => {
    const next = offsets[index + 1];
    const gap = next ? next.frame - at.frame : 1;
    return Array.from({ length: gap }, (_, step) => {
      const share = step / gap;
      const between = (from: number, to: number | undefined) => from + ((to ?? from) - from) * share;
      return {
        frame: at.frame + step,
        dx: between(at.dx, next?.dx),
        dy: between(at.dy, next?.dy),
        zoom: between(at.zoom, next?.zoom),
      };
    });
  });
}
