import type { TrackView } from './view.ts';

/** Standard gravity, m/s²: 3rd CGPM 1901. */
export const STANDARD_GRAVITY = 9.80665;

/** Gravity of the picture in m/s² (fps as an exact fraction). */
export function metresPerSecond2(gravity: number, view: TrackView): number {
  const fps = view.fps.num / view.fps.den;
  return view.scale ? (gravity * fps * fps) / view.scale.pxPerMetre : 0;
}
