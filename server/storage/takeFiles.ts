import { copyFile, link, mkdir, rm } from 'node:fs/promises';
import path from 'node:path';
import { makeThumbnail } from '../analysis/thumbnail.ts';
import { codeOf } from '../errors.ts';
import { takeFolder, thumbnailName } from './folders.ts';

const THUMBNAIL_WIDTH = 240;
const MEDIA_TYPES = { png: 'image/png', jpeg: 'image/jpeg', webp: 'image/webp' } as const;

/** A frame that lies on disk and shall belong to a take. */
export interface FrameFile {
  path: string;
  format: keyof typeof MEDIA_TYPES;
  /** The name the person knows it by. */
  name: string;
  /** Made already; left out: made now. */
  thumbnail?: string;
}

/** A frame as it lies in the take's folder. */
export interface KeptFrame {
  file: string;
  mediaType: string;
  originalName: string;
}

/** Writes a frame's thumbnail, 240 px wide. */
export function writeThumbnail(picture: string, thumbnail: string): Promise<void> {
  return makeThumbnail(picture, thumbnail, { width: THUMBNAIL_WIDTH });
}

/**
 * Puts frames into the folder of a take under names of ours, in order. The sources stay where they are, so a post that
 * fails later loses nothing. When it fails itself, the folder is gone again.
 */
export async function keepFrames(dataDir: string, takeId: string, frames: FrameFile[]): Promise<KeptFrame[]> {
  const folder = takeFolder(dataDir, takeId);
  await mkdir(folder, { recursive: true, mode: 0o700 });
  try {
    const kept: KeptFrame[] = [];
    for (const [index, frame] of frames.entries()) {
      const file = `${String(index + 1).padStart(4, '0')}.${frame.format}`;
      const thumbnail = path.join(folder, thumbnailName(file));
      await linkOrCopy(frame.path, path.join(folder, file));
      if (frame.thumbnail) await linkOrCopy(frame.thumbnail, thumbnail);
      else await writeThumbnail(frame.path, thumbnail);
      kept.push({ file, mediaType: MEDIA_TYPES[frame.format], originalName: frame.name.slice(0, 255) });
    }
    return kept;
  } catch (error) {
    await dropFrames(dataDir, takeId);
    throw error;
  }
}

/** Removes a take's folder; of a take that did not come to be. */
export async function dropFrames(dataDir: string, takeId: string): Promise<void> {
  await rm(takeFolder(dataDir, takeId), { recursive: true, force: true });
}

/** A second name for the same bytes costs nothing; some file systems know only copies. */
async function linkOrCopy(from: string, to: string): Promise<void> {
  try {
    await link(from, to);
  } catch (error) {
    if (!['EXDEV', 'EPERM', 'ENOTSUP', 'EMLINK'].includes(codeOf(error))) throw error;
    await copyFile(from, to);
  }
}
