import { mkdtemp, rm, stat } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { basename, join } from 'node:path';
import sharp from 'sharp';
import { evenGrid, type Grid } from '../../../shared/finding/grid.ts';
import type { AnalysisRequest } from '../../../shared/finding/types.ts';
import type { FrameRate } from '../../../shared/reading/document.ts';
import { findGrid, splitStrip } from '../../analysis/grid.ts';
import { inspectPicture } from '../../analysis/inspect.ts';
import { PictureError } from '../../analysis/PictureError.ts';
import { unfoldPages } from '../../analysis/unfold/pages.ts';
import { unfoldVideo } from '../../analysis/unfold/video.ts';
import { openFrameFolder } from './folderInput.ts';
import { InputError } from './InputError.ts';
import type { ReadOptions } from './options.ts';

/** Frames on disk that the command can read, however they came. */
export interface PictureInput {
  framePaths: string[];
  kind: AnalysisRequest['kind'];
  firstFrame: number | null;
  /** The rate the file itself gives. */
  fps: FrameRate | null;
  cautions: string[];
}

const VIDEO = /\.(mp4|m4v|mov|webm|mkv)$/i;

/**
 * Turns a folder, a strip picture, an animation or a video into frames on disk, lets `work` read them, and takes away
 * what had to be unpacked.
 * @throws InputError when the input is none of these
 * @throws PictureError when a picture cannot be used
 */
export async function withPictureInput<T>(options: ReadOptions, work: (input: PictureInput) => Promise<T>): Promise<T> {
  const facts = await stat(options.input).catch(() => null);
  if (!facts) throw new InputError(`“${options.input}” is not there; check the path.`);
  if (facts.isDirectory()) return work({ ...(await openFrameFolder(options.input)), kind: 'frames', fps: null });
  const scratch = await mkdtemp(join(tmpdir(), 'spandrel-read-'));
  try {
    return await work(await unpack(options, scratch));
  } finally {
    await rm(scratch, { recursive: true, force: true });
  }
}

async function unpack(options: ReadOptions, scratch: string): Promise<PictureInput> {
  const path = options.input;
  const name = basename(path);
  if (VIDEO.test(name)) return { ...(await unfoldVideo(path, name, scratch)), firstFrame: null };
  if (name.toLowerCase().endsWith('.gif')) return { ...(await unfoldPages(path, name, scratch)), firstFrame: null };
  try {
    await inspectPicture(path, name);
  } catch (cause) {
    if (!(cause instanceof PictureError) || cause.code !== 'animated_picture') throw cause;
    const isWebp = (await sharp(path).metadata()).format === 'webp';
    const frames = isWebp ? unfoldPages(path, name, scratch) : unfoldVideo(path, name, scratch, 'animation');
    return { ...(await frames), firstFrame: null };
  }
  const grid = options.grid ? await givenGrid(path, options.grid) : await findGrid(path);
  if (grid.count < 2) {
    throw new InputError(
      `“${basename(path)}” looks like a single frame; give --grid columns x rows, such as --grid 6x4, or a folder of frames.`,
    );
  }
  const frames = await splitStrip(path, grid, scratch);
  return { framePaths: frames.map((frame) => frame.path), kind: 'strip', firstFrame: null, fps: null, cautions: [] };
}

/** A grid given by columns and rows: gutters and margins are still found where they agree with it. */
async function givenGrid(path: string, given: { columns: number; rows: number }): Promise<Grid> {
  const found = await findGrid(path);
  if (found.columns === given.columns && found.rows === given.rows) return found;
  const { width, height } = await inspectPicture(path, basename(path));
  try {
    return evenGrid(width, height, given.columns, given.rows);
  } catch (cause) {
    throw new PictureError(basename(path), 'no_grid', cause instanceof Error ? cause.message : String(cause));
  }
}
