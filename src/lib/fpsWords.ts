import type { FrameRate, Hold } from '../../shared/reading/document.ts';

/** "24 fps", "23.976 fps": the rate as it is said; the exact fraction stays in the data. */
export function fpsWords({ num, den }: FrameRate): string {
  return `${Number((num / den).toFixed(3))} fps`;
}

/** "on ones", "on twos", "on threes", "ones and twos mixed". */
export function holdWords(hold: Hold): string {
  return { 1: 'on ones', 2: 'on twos', 3: 'on threes', mixed: 'on ones and twos, mixed' }[hold];
}
