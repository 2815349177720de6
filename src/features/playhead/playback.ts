import type { FrameRate } from '../../../shared/reading/document.ts';

/**
 * The frame that is due after `elapsedMs` of playing from `start`, round and round; frames from 1. It is taken from the
 * clock, so a slow screen leaves frames out and never plays slower.
 */
export function frameDue(start: number, elapsedMs: number, fps: FrameRate, frames: number): number {
  const passed = Math.floor((elapsedMs * fps.num) / (1000 * fps.den) + 1e-6);
  return ((((start - 1 + passed) % frames) + frames) % frames) + 1;
}
