import type { Point, ReadObject, Source } from '../../shared/reading/document.ts';

/** One drawing of the thing: its place, and the frames on which it is shown. */
export interface Drawing extends Point {
  /** First frame it is shown on, from 1. */
  frame: number;
  /** Last frame it is shown on. */
  until: number;
  /** Picture px; null where it was not measured. */
  radius: number | null;
}

/**
 * The drawings of one object in frame order, px of the picture. On twos a drawing stands on two frames and is counted
 * once. A drawing on which the thing was not seen is left out. Without an exposure list every mark is a drawing.
 */
export function drawingsOf(object: Pick<ReadObject, 'marks'>, source: Pick<Source, 'exposure' | 'frames'>): Drawing[] {
  const marks = object.marks.toSorted((a, b) => a.frame - b.frame);
  const starts =
    source.exposure.length > 0 ? source.exposure.toSorted((a, b) => a - b) : marks.map((mark) => mark.frame);
  return starts.flatMap((frame, index) => {
    const until = (starts[index + 1] ?? source.frames + 1) - 1;
    const mark = marks.find((candidate) => candidate.frame >= frame && candidate.frame <= until);
    if (!mark) return [];
    return [{ frame, until: Math.max(frame, until), x: mark.x, y: mark.y, radius: mark.radius ?? null }];
  });
}

/** The drawing that is shown on a frame, if the thing is seen on it. */
export function drawingOn(drawings: readonly Drawing[], frame: number): Drawing | undefined {
  return drawings.find((drawing) => drawing.frame <= frame && frame <= drawing.until);
}
