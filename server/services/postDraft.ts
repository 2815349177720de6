import { rm } from 'node:fs/promises';
import path from 'node:path';
import { MAX_FRAMES } from '../../shared/api/drafts.ts';
import type { Take as WireTake } from '../../shared/api/takes.ts';
import { splitStrip } from '../analysis/grid.ts';
import { Draft } from '../entities/Draft.ts';
import { DraftPicture } from '../entities/DraftPicture.ts';
import type { Deps } from '../deps.ts';
import { AppError } from '../errors.ts';
import type { DraftParts } from '../presenters/drafts.presenter.ts';
import { draftFolder, thumbnailName } from '../storage/folders.ts';
import { changeDraft } from './changeDraft.ts';
import { openDraft } from './drafts.service.ts';
import { viewDraft } from './draftView.ts';
import { type PostGiven, postTake, type Strip } from './posting.service.ts';

/**
 * Posts a draft as the next take of its shot. A post that fails leaves the draft as it was, so that it can be tried
 * again; one that succeeds closes it, so that a second click makes no second take.
 */
export async function postDraft(deps: Deps, userId: string, draftId: string, given: PostGiven): Promise<WireTake> {
  const { manager } = deps.dataSource;
  const { production } = await openDraft(deps, userId, draftId);
  const view = await changeDraft(deps, draftId, async (transaction, draft) => {
    const parts = viewDraft(draft, await transaction.findBy(DraftPicture, { draftId }));
    refuseUnready(parts);
    await transaction.update(Draft, { id: draftId }, { status: 'posting' });
    return parts;
  });
  let take: WireTake;
  try {
    const strip = await stripOf(deps, view);
    take = await postTake(deps, userId, production.slug, strip, given);
  } catch (error) {
    await rm(cellFolder(deps, draftId), { recursive: true, force: true });
    await manager.update(Draft, { id: draftId, status: 'posting' }, { status: 'open' });
    throw error;
  }
  // From here on the take is there: whatever fails now must not open the draft to a second post.
  await manager.update(Draft, { id: draftId }, { status: 'posted' });
  await rm(draftFolder(deps.dataDir, draftId), { recursive: true, force: true }).catch((error: unknown) =>
    deps.log.warn({ err: error, draftId }, 'the folder of a posted draft is left to the sweep'),
  );
  return take;
}

/** Where a strip picture is cut into, until its frames are the take's. */
function cellFolder(deps: Deps, draftId: string): string {
  return path.join(draftFolder(deps.dataDir, draftId), 'cells');
}

function refuseUnready({ draft, pictures, ready }: DraftParts): void {
  if (pictures.length === 0) throw new AppError('draft_empty', 'There are no frames in this post yet.');
  if (!ready) throw new AppError('draft_empty', 'One frame is not a flight; add the others first.');
  if ((draft.grid?.count ?? 0) > MAX_FRAMES && pictures.length === 1) {
    const most = MAX_FRAMES.toLocaleString('en-GB');
    throw new AppError('too_many_frames', `A strip holds ${most} frames at most; correct the cut.`);
  }
}

async function stripOf(deps: Deps, { draft, pictures, firstFrame, missingFrames }: DraftParts): Promise<Strip> {
  const folder = draftFolder(deps.dataDir, draft.id);
  const first = pictures[0]!.picture;
  if (draft.grid && pictures.length === 1) {
    const cells = await splitStrip(path.join(folder, first.file), draft.grid, cellFolder(deps, draft.id));
    const frames = cells.map((cell) => ({ path: cell.path, format: 'png' as const, name: first.name }));
    const { cellWidth: width, cellHeight: height } = draft.grid;
    return { kind: 'strip', frames, width, height };
  }
  const frames = pictures.map(({ picture: { file, format, name } }) => ({
    path: path.join(folder, file),
    format,
    name,
    thumbnail: path.join(folder, thumbnailName(file)),
  }));
  const strip: Strip = { kind: 'frames', frames, width: first.width, height: first.height };
  if (missingFrames.length === 0 || firstFrame === null) return strip;
  return { ...strip, frameNumbers: pictures.map(({ number }) => number! - firstFrame + 1) };
}
