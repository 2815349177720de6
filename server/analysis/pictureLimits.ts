/** Pixels in one picture above which it is refused: 100 million, about three 8K frames. */
export const MAX_PIXELS = 100_000_000;

/** Longest side of a picture in px; a row of forty frames of 960 px still fits. */
export const MAX_EDGE = 40_000;

/** Shortest side of a picture in px in which anything could be found. */
export const MIN_EDGE = 8;
