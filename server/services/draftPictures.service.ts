import { randomUUID } from 'node:crypto';
import { rename, rm } from 'node:fs/promises';
import path from 'node:path';
import type { EntityManager } from 'typeorm';
import { type Draft as WireDraft, MAX_FRAMES, MAX_PICTURE_BYTES, type RefusedFile } from '../../shared/api/drafts.ts';
import { inspectPicture } from '../analysis/inspect.ts';
import { PictureError } from '../analysis/PictureError.ts';
import { Draft } from '../entities/Draft.ts';
import { DraftPicture } from '../entities/DraftPicture.ts';
import type { Deps } from '../deps.ts';
import { AppError } from '../errors.ts';
import { draftFolder, thumbnailName } from '../storage/folders.ts';
import { writeThumbnail } from '../storage/takeFiles.ts';
import { changeDraft } from './changeDraft.ts';
import { openDraft, removePictureFiles, showDraft } from './drafts.service.ts';
import { proposeGrid } from './proposeGrid.ts';

/** A file as it arrived: under a name of ours on disk, with the name the person knows it by. */
export interface ArrivedFile {
  path: string;
  name: string;
  /** Also what lay beyond the limit and was not stored. */
  bytes: number;
}

/** Where the files of a batch may be written. Asked before the first byte is stored. */
export async function intakeFolder(deps: Deps, userId: string, draftId: string): Promise<string> {
  await openDraft(deps, userId, draftId);
  return draftFolder(deps.dataDir, draftId);
}

/**
 * Looks at a batch of files: a wrong one is refused by name, the rest is kept. A name that is there already is replaced.
 * @throws {AppError} `too_many_frames` when the batch does not fit any more; what was there before stays
 */
export async function addPictures(
  deps: Deps,
  userId: string,
  draftId: string,
  files: ArrivedFile[],
): Promise<WireDraft> {
  await openDraft(deps, userId, draftId);
  const left = new Set(files.map((file) => file.path));
  try {
    const accepted: DraftPicture[] = [];
    const refused: RefusedFile[] = [];
    for (const file of files) {
      const looked = await lookAt(deps, draftId, file);
      if ('reason' in looked) refused.push(looked);
      else {
        accepted.push(looked);
        left.delete(file.path);
      }
    }
    const replaced = await takeIn(deps, draftId, accepted, refused);
    for (const picture of replaced) await removePictureFiles(deps, draftId, picture);
  } finally {
    for (const file of left) await rm(file, { force: true });
  }
  await proposeGrid(deps, draftId);
  return showDraft(deps.dataSource.manager, draftId);
}

async function lookAt(deps: Deps, draftId: string, file: ArrivedFile): Promise<DraftPicture | RefusedFile> {
  const { name } = file;
  if (file.bytes > MAX_PICTURE_BYTES) {
    const most = MAX_PICTURE_BYTES / 1024 / 1024;
    return { name, reason: `“${name}” is larger than ${most} MB, which is the most for one picture.` };
  }
  try {
    const { format, width, height } = await inspectPicture(file.path, name);
    const folder = draftFolder(deps.dataDir, draftId);
    const stored = `${randomUUID().slice(0, 23)}.${format}`;
    await writeThumbnail(file.path, path.join(folder, thumbnailName(stored)));
    await rename(file.path, path.join(folder, stored));
    return deps.dataSource.manager.create(DraftPicture, { draftId, name, file: stored, format, width, height });
  } catch (error) {
    if (error instanceof PictureError) return { name, reason: error.message };
    throw error;
  }
}

/** @returns pictures that were replaced; their files are no longer wanted */
async function takeIn(
  deps: Deps,
  draftId: string,
  accepted: DraftPicture[],
  refused: RefusedFile[],
): Promise<DraftPicture[]> {
  try {
    return await changeDraft(deps, draftId, async (manager, draft) => {
      const replaced = await insertPictures(manager, draftId, accepted);
      const news = new Set([...accepted, ...refused].map(({ name }) => name));
      const still = draft.refused.filter(({ name }) => !news.has(name));
      await manager.update(Draft, { id: draftId }, { refused: [...still, ...refused] });
      return replaced;
    });
  } catch (error) {
    for (const picture of accepted) await removePictureFiles(deps, draftId, picture);
    throw error;
  }
}

async function insertPictures(
  manager: EntityManager,
  draftId: string,
  accepted: DraftPicture[],
): Promise<DraftPicture[]> {
  const there = new Map((await manager.findBy(DraftPicture, { draftId })).map((picture) => [picture.name, picture]));
  const replaced: DraftPicture[] = [];
  for (const picture of accepted) {
    const before = there.get(picture.name);
    if (before) {
      replaced.push(before);
      await manager.delete(DraftPicture, { draftId, name: picture.name });
    }
    there.set(picture.name, picture);
    if (there.size > MAX_FRAMES) {
      const most = MAX_FRAMES.toLocaleString('en-GB');
      throw new AppError('too_many_frames', `A strip holds ${most} frames at most; post the shot in parts.`);
    }
    await manager.insert(DraftPicture, picture);
  }
  return replaced;
}
