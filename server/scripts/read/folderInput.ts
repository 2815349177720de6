import { readdir } from 'node:fs/promises';
import { join } from 'node:path';
import { byName, readFrameNumbers, sayNumbers } from '../../../shared/frames/frameNumbers.ts';
import { InputError } from './InputError.ts';

export interface FrameFolder {
  framePaths: string[];
  /** The number the names give the first frame, where they carry one. */
  firstFrame: number | null;
  cautions: string[];
}

const PICTURE = /\.(png|jpe?g|webp)$/i;
const MOST_FRAMES = 4000;

/**
 * The frames in a folder in natural order. Files that are no pictures by their name are passed over.
 * @throws InputError when there is none, or more than can be read
 */
export async function openFrameFolder(folder: string): Promise<FrameFolder> {
  const entries = await readdir(folder, { withFileTypes: true });
  const names = entries
    .filter((entry) => entry.isFile() && PICTURE.test(entry.name) && !entry.name.startsWith('.'))
    .map((entry) => entry.name)
    .toSorted(byName);
  if (names.length === 0) {
    const what = entries.length === 0 ? 'is empty' : 'holds no PNG, JPEG or WebP frames';
    throw new InputError(`The folder “${folder}” ${what}; give a folder of numbered frames.`);
  }
  if (names.length > MOST_FRAMES) {
    throw new InputError(
      `The folder “${folder}” holds ${names.length} frames; the most is ${MOST_FRAMES}, so give a part of the shot.`,
    );
  }
  const framePaths = names.map((name) => join(folder, name));
  const { firstFrame, missing } = readFrameNumbers(names);
  const cautions =
    missing.length === 0
      ? []
      : [
          `The names leave out ${missing.length === 1 ? 'frame' : 'frames'} ${sayNumbers(missing)}; frames count on without a gap.`,
        ];
  return { framePaths, firstFrame, cautions };
}
