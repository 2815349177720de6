import path from 'node:path';
import type { EntityManager } from 'typeorm';
import type { Grid } from '../../shared/finding/grid.ts';
import { findGrid } from '../analysis/grid.ts';
import { PictureError } from '../analysis/PictureError.ts';
import { Draft } from '../entities/Draft.ts';
import { DraftPicture } from '../entities/DraftPicture.ts';
import type { Deps } from '../deps.ts';
import { draftFolder } from '../storage/folders.ts';
import { changeDraft } from './changeDraft.ts';

/** Looks for the frames in the only picture of a draft; a draft with several pictures is a numbered set. */
export async function proposeGrid(deps: Deps, draftId: string): Promise<void> {
  const looked = await onlyPicture(deps.dataSource.manager, draftId);
  const grid = looked ? await gridOf(path.join(draftFolder(deps.dataDir, draftId), looked.file)) : null;
  await changeDraft(deps, draftId, async (manager) => {
    // Another batch may have arrived while this one was looked at; its own look then counts.
    const now = await onlyPicture(manager, draftId);
    if (now?.file === looked?.file) await manager.update(Draft, { id: draftId }, { grid });
  });
}

async function onlyPicture(manager: EntityManager, draftId: string): Promise<DraftPicture | null> {
  const [picture, another] = await manager.find(DraftPicture, { where: { draftId }, take: 2 });
  return picture && !another ? picture : null;
}

async function gridOf(picture: string): Promise<Grid | null> {
  try {
    const grid = await findGrid(picture);
    return grid.count > 1 ? grid : null;
  } catch (error) {
    // A picture without frames in it is a frame; that is said beside it.
    if (error instanceof PictureError) return null;
    throw error;
  }
}
