import path from 'node:path';
import type { Grid } from '../../shared/finding/grid.ts';
import { findGrid } from '../analysis/grid.ts';
import { PictureError } from '../analysis/PictureError.ts';
import { Draft } from '../entities/Draft.ts';
import { DraftPicture } from '../entities/DraftPicture.ts';
import type { Deps } from '../deps.ts';
import { draftFolder } from '../storage/folders.ts';

/** Looks for the frames in the only picture of a draft; a draft with several pictures is a numbered set. */
export async function proposeGrid(deps: Deps, draftId: string): Promise<void> {
  const { manager } = deps.dataSource;
  const [picture, another] = await manager.findBy(DraftPicture, { draftId });
  const grid = picture && !another ? await gridOf(path.join(draftFolder(deps.dataDir, draftId), picture.file)) : null;
  await manager.update(Draft, { id: draftId }, { grid });
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
