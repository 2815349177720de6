/** Narrowest column that a frame number of four digits fits in, px of the screen. */
export const MIN_COLUMN = 28;
/** Narrowest column that a thumb can hit. */
export const THUMB_COLUMN = 40;
const MAX_COLUMN = 84;

/** The frame axis that all lanes share: every frame is a column. Lengths are px of the screen. */
export interface Columns {
  frames: number;
  width: number;
  /** Of the whole axis; wider than the room for it when it scrolls. */
  total: number;
}

/** Lays `frames` columns into `room` px. A strip too long for the room keeps a readable column and scrolls. */
export function layColumns(frames: number, room: number, least = MIN_COLUMN): Columns {
  const width = Math.min(MAX_COLUMN, Math.max(least, frames > 0 ? room / frames : room));
  return { frames, width, total: width * frames };
}

/** Middle of a frame's column; fractions of a frame lie between columns. */
export function columnMiddle(columns: Columns, frame: number): number {
  return (frame - 0.5) * columns.width;
}

/** The frame under a place on the axis, held inside the strip. */
export function frameAt(columns: Columns, x: number): number {
  return Math.min(columns.frames, Math.max(1, Math.floor(x / columns.width) + 1));
}

export interface FrameRange {
  from: number;
  to: number;
}

/** Frames to draw when `room` px of the axis are seen from `scrollLeft` on, with a few columns to spare on both sides. */
export function visibleFrames(columns: Columns, scrollLeft: number, room: number, spare = 6): FrameRange {
  const from = frameAt(columns, scrollLeft) - spare;
  const to = frameAt(columns, scrollLeft + room) + spare;
  return { from: Math.max(1, from), to: Math.min(columns.frames, to) };
}

/** How far to scroll so that a frame's column is seen with two columns beside it; null when it already is. */
export function scrollToSee(columns: Columns, frame: number, scrollLeft: number, room: number): number | null {
  const beside = Math.min(2 * columns.width, Math.max(0, (room - columns.width) / 2));
  const left = (frame - 1) * columns.width - beside;
  const right = frame * columns.width + beside;
  const furthest = Math.max(0, columns.total - room);
  if (left < scrollLeft) return Math.min(furthest, Math.max(0, left));
  if (right > scrollLeft + room) return Math.min(furthest, Math.max(0, right - room));
  return null;
}
