import type { FrameRate } from '../../../shared/reading/document.ts';

/** An animation or a video taken apart: one path a frame, a path more than once where a picture shows for longer. */
export interface UnfoldedFrames {
  kind: 'animation' | 'video';
  framePaths: string[];
  fps: FrameRate;
  cautions: string[];
}

/** Most frames of one take. */
export const MOST_FRAMES = 4000;

/** The paths repeated as often as their pictures are shown. */
export function repeatPaths(paths: string[], repeats: number[]): string[] {
  return paths.flatMap((path, k) => Array.from({ length: repeats[k] ?? 1 }, () => path));
}
