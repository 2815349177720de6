/**
 * How far a thumbnail wider than its window is shifted so that the thing stands in the middle of the window: 0 shows its
 * left end, 1 its right end.
 * @param share where the thing is across the picture, 0 to 1
 * @param width of the thumbnail at the height it is shown, px
 * @param window px of it that are seen
 */
export function thumbShift(share: number, width: number, window: number): number {
  const hidden = width - window;
  if (hidden <= 0) return 0.5;
  return Math.min(1, Math.max(0, (share * width - window / 2) / hidden));
}
