import type { Point } from '../../../shared/reading/document.ts';

export interface Size {
  width: number;
  height: number;
}

/** What of the picture is seen: `x`, `y` is the picture point at the room's top-left corner, `scale` is screen px for one picture px. */
export interface View extends Point {
  scale: number;
}

/** Room left free around the fitted picture, px of the screen. */
export interface Margins {
  top: number;
  right: number;
  bottom: number;
  left: number;
}

const NO_MARGINS: Margins = { top: 0, right: 0, bottom: 0, left: 0 };
/** Deepest zoom: a picture px is 24 px of the screen, enough to see its grid. */
export const MAX_SCALE = 24;

/** The whole picture, as large as the room allows, in the middle of what the margins leave. */
export function fitView(picture: Size, room: Size, margins: Margins = NO_MARGINS): View {
  const free = {
    width: Math.max(1, room.width - margins.left - margins.right),
    height: Math.max(1, room.height - margins.top - margins.bottom),
  };
  const scale = Math.min(free.width / picture.width, free.height / picture.height);
  return {
    scale,
    x: picture.width / 2 - (margins.left + free.width / 2) / scale,
    y: picture.height / 2 - (margins.top + free.height / 2) / scale,
  };
}

/** Keeps the picture in the room: in the middle along a side on which it fits, else without a gap at its edges. */
export function holdView(view: View, picture: Size, room: Size): View {
  const hold = (start: number, length: number, roomPx: number) => {
    const seen = roomPx / view.scale;
    return seen >= length ? (length - seen) / 2 : Math.min(length - seen, Math.max(0, start));
  };
  return {
    scale: view.scale,
    x: hold(view.x, picture.width, room.width),
    y: hold(view.y, picture.height, room.height),
  };
}

/** Zooms by `factor` so that the picture point under a place of the room (screen px) stays under it. */
export function zoomAbout(view: View, factor: number, at: Point, smallest: number): View {
  const scale = Math.min(MAX_SCALE, Math.max(smallest, view.scale * factor));
  return { scale, x: view.x + at.x / view.scale - at.x / scale, y: view.y + at.y / view.scale - at.y / scale };
}

/** Moves the picture under the hand by screen px. */
export function panBy(view: View, dx: number, dy: number): View {
  return { ...view, x: view.x - dx / view.scale, y: view.y - dy / view.scale };
}

/**
 * How far to move the picture, px of the screen, so that a picture point comes to the middle of the room; null while it is
 * well in sight.
 */
export function panToSee(view: View, room: Size, point: Point): Point | null {
  const x = (point.x - view.x) * view.scale;
  const y = (point.y - view.y) * view.scale;
  const clear = (at: number, length: number) => at >= 0.12 * length && at <= 0.88 * length;
  if (clear(x, room.width) && clear(y, room.height)) return null;
  return { x: room.width / 2 - x, y: room.height / 2 - y };
}
