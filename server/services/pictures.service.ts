import path from 'node:path';
import { LessThanOrEqual } from 'typeorm';
import { TakeFrame } from '../entities/TakeFrame.ts';
import type { Deps } from '../deps.ts';
import { notFound } from '../errors.ts';
import { takeFolder, thumbnailName } from '../storage/folders.ts';
import { accessByTake } from './access.ts';

/** A picture as it lies on disk: absolute path and media type. The client never names a path. */
export interface PictureFile {
  path: string;
  mediaType: string;
}

/** The picture of a frame, as posted. */
export async function findPicture(deps: Deps, userId: string, takeId: string, frame: number): Promise<PictureFile> {
  const row = await findFrame(deps, userId, takeId, frame);
  return { path: path.join(takeFolder(deps.dataDir, takeId), row.file), mediaType: row.mediaType };
}

/** A small picture of a frame. */
export async function findThumbnail(deps: Deps, userId: string, takeId: string, frame: number): Promise<PictureFile> {
  const row = await findFrame(deps, userId, takeId, frame);
  const file = path.join(takeFolder(deps.dataDir, takeId), thumbnailName(row.file));
  return { path: file, mediaType: 'image/webp' };
}

/**
 * The row of a frame; of one that is missing between the posted files the picture before it, which is what stands on
 * the screen until the next. Paths come from our own rows, never from a request.
 */
async function findFrame(deps: Deps, userId: string, takeId: string, frame: number): Promise<TakeFrame> {
  const { manager } = deps.dataSource;
  const { take } = await accessByTake(manager, userId, takeId);
  if (frame > take.frames) throw notFound('frame');
  const [row] = await manager.find(TakeFrame, {
    where: { takeId, frame: LessThanOrEqual(frame) },
    order: { frame: 'DESC' },
    take: 1,
  });
  if (!row) throw notFound('frame');
  return row;
}
