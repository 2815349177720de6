import type { FrameRate } from '../../../shared/reading/document.ts';

/**
 * The frame that is due after `elapsedMs` of playing from `start`, round and round; frames from 1. It is taken from the
 * clock, so a slow screen leaves frames out and never plays slower.
 */
export function frameDue(start: number, elapsedMs: number, fps: FrameRate, frames: number): number {
  const passed = Math.floor((elapsedMs * fps.num) / (1000 * fps.den) + 1e-6);
  return ((((start - 1 + passed) % frames) + frames) % frames) + 1;
}

/** Frames whose pictures are wanted next, nearest first: those ahead and the one behind. */
export function picturesAhead(frame: number, frames: number, ahead: number): number[] {
  const wanted = Array.from({ length: ahead }, (_, index) => frame + index + 1).filter((next) => next <= frames);
  return frame > 1 ? [...wanted.slice(0, 1), frame - 1, ...wanted.slice(1)] : wanted;
}
